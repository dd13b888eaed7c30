import { keptPrefix } from '~~/composables/keptPrefix'
import { useSessionStore } from '~~/stores/session'

/** A recovery that this person began on this device and has not recorded. */
export interface OpenRecovery { id: string, labelCode: string | null, name: string }

/** What a recovery is kept under, behind the cylinder's id. */
export const RECOVERY = 'recovery'

/** The recoveries that a person has open on this device. */
export function openRecoveries(personId: string | undefined): OpenRecovery[] {
  const prefix = keptPrefix(personId)
  try {
    return Object.entries(localStorage)
      .filter(([key]) => key.startsWith(prefix) && key.endsWith(` ${RECOVERY}`))
      .flatMap(([, text]) => {
        const { cylinder } = Object(Object(JSON.parse(String(text))).draft) as { cylinder?: OpenRecovery }
        return cylinder ? [cylinder] : []
      })
  }
  catch {
    // Without storage nothing is kept.
    return []
  }
}

/** The same for whoever is signed in; known once the page stands in the browser. */
export function useOpenRecoveries() {
  const session = useSessionStore()
  const open = ref<OpenRecovery[]>([])
  onMounted(() => {
    open.value = openRecoveries(session.user?.id)
  })
  return open
}
