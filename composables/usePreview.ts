import { useApi } from '~~/composables/useApi'
import { useCatalogue } from '~~/composables/useCatalogue'
import { deviceNow, usePostingStore } from '~~/stores/posting'
import { useFirmRulesStore } from '~~/stores/firmRules'
import { useSessionStore } from '~~/stores/session'
import { DEFAULT_FILL_POLICY } from '~~/utils/capacity/types'
import type { FoldInput } from '~~/utils/contract/custody'
import type { PolicyAnswer } from '~~/utils/contract/policy'
import type { AnyCustodyEvent } from '~~/utils/custody/event'
import type { Finding, FindingCode } from '~~/utils/custody/finding'
import type { EventKind } from '~~/utils/custody/kinds'
import type { ChangedLine } from '~~/utils/custody/laterLines'
import type { ViewContext } from '~~/utils/custody/view'
import { DEFAULT_RETEST_SETTINGS } from '~~/utils/requalification/retestSettings'

/** An event as far as its form is filled in. */
export interface PreviewContent { cylinderId: string, kind: EventKind, placeId?: string, supervisorId?: string, details: unknown, expects?: number }

const WAIT_MS = 250
const DRAFT_ID = '00000000-0000-7000-8000-000000000000'
// Cautions that mean a slip of the finger as likely as a fact: the form asks once.
const ASKED: readonly FindingCode[] = ['weigh-again', 'not-registered']

/**
 * What would be found if the event in a form were recorded now, judged in this browser by the server's own rules.
 *
 * Where it cannot be judged here (no network for the log of the cylinder), it is judged after sending as always.
 */
export function usePreview(input: {
  content: () => PreviewContent | null
  at: () => string
  /** The other half, where the event is one of what happens between two cylinders. */
  counter?: () => PreviewContent | null
}) {
  const api = useApi()
  const session = useSessionStore()
  const rules = useFirmRulesStore()
  const posting = usePostingStore()
  const load = useCatalogue()
  const findings = shallowRef<Finding[]>([])
  const changes = shallowRef<ChangedLine[]>([])
  const known = new Map<string, { recorded: number, input: FoldInput }>()
  let timer: ReturnType<typeof setTimeout> | undefined
  let turn = 0

  async function foldInput(cylinderId: string): Promise<FoldInput> {
    const before = known.get(cylinderId)
    if (before?.recorded === posting.recorded) return before.input
    const asked = { recorded: posting.recorded, input: await api.getAside<FoldInput>(`/api/cylinders/${cylinderId}/fold`) }
    known.set(cylinderId, asked)
    return asked.input
  }

  async function judge() {
    const mine = ++turn
    const content = input.content()
    if (!content) {
      show([], [])
      return
    }
    try {
      const other = input.counter?.() ?? null
      const [{ catalogue, preview }, policy, mineKnown, otherKnown] = await Promise.all([
        load(), rules.load(), foldInput(content.cylinderId), other && foldInput(other.cylinderId),
      ])
      if (mine !== turn) return
      const counter = other && otherKnown ? { known: otherKnown.state ?? otherKnown.events, draft: draftOf(other) } : undefined
      const judged = preview(mineKnown.state ?? mineKnown.events, draftOf(content), viewContext(policy, catalogue, session.access, mineKnown), counter)
      show(judged.findings, judged.changes)
    }
    catch {
      if (mine === turn) show([], [])
    }
  }

  function show(found: Finding[], changed: ChangedLine[]) {
    findings.value = found
    changes.value = changed
  }

  function draftOf(content: PreviewContent): AnyCustodyEvent {
    const at = input.at()
    return {
      ...content, id: DRAFT_ID, deviceId: '', deviceSeq: Number.MAX_SAFE_INTEGER,
      occurredAt: at === '' ? deviceNow() : deviceNow(new Date(at).getTime()),
    } as AnyCustodyEvent
  }

  // The same content drawn anew is not judged anew.
  onMounted(() => watch(() => JSON.stringify([input.content(), input.counter?.(), input.at()]), () => {
    clearTimeout(timer)
    timer = setTimeout(judge, WAIT_MS)
  }, { immediate: true }))
  onBeforeUnmount(() => clearTimeout(timer))

  const asks = computed(() => findings.value.some(finding => finding.severity === 'stop' || ASKED.includes(finding.code)))
  return { findings, asks, changes }
}

function viewContext(policy: PolicyAnswer, catalogue: ViewContext['catalogue'], access: ViewContext['access'], { codesOnTwo, otherHalves }: FoldInput): ViewContext {
  const nowMs = Date.now()
  const policyAt = (ms: number) => policy.fillPolicies.findLast(entry => entry.fromAt <= ms)?.policy ?? DEFAULT_FILL_POLICY
  const retestAt = (ms: number) => policy.retests.findLast(entry => entry.fromAt <= ms)?.retest ?? DEFAULT_RETEST_SETTINGS
  const itself = (id: string) => ({ id, name: '' })
  return {
    nowMs,
    timeZone: policy.timeZone,
    policyNow: policyAt(nowMs),
    policyAt,
    catalogue,
    scales: new Map(policy.scales.map(scale => [scale.id, scale])),
    retest: retestAt(nowMs),
    retestAt,
    access,
    codesOnTwo: new Set(codesOnTwo),
    otherHalves,
    // Only the findings are shown, not where it stands.
    placeOfFirm: () => null,
    // Nobody reads names here: only the findings are shown.
    names: { place: itself, person: itself, firm: itself },
  }
}
