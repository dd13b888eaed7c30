import { problemOf, useApi } from '~~/composables/useApi'
import { useKept } from '~~/composables/useKept'
import { useScanSignal } from '~~/composables/useScanSignal'
import { useSharedCode } from '~~/composables/useSharedCode'
import { deviceNow, usePostingStore, type Posted, type Settled } from '~~/stores/posting'
import { usePreferencesStore } from '~~/stores/preferences'
import { BATCH_WORDS, batchEvent, type BatchAct, type BatchTarget } from '~~/utils/batch/batchAct'
import { batchLine, isCounted, type BatchLine, type BatchScan } from '~~/utils/batch/batchLine'
import { missingOf, type ExpectedCylinder } from '~~/utils/batch/missing'
import type { CylinderView } from '~~/utils/contract/custody'
import type { ProblemDetails } from '~~/utils/contract/problem'
import type { CustodyEvent } from '~~/utils/custody/event'

const SAME_CODE_MS = 3_000

/** What a batch is for, as far as it is known yet. */
export interface BatchPlan {
  act: BatchAct
  target: BatchTarget | null
  /** The cylinders that are expected; null where any may come. */
  expected: readonly ExpectedCylinder[] | null
  /** Who supervises, where the person is a trainee. */
  supervisorId: string | null
  /** Where a cylinder comes to that does not come to the target like the others; null for those that do. */
  otherTarget?: (cylinderId: string) => BatchTarget | null
}

/** Of a scan, what is kept on the device: the cylinder is looked up anew. */
type KeptScan = Pick<BatchScan, 'ref' | 'scannedAt' | 'keepReason' | 'isChosen' | 'sent'>

/**
 * Several cylinders scanned one after the other and recorded by one act at the end.
 *
 * Shape: `key` names the list, which is kept on the device until it is recorded or started over; `lines` has the last
 * scan on top; `pending` is a line that has to be seen before the next is scanned; `spoken` is what was last said.
 */
