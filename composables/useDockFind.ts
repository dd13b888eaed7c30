import { useAim } from '~~/composables/useAim'
import { useWedge } from '~~/composables/useWedge'
import type { DockCylinder } from '~~/utils/contract/dock'
import { cylindersMeant } from '~~/utils/dock/findCylinder'

/**
 * How a cylinder of the shipment is found on the dock: by the camera, a hand scanner, or what was typed.
 *
 * Shape: `camera` and `field` are handed whole to `ScanViewfinder` and `DockFind`; `meet` gets the one that was found.
 */
export function useDockFind(cylinders: () => readonly DockCylinder[], on: { meet: (cylinderId: string) => unknown, isBusy: () => boolean }) {
  const { hint, torch, frozen, listen, freeze, ready } = useAim()
  const scanning = ref(false)
  const typed = ref('')
  const several = ref<DockCylinder[]>([])
  const problem = ref<string | null>(null)

  function find(text: string) {
    if (on.isBusy()) return
    const found = cylindersMeant(cylinders(), text)
    several.value = found.length > 1 ? found : []
    problem.value = found.length > 0 ? null : 'No cylinder of this shipment has it. Look again, or tell of one that is not on the papers.'
    if (found.length === 1) meet(found[0]!.cylinderId)
  }

  function meet(cylinderId: string) {
    freeze()
    clear()
    on.meet(cylinderId)
  }

  function clear() {
    ;[several.value, problem.value, typed.value, scanning.value] = [[], null, '', false]
  }

  function scan() {
    clear()
    scanning.value = true
    listen()
  }

  useWedge(find)

  const camera = computed(() => ({
    torch: torch.value,
    paused: frozen.value,
    text: hint.value,
    onCode: find,
    onOther: () => {
      problem.value = 'That is no label of ours. Type the serial.'
    },
    onReady: ready,
    onRefused: (because: string) => {
      scanning.value = false
      problem.value = because
    },
  }))
  const field = computed(() => ({
    'modelValue': typed.value,
    'several': several.value,
    'problem': problem.value,
    'onUpdate:modelValue': (text: string) => {
      typed.value = text
    },
    'onFind': find,
    'onPick': meet,
  }))

  return { scanning, camera, field, scan, clear }
}
