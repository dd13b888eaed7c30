import type { useBatch } from '~~/composables/useBatch'
import { useScanEntry } from '~~/composables/useScanEntry'
import { usePreferencesStore } from '~~/stores/preferences'

/**
 * How cylinders come onto a batch's list.
 *
 * Shape: `entry`, `list` and `keys` are handed whole to `ScanEntry`, `ScanBatch` and `ScanFoot`. While `isOver`, nothing
 * is taken any more.
 */
export function useBatchScan(batch: ReturnType<typeof useBatch>, isOver: () => boolean = () => false) {
  const preferences = usePreferencesStore()
  const wrongEndRef = ref<string | null>(null)
  const { mode, canTorch, torch, refusal, stampProblem, entry } = useScanEntry({
    take: batch.add, isStopped: () => batch.pending.value !== null, isOver,
  })

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

  async function choose(reference: string, serialEnd: string) {
    wrongEndRef.value = await batch.choose(reference, serialEnd) ? null : reference
  }

  return { mode, stampProblem, entry, list, keys }
}
