import { useApi } from '~~/composables/useApi'
import { useLoaded } from '~~/composables/useLoaded'
import type { EvacuationLevelAnswer } from '~~/utils/contract/recovery'
import { addressOf, levelDraft, levelQuery, type LevelDraft } from '~~/utils/recovery/levelDraft'

// So long after the last key the address follows.
const PAUSE_MS = 250

/** The level for what a person says of an appliance, asked anew as they say it; the address of the page follows. */
export function useEvacuationLevel() {
  const api = useApi()
  const route = useRoute()
  const draft = ref<LevelDraft>(levelDraft(route.query))
  const asked = computed(() => levelQuery(draft.value))
  const isAsked = computed(() => Object.keys(asked.value).length > 0)
  const loaded = useLoaded('evacuation-level',
    async () => isAsked.value ? api.get<EvacuationLevelAnswer>('/api/evacuation-level', asked.value) : null,
    [() => JSON.stringify(asked.value)])

  let waiting: ReturnType<typeof setTimeout> | undefined
  let written = address(draft.value)
  watch(() => address(draft.value), () => {
    clearTimeout(waiting)
    waiting = setTimeout(() => {
      written = address(draft.value)
      void navigateTo({ path: route.path, query: addressOf(draft.value) }, { replace: true })
    }, PAUSE_MS)
  })
  // A link to this page from itself, or the way back in the browser's history; not the address that was written here.
  watch(() => route.query, (query) => {
    const given = levelDraft(query)
    if (address(given) !== written) draft.value = given
  })
  onBeforeUnmount(() => clearTimeout(waiting))

  return { draft, isAsked, answer: loaded.data, problem: loaded.problem, refresh: loaded.refresh }
}

function address(draft: LevelDraft): string {
  return JSON.stringify(addressOf(draft))
}
