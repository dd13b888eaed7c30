import { useAim } from '~~/composables/useAim'
import { useNearCodes } from '~~/composables/useNearCodes'
import { useStampSearch } from '~~/composables/useStampSearch'
import { useWedge } from '~~/composables/useWedge'
import { usePreferencesStore } from '~~/stores/preferences'
import type { ProblemDetails } from '~~/utils/contract/problem'

/**
 * How one cylinder after another is named: by the camera, a hand scanner, the code or the stamp as typed.
 *
 * Shape: `entry` is handed whole to `ScanEntry`; `take` gets a label's code, or the id of a cylinder picked by its stamp.
 */
export function useScanEntry(on: { take: (reference: string) => Promise<void>, isStopped: () => boolean, isOver: () => boolean }) {
  const preferences = usePreferencesStore()
  const { hint, canTorch, torch, frozen, listen, freeze, ready } = useAim()

  const mode = ref<'camera' | 'type'>('camera')
  const refusal = ref<string | null>(null)
  const typed = ref('')
  const stampProblem = ref<ProblemDetails | null>(null)
  const near = useNearCodes(typed)
  const { found, searchStamp } = useStampSearch()
  useWedge(add)

  const entry = computed(() => ({
    'mode': mode.value,
    'torch': torch.value,
    'paused': frozen.value || on.isStopped(),
    'hint': on.isStopped() ? 'See to the line below first' : hint.value,
    'typed': typed.value,
    'refusal': refusal.value,
    'near': near.value,
    'found': found.value,
    'unit': preferences.unit,
    'onUpdate:typed': (text: string) => {
      typed.value = text
    },
    'onCode': add,
    'onOther': () => {
      hint.value = 'That is no label of ours'
    },
    'onReady': ready,
    'onRefused': refuse,
    'onSearch': search,
  }))

  async function add(reference: string) {
    if (on.isOver()) return
    freeze()
    found.value = null
    // In the next drawing: a code that comes and goes within one would stay in its field.
    void nextTick(() => {
      typed.value = ''
    })
    await on.take(reference)
    listen()
  }

  function refuse(why: string) {
    refusal.value = why
    mode.value = 'type'
  }

  async function search(text: string) {
    stampProblem.value = await searchStamp(text)
  }

  return { mode, canTorch, torch, refusal, stampProblem, entry }
}
