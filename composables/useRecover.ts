import { deviceNow } from '~~/stores/posting'
import { openRecoveries, RECOVERY } from '~~/composables/useOpenRecoveries'
import { useEventForm } from '~~/composables/useEventForm'
import { useRecording } from '~~/composables/useRecording'
import { useScanSignal } from '~~/composables/useScanSignal'
import { useSessionStore } from '~~/stores/session'
import type { CylinderView } from '~~/utils/contract/custody'
import type { DraftContext } from '~~/utils/custody/draft/draft'
import { emptyFill, FILLED, readFill } from '~~/utils/custody/draft/filled'
import type { MassReading, MassUnit } from '~~/utils/quantity/mass'
import { formatReading } from '~~/utils/quantity/mass'
import { lastGrossOf, newCourse, notReadyBecause, readingsOf, type RecoveryCourse, type RecoveryStep } from '~~/utils/recover/course'
import { recoveryPlan } from '~~/utils/recover/plan'
import { minutesToStop } from '~~/utils/recover/rate'
import { readingDoubt, withReading } from '~~/utils/recover/readings'
import { fillStage, isStop } from '~~/utils/recover/stage'
import { STAGE_STATUS, stopCall, wayWords } from '~~/utils/recover/words'

const TICK_MS = 5_000
const CALL_AGAIN_MS = 2_500

/**
 * A recovery beside the scale, kept on the device after every reading.
 *
 * Shape: `view` and `context` are needed only until filling begins: from then on the stop weight stands as it was settled.
 */
export function useRecover(input: {
  view: () => CylinderView | null
  context: () => DraftContext | null
  /** The cylinder as the address names it, and as people do. */
  reference: string
  name: () => string
  unit: () => MassUnit
  supervisorId: () => string
}) {
  const session = useSessionStore()
  const signal = useScanSignal()
  const now = ref(0)
  const doubt = ref<{ gross: MassReading, text: string } | null>(null)
  const tried = ref(false)
  const isReady = ref(false)

  const known = input.view() ? null : keptHere(session.user?.id, input.reference)
  const cylinderId = input.view()?.id ?? known?.id ?? input.reference

  const form = useEventForm<RecoveryCourse>(
    `${cylinderId} ${RECOVERY}`,
    () => newCourse(
      input.context() ? FILLED.empty(input.context()!) : emptyFill(),
      known ?? { id: cylinderId, labelCode: input.view()?.labelCode ?? null, name: input.name() },
    ),
    input.supervisorId,
    'device',
  )
  const { draft: course, envelope } = form

  const plan = computed(() => course.value.plan ?? (input.view() ? recoveryPlan(input.view()!, '') : null))
  const last = computed(() => lastGrossOf(course.value))
  const stage = computed(() => plan.value && last.value ? fillStage(plan.value, last.value) : 'below')
  const minutes = computed(() => plan.value ? minutesToStop(readingsOf(course.value), plan.value.stopGrams, now.value) : null)
  const words = computed(() => plan.value && last.value ? wayWords(plan.value, last.value, stage.value, minutes.value, input.unit()) : null)
  const mustStop = computed(() => course.value.step === 'filling' && isStop(stage.value) && readingsOf(course.value).length > 0 && !course.value.stopSeen)
  const spoken = computed(() => {
    if (course.value.step !== 'filling' || !words.value) return ''
    if (mustStop.value) return `${stopCall(stage.value)} ${words.value.line}`
    return `${last.value ? formatReading(last.value) : ''}. ${words.value.head}`
  })
  const notReady = computed(() => notReadyBecause(course.value, plan.value))

  function begin() {
    tried.value = true
    const settled = input.view() ? recoveryPlan(input.view()!, deviceNow()) : null
    if (notReady.value || !settled) return
    tried.value = false
    go('filling', { plan: settled, refrigerant: settled.refrigerant, level: { ...course.value.level, refrigerant: settled.refrigerant } })
  }

  function go(step: RecoveryStep, more: Partial<RecoveryCourse> = {}) {
    course.value = { ...course.value, ...more, step }
    window.scrollTo({ top: 0 })
    // What was pressed is gone: the keyboard goes on from the top of the step.
    document.getElementById('main')?.focus({ preventScroll: true })
  }

  /** Notes what the scale shows; what may be a slip of the finger is asked about once. */
  function note(gross: MassReading) {
    const text = plan.value && readingDoubt(plan.value, gross, last.value)
    if (!text) return take(gross)
    doubt.value = { gross, text }
    signal('unk')
  }

  function take(gross: MassReading) {
    const before = stage.value
    doubt.value = null
    now.value = Date.now()
    const readings = withReading(readingsOf(course.value), { at: deviceNow(), gross })
    course.value = { ...course.value, onTheWay: { ...course.value.onTheWay, readings }, stopSeen: false }
    // A stop is called out by itself, and again until it was seen.
    if (!isStop(stage.value)) signal(stage.value === before ? 'ok' : STAGE_STATUS[stage.value])
  }

  function undoLast() {
    const { readings: _, ...others } = course.value.onTheWay
    const left = readingsOf(course.value).slice(0, -1)
    doubt.value = null
    course.value = { ...course.value, onTheWay: left.length ? { ...others, readings: left } : others, stopSeen: true }
  }

  const read = computed(() => readFill(course.value))
  const recording = useRecording({
    content: () => course.value.step !== 'weigh' || 'reason' in read.value
      ? null
      : {
          cylinderId,
          kind: 'filled',
          ...(envelope.value.supervisorId && { supervisorId: envelope.value.supervisorId }),
          ...(envelope.value.note.trim() && { note: envelope.value.note.trim() }),
          details: read.value.details,
        },
    at: () => envelope.value.at,
    reason: () => session.user?.trainee && !envelope.value.supervisorId
      ? 'Choose who supervises.'
      : 'reason' in read.value ? read.value.reason : null,
    tick: 'Tick that it happened, then record it.',
    send: form.send,
  })

  let ticking: ReturnType<typeof setInterval> | undefined
  let calling: ReturnType<typeof setInterval> | undefined
  onMounted(() => {
    now.value = Date.now()
    ticking = setInterval(() => {
      now.value = Date.now()
    }, TICK_MS)
    watch(mustStop, (must) => {
      clearInterval(calling)
      if (!must) return
      signal('stop')
      calling = setInterval(() => signal('stop'), CALL_AGAIN_MS)
    }, { immediate: true })
    isReady.value = true
  })
  onBeforeUnmount(() => {
    clearInterval(ticking)
    clearInterval(calling)
  })

  return {
    form, recording, course, envelope, isReady, plan, last, stage, words, mustStop, spoken, doubt,
    refusal: computed(() => tried.value ? notReady.value : null),
    begin, go, note, take, undoLast,
  }
}

function keptHere(personId: string | undefined, reference: string) {
  if (import.meta.server) return null
  const asked = reference.toUpperCase()
  return openRecoveries(personId).find(({ id, labelCode }) => id.toUpperCase() === asked || labelCode === asked) ?? null
}