export function useBatch(key: string, plan: () => BatchPlan) {
  const api = useApi()
  const posting = usePostingStore()
  const preferences = usePreferencesStore()
  const signal = useScanSignal()
  const { restored: kept, keep: store, followOtherTabs } = useKept<KeptScan[]>(`batch ${key}`, 'device')
  const { ofCode } = useSharedCode()

  const scans = ref<BatchScan[]>([]) as Ref<BatchScan[]>
  const pendingRef = ref<string | null>(null)
  const spoken = ref('')
  const problem = ref<ProblemDetails | null>(null)
  /** How many are recorded of how many, while they are. */
  const progress = ref<{ done: number, total: number } | null>(null)
  const recordedIds = ref<string[]>([])
  // Nothing is drawn from these.
  let last = { ref: '', at: 0 }
  /** What the device keeps, as far as this tab knows: what came from another tab is not written once more over what that one has written since. */
  let inStore = ''

  const expectedIds = computed(() => plan().expected && new Set(plan().expected!.map(({ id }) => id)))
  const lines = computed(() => scans.value.map(lineOf))
  const counted = computed(() => lines.value.filter(isCounted))
  const scannedIds = computed(() => new Set([
    ...recordedIds.value,
    ...lines.value.flatMap(({ found, verdict }) => found.is === 'known' && verdict?.standing !== 'which' ? [found.view.id] : []),
  ]))
  const missing = computed(() => missingOf(plan().expected ?? [], scannedIds.value, plan().target?.id ?? null))
  const pending = computed(() => lines.value.find(line => line.ref === pendingRef.value) ?? null)

  function lineOf(scan: BatchScan): BatchLine {
    const { act, target } = plan()
    return batchLine(scan, { act, target, expectedIds: expectedIds.value }, preferences.unit)
  }

  /** Takes a scanned code, or the id of a cylinder that was found by its stamp. */
  async function add(reference: string) {
    if (reference === last.ref && Date.now() - last.at < SAME_CODE_MS) return
    // A stop stands until it was seen, for a hand scanner too, which the paused camera does not hold back.
    if (pendingRef.value !== null) return signal('stop')
    last = { ref: reference, at: Date.now() }
    const already = lines.value.find(line => line.ref === reference)
    if (already && already.found.is !== 'failed') return again(already)
    drop(reference)
    scans.value = [{ ref: reference, scannedAt: deviceNow(), found: { is: 'looking' }, keepReason: null, isChosen: false, sent: null, problem: null }, ...scans.value]
    await lookUp(reference)
    const line = lines.value.find(each => each.ref === reference)
    if (!line) return
    const first = lines.value.find(other => other !== line && isSame(other, line))
    if (!first) return tell(line)
    drop(reference)
    again(first)
  }

  async function lookUp(reference: string) {
    try {
      change(reference, { found: { is: 'known', view: await api.get<CylinderView>(`/api/cylinders/${reference}`) } })
    }
    catch (error) {
      const why = problemOf(error)
      change(reference, { found: why.status === 404 ? { is: 'unknown' } : { is: 'failed', problem: why } })
    }
  }

  function tell(line: BatchLine) {
    const { verdict, found } = line
    const kind = verdict?.kind ?? (found.is === 'unknown' ? 'unk' : 'att')
    spoken.value = `${line.name}, ${verdict?.text ?? (found.is === 'unknown' ? 'on no cylinder' : 'not looked up')}`
    signal(kind)
    if (kind === 'stop') pendingRef.value = line.ref
  }

  function again(line: BatchLine) {
    spoken.value = `${line.name} is on the list already`
    signal('att')
  }

  /** Takes a line off the list. */
  function drop(reference: string) {
    scans.value = scans.value.filter(scan => scan.ref !== reference)
    if (pendingRef.value === reference) pendingRef.value = null
    if (last.ref === reference) last = { ref: '', at: 0 }
  }

  /** Goes on scanning; the line stays as it is. */
  function acknowledge() {
    pendingRef.value = null
  }

  /** Counts a refused line all the same. */
  function keep(reference: string, reason: string) {
    change(reference, { keepReason: reason })
    if (pendingRef.value === reference) pendingRef.value = null
  }

  /** Says by the end of its serial which of two cylinders with one code is meant; gives whether one was found. */
  async function choose(reference: string, serialEnd: string): Promise<boolean> {
    const [view, another] = await ofCode(reference, serialEnd).catch(() => [])
    if (view === undefined || another !== undefined) return false
    // From now on it stands by its own name: its label would find the other one.
    drop(view.id)
    change(reference, { ref: view.id, found: { is: 'known', view }, isChosen: true })
    acknowledge()
    tell(lines.value.find(line => line.ref === view.id)!)
    return true
  }

  function change(reference: string, changes: Partial<BatchScan>) {
    scans.value = scans.value.map(scan => scan.ref === reference ? { ...scan, ...changes } : scan)
  }

  /** Records every counted line; what was not recorded stays on the list with its problem. */
  async function record() {
    const { act, target, supervisorId } = plan()
    if (!target || counted.value.length === 0 || progress.value) return
    problem.value = null
    // In the order in which they were scanned.
    const going = [...counted.value].reverse().map(line => ({ line, event: sealed(line, act, target, supervisorId) }))
    const posted: Posted[] = []
    progress.value = { done: 0, total: going.length }
    try {
      await posting.postAll(going.map(({ event }) => event), (settled) => {
        posted.push(...settled.flatMap(each => each.posted ? [each.posted] : []))
        settled.forEach(settle)
        progress.value = { done: (progress.value?.done ?? 0) + settled.length, total: going.length }
      })
    }
    catch (error) {
      problem.value = problemOf(error)
    }
    finally {
      progress.value = null
    }
    const moved = posted.filter(({ event }) => !plan().otherTarget?.(event.cylinderId))
    if (posted.length) posting.announceAll(posted, BATCH_WORDS[act].done(moved.length, target.name))
  }

  function sealed(line: BatchLine, act: BatchAct, target: BatchTarget, supervisorId: string | null): CustodyEvent {
    const view = (line.found as { view: CylinderView }).view
    const content = batchEvent(act, plan().otherTarget?.(view.id) ?? target, {
      cylinderId: view.id, scannedAt: line.scannedAt, keepReason: line.keepReason, confirmed: line.verdict?.against ?? [],
    }, supervisorId)
    const event = line.sent ? { ...content, ...line.sent } : posting.seal(content)
    const { id, deviceId, deviceSeq } = event
    change(line.ref, { sent: { id, deviceId, deviceSeq }, problem: null })
    return event
  }

  function settle({ event, problem: why }: Settled) {
    const scan = scans.value.find(each => each.sent?.id === event.id)
    if (!scan) return
    if (why) {
      change(scan.ref, { problem: why })
    }
    else {
      recordedIds.value.push(event.cylinderId)
      drop(scan.ref)
    }
  }

  /** Empties the list; gives the way to have it back. */
  function startOver(): () => void {
    const before = scans.value
    scans.value = []
    pendingRef.value = null
    problem.value = null
    last = { ref: '', at: 0 }
    return () => {
      scans.value = [...scans.value, ...before]
    }
  }

  /** The list is one in all tabs; what went off it in another one after it was sent, was recorded there. */
  followOtherTabs(async (others) => {
    const list = others ?? []
    inStore = JSON.stringify(list)
    const before = new Map(scans.value.map(scan => [scan.ref, scan]))
    const gone = scans.value.filter(scan => scan.sent !== null && !list.some(one => one.ref === scan.ref))
    recordedIds.value.push(...gone.flatMap(({ found }) => found.is === 'known' ? [found.view.id] : []))
    scans.value = list.map(scan => ({ found: { is: 'looking' }, problem: null, ...before.get(scan.ref), ...scan }))
    if (!list.some(scan => scan.ref === pendingRef.value)) pendingRef.value = null
    for (const { ref: reference } of list) if (!before.has(reference)) await lookUp(reference)
  })

  onMounted(async () => {
    inStore = JSON.stringify(kept.value ?? [])
    scans.value = (kept.value ?? []).map(scan => ({ ...scan, found: { is: 'looking' }, problem: null }))
    watch(scans, (all) => {
      const list = all.map(({ ref: reference, scannedAt, keepReason, isChosen, sent }) => ({ ref: reference, scannedAt, keepReason, isChosen, sent }))
      if (JSON.stringify(list) === inStore) return
      inStore = JSON.stringify(list)
      store(list.length === 0 ? null : list)
    })
    for (const { ref: reference } of scans.value) await lookUp(reference)
  })

  return { lines, counted, missing, pending, spoken, problem, progress, add, retry: lookUp, drop, acknowledge, keep, choose, record, startOver }
}

function isSame(one: BatchLine, other: BatchLine): boolean {
  return one.found.is === 'known' && other.found.is === 'known' && one.found.view.id === other.found.view.id
}
