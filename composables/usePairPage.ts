import type { useActContext } from '~~/composables/useActContext'
import { useClock } from '~~/composables/useClock'
import type { useCylinder } from '~~/composables/useCylinder'
import { useOtherCylinder } from '~~/composables/useOtherCylinder'
import { usePairForm, type NewHalf } from '~~/composables/usePairForm'
import { usePreview, type PreviewContent } from '~~/composables/usePreview'
import { useSessionStore } from '~~/stores/session'
import { supervisorsFor, usualSupervisorId } from '~~/utils/access/supervisors'
import type { CylinderView } from '~~/utils/custody/cylinderView'
import type { PairedKind } from '~~/utils/custody/kinds'
import { isoWithOffset } from '~~/utils/quantity/instant'

/** What both halves say, with which cylinder each is of; or what is still missing, in words. */
export type PairHalves = { halves: [PreviewContent, PreviewContent] } | { reason: string }

/**
 * The page of what happens between two cylinders: this one and one that is scanned, both halves judged before they are
 * recorded together.
 *
 * Shape: `cylinder` and `acts` are loaded; `empty` is the form in which nothing was said yet; `recording` takes how the page reads its halves.
 */
export function usePairPage<Draft extends { otherId: string }>(
  kind: PairedKind, cylinder: ReturnType<typeof useCylinder>, acts: ReturnType<typeof useActContext>, empty: (view: CylinderView | null) => Draft,
) {
  const session = useSessionStore()
  const route = useRoute()
  const now = useClock()
  const { view } = cylinder

  const form = usePairForm<Draft>(`${view.value?.id ?? String(Object(route.params).ref)} ${kind}`, () => empty(view.value ?? null), () => usualSupervisorId(acts.lists.value?.people ?? [], session.user?.id ?? ''))
  const { draft, envelope } = form
  const refrigerant = ref<string | null>(null)
  const other = useOtherCylinder({
    id: () => draft.value.otherId,
    choose: (id) => {
      draft.value.otherId = id
    },
    ownId: () => view.value?.id ?? null,
    refrigerant: () => refrigerant.value,
  })

  /** How the halves are read is the page's own; what every form asks beside them is settled here. */
  function recording(read: () => PairHalves, words: { announcement: string }) {
    const reading = computed<PairHalves>(() => {
      const asked = envelopeLacks()
      if (asked) return { reason: asked }
      const halves = read()
      if ('reason' in halves) return halves
      const more = {
        ...(envelope.value.supervisorId && { supervisorId: envelope.value.supervisorId }),
        ...(envelope.value.note.trim() && { note: envelope.value.note.trim() }),
      }
      return { halves: [{ ...halves.halves[0], ...more }, { ...halves.halves[1], ...more }] }
    })
    const half = (at: 0 | 1) => 'halves' in reading.value ? reading.value.halves[at] : null
    const first = usePreview({ content: () => half(0), counter: () => half(1), at: () => envelope.value.at })
    const second = usePreview({ content: () => half(1), counter: () => half(0), at: () => envelope.value.at })
    const findings = computed(() => [...first.findings.value, ...second.findings.value.filter(finding => !first.findings.value.some(({ code }) => code === finding.code))])
    const asks = computed(() => first.asks.value || second.asks.value)
    const seen = ref(false)
    const tried = ref(false)
    watch(() => findings.value.map(({ code }) => code).join(), () => {
      seen.value = false
    })
    const blocked = computed(() => 'reason' in reading.value ? reading.value.reason : asks.value && !seen.value ? 'Tick that it happened, then record it.' : null)
    const refusal = computed(() => tried.value ? blocked.value : null)

    async function record() {
      tried.value = true
      if (blocked.value || 'reason' in reading.value) return
      const confirmed = (preview: typeof first) => seen.value && preview.findings.value.length > 0 ? { confirmed: preview.findings.value.map(({ code }) => code) } : {}
      const [one, two] = reading.value.halves
      await form.send([{ ...one, ...confirmed(first) }, { ...two, ...confirmed(second) }] as NewHalf[], words.announcement)
      window.scrollTo({ top: 0 })
    }
    return { findings, asks, seen, blocked, refusal, record }
  }

  function envelopeLacks(): string | null {
    if (session.user?.trainee && !envelope.value.supervisorId) return 'Choose who supervises.'
    return envelope.value.at !== '' && Number.isNaN(new Date(envelope.value.at).getTime()) ? 'Choose the day and time it happened.' : null
  }

  const supervisors = computed(() => supervisorsFor(acts.lists.value?.people ?? [], session.user?.id ?? ''))
  const latest = computed(() => import.meta.client ? isoWithOffset(now.value, -new Date(now.value).getTimezoneOffset()).slice(0, 16) : '')
  return { form, other, refrigerant, recording, supervisors, latest }
}
