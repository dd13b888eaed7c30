import { problemOf, useApi } from '~~/composables/useApi'
import { useScanEntry } from '~~/composables/useScanEntry'
import { useScanSignal } from '~~/composables/useScanSignal'
import { useShipment } from '~~/composables/useShipment'
import type { CylinderView } from '~~/utils/contract/custody'
import type { ProblemDetails } from '~~/utils/contract/problem'
import { formatReading, type MassReading } from '~~/utils/quantity/mass'
import { lineWant, whyNot } from '~~/utils/shipment/steps'
import { cylinderName } from '~~/utils/shipment/changedLines'

/** A cylinder that was scanned and does not stand on the shipment. */
export interface StrangeCylinder { id: string, name: string }

/**
 * A shipment's lines scanned and weighed one after the other, by one person or several at once.
 *
 * Shape: `onScale` is the line that was scanned; `strange` was scanned and is not on the list; `entry` is handed whole to
 * `ScanEntry`.
 */
export function useShipmentWeighing(id: string) {
  const api = useApi()
  const signal = useScanSignal()
  const shipment = useShipment(id)
  const onScaleId = ref<string | null>(null)
  const strange = ref<StrangeCylinder | null>(null)
  const scanProblem = ref<ProblemDetails | null>(null)
  const spoken = ref('')
  /** As it was scanned. */
  let scannedRef = ''

  const lines = computed(() => shipment.data.value?.lines ?? [])
  const onScale = computed(() => lines.value.find(line => line.cylinder.id === onScaleId.value) ?? null)
  const weighed = computed(() => lines.value.filter(line => !lineWant(line)?.startsWith('weighing')).length)
  /** Why nothing is weighed any more; null while it is. */
  const over = computed(() => {
    const found = shipment.data.value
    return found ? whyNot('change', { state: found.state, hasCarrier: true, lines: [], papersLack: [] })[0]?.text ?? null : null
  })
  const { mode, stampProblem, entry } = useScanEntry({ take, isStopped: () => onScaleId.value !== null, isOver: () => over.value !== null })

  /** Takes a scanned code, or the id of a cylinder that was found by its stamp. */
  async function take(ref: string) {
    // What is typed of the one on the scale is not lost to a scan.
    if (onScaleId.value !== null) {
      scanProblem.value = { type: 'about:blank', title: 'One is on the scale', status: 409, detail: 'Keep its weight first, or choose another one.' }
      return signal('stop')
    }
    scanProblem.value = null
    strange.value = null
    try {
      const view = await api.getFresh<CylinderView>(`/api/cylinders/${ref}`)
      const name = cylinderName({ labelCode: view.labelCode, serial: view.stamp?.serial ?? null })
      // Somebody else may just have put it on.
      if (!lines.value.some(line => line.cylinder.id === view.id)) await shipment.refresh()
      scannedRef = ref
      if (lines.value.some(line => line.cylinder.id === view.id)) {
        onScaleId.value = view.id
        spoken.value = `${name}. Weigh it.`
        signal('ok')
      }
      else {
        strange.value = { id: view.id, name }
        spoken.value = `${name} is not on this shipment.`
        signal('att')
      }
    }
    catch (error) {
      const found = problemOf(error)
      scanProblem.value = found
      spoken.value = found.title
      signal(found.status === 404 ? 'unk' : 'att')
    }
  }

  async function keep(gross: MassReading) {
    const name = onScale.value ? cylinderName(onScale.value.cylinder) : ''
    if (!await shipment.weigh(scannedRef, gross)) return signal('stop')
    spoken.value = `${name}: ${formatReading(gross)} kept. ${weighed.value} of ${lines.value.length} weighed.`
    leave()
  }

  /** Puts the scanned stranger on the list, and on the scale. */
  async function putOn() {
    const added = strange.value
    if (!added || !await shipment.putOn([added.id])) return
    strange.value = null
    onScaleId.value = added.id
  }

  function leave() {
    onScaleId.value = null
    strange.value = null
    scanProblem.value = null
  }

  return { ...shipment, lines, onScale, strange, weighed, over, scanProblem, spoken, mode, stampProblem, entry, keep, putOnStranger: putOn, leave }
}
