import { openRecoveries, type OpenRecovery } from '~~/composables/openRecoveries'
import { useSessionStore } from '~~/stores/session'

/** The recoveries that this person has open on this device; known once the page stands in the browser. */
export function useOpenRecoveries() {
  const session = useSessionStore()
  const open = ref<OpenRecovery[]>([])
  onMounted(() => {
    open.value = openRecoveries(session.user?.id)
  })
  return open
}
