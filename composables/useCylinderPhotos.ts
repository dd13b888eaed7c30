import { useApi } from '~~/composables/useApi'
import { usePostingStore } from '~~/stores/posting'
import type { CylinderPhotosAnswer, EventPhotos } from '~~/utils/contract/uploads'

/**
 * The photos of a cylinder by event, asked for once the page stands: nothing waits for them, and without them the page
 * is whole.
 */
export function useCylinderPhotos(cylinder: () => string | null) {
  const api = useApi()
  const posting = usePostingStore()
  const items = shallowRef<EventPhotos[]>([])

  async function refresh() {
    const ref = cylinder()
    if (ref === null) return
    const answer = await api.get<CylinderPhotosAnswer>(`/api/cylinders/${encodeURIComponent(ref)}/photos`).catch(() => null)
    if (answer) items.value = answer.items
  }

  onMounted(() => watch([cylinder, () => posting.recorded], refresh, { immediate: true }))

  return { items, refresh }
}
