import { useAim } from '~~/composables/useAim'
import type { useBatch } from '~~/composables/useBatch'
import { useNearCodes } from '~~/composables/useNearCodes'
import { useStampSearch } from '~~/composables/useStampSearch'
import { useWedge } from '~~/composables/useWedge'
import { usePreferencesStore } from '~~/stores/preferences'
import type { ProblemDetails } from '~~/utils/contract/problem'

/**
 * How cylinders come onto a batch's list: by the camera, a hand scanner, the code or the stamp as typed.
 *
 * Shape: `entry`, `list` and `keys` are handed whole to `ScanEntry`, `ScanBatch` and `ScanFoot`. While `isOver`, nothing
 * is taken any more.
 */
export function useBatchScan(batch: ReturnType<typeof useBatch>, isOver: () => boolean = () => false) {
  const preferences = usePreferencesStore()
  const { hint, canTorch, torch, frozen, listen, freeze, ready } = useAim()

  const mode = ref<'camera' | 'type'>('camera')
  const refusal = ref<string | null>(null)
  const typed = ref('')
  const wrongEndRef = ref<string | null>(null)
  const stampProblem = ref<ProblemDetails | null>(null)
  const near = useNearCodes(typed)
  const { found, searchStamp } = useStampSearch()
  useWedge(add)

  const isStopped = computed(() => batch.pending.value !== null)
  const entry = computed(() => ({
    'mode': mode.value,
    'torch': torch.value,
    'paused': frozen.value || isStopped.value,
    'hint': isStopped.value ? 'See to the line below first' : hint.value,
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
  const list = computed(() => ({
    lines: batch.lines.value,
    unit: preferences.unit,
    wrongEndRef: wrongEndRef.value,
    onDrop: batch.drop,
    onKeep: batch.keep,
    onChoose: choose,
    onRetry: batch.retry,
  }))
  const keys = computed(() => ({
    'mode': mode.value,
    'torch': torch.value,
    'sounds': preferences.scanSounds,
    'canTorch': canTorch.value,
    'canChange': refusal.value === null,
    'isStopped': batch.pending.value?.verdict?.standing === 'counted',
    'progress': batch.progress.value,
    'onUpdate:mode': (next: 'camera' | 'type') => {
      mode.value = next
    },
    'onUpdate:torch': (next: boolean) => {
      torch.value = next
    },
    'onUpdate:sounds': (next: boolean) => {
      preferences.scanSounds = next
    },
    'onSeen': batch.acknowledge,
  }))

  async function add(reference: string) {
    if (isOver()) return
    freeze()
    found.value = null
    // In the next drawing: a code that comes and goes within one would stay in its field.
    void nextTick(() => {
      typed.value = ''
    })
    await batch.add(reference)
    listen()
  }

  function refuse(why: string) {
    refusal.value = why
    mode.value = 'type'
  }

  async function search(text: string) {
    stampProblem.value = await searchStamp(text)
  }

  async function choose(reference: string, serialEnd: string) {
    wrongEndRef.value = await batch.choose(reference, serialEnd) ? null : reference
  }

  return { mode, stampProblem, entry, list, keys }
}
