import { defineStore } from 'pinia'
import { keepPerson, keptPerson } from '~~/composables/keptPerson'
import { useApi, problemOf } from '~~/composables/useApi'
import type { SessionAnswer, User } from '~~/utils/contract/session'
import { can, type Permission } from '~~/utils/access/permissions'

/**
 * Who is signed in. Asked for once, on the server where the page is drawn there; a page that is opened without the server
 * goes by who was last signed in on this device (kept there by plugins/keptSession.client.ts).
 */
export const useSessionStore = defineStore('session', () => {
  const api = useApi()
  const user = ref<User | null>(null)
  const known = ref(false)
  /** Whether that is what the device remembers, and the server has not been asked yet or was not reached. */
  const isKept = ref(false)

  const access = computed(() => user.value && { personId: user.value.id, roles: user.value.roles, trainee: user.value.trainee })

  function mayI(permission: Permission): boolean {
    return can(access.value, permission)
  }

  function set(next: User | null) {
    user.value = next
    known.value = true
    isKept.value = false
  }

  /** Errors: any but "not signed in" and, in the browser, "not reached", which are answers. */
  async function load() {
    if (known.value) return
    const kept = import.meta.client ? keptPerson() : null
    if (kept) {
      set(kept)
      isKept.value = true
      return
    }
    try {
      set((await api.get<SessionAnswer>('/api/session')).user)
    }
    catch (error) {
      const { status } = problemOf(error)
      if (status === 401) set(null)
      else if (status !== 0 || import.meta.server) throw error
    }
  }

  /**
   * Asks the server who is signed in, where so far only the device said so. Answers whether that session has ended: then
   * this page stays as it is, for what was typed into it is nobody else's who has signed in meanwhile.
   */
  async function confirm(): Promise<'same' | 'ended' | 'unreached'> {
    if (!isKept.value) return 'same'
    try {
      const { user: found } = Object(await api.get<unknown>('/api/session')) as Partial<SessionAnswer>
      // A page of a network that wants its guests to sign in.
      if (!found) return 'unreached'
      if (found.id !== user.value?.id) {
        keepPerson(found)
        return 'ended'
      }
      set(found)
      return 'same'
    }
    catch (error) {
      return problemOf(error).status === 401 ? 'ended' : 'unreached'
    }
  }

  async function signOut() {
    await api.del('/api/session')
    set(null)
    // What this person could read goes with them; what is not sent yet stays, for nobody else to see.
    const { kitBox } = await import('~~/composables/kitBox')
    await kitBox().clear().catch(() => undefined)
  }

  return { user, known, isKept, access, mayI, set, load, confirm, signOut }
})
