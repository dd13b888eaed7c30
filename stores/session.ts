import { defineStore } from 'pinia'
import { useApi, problemOf } from '~~/composables/useApi'
import type { SessionAnswer, User } from '~~/utils/contract/session'
import { can, type Permission } from '~~/utils/access/permissions'

/** Who is signed in. Asked for once, on the server where the page is drawn there. */
export const useSessionStore = defineStore('session', () => {
  const api = useApi()
  const user = ref<User | null>(null)
  const known = ref(false)

  const access = computed(() => user.value && { personId: user.value.id, roles: user.value.roles, trainee: user.value.trainee })

  function mayI(permission: Permission): boolean {
    return can(access.value, permission)
  }

  function set(next: User | null) {
    user.value = next
    known.value = true
  }

  /** Errors: any but "not signed in", which is an answer. */
  async function load() {
    if (known.value) return
    try {
      set((await api.get<SessionAnswer>('/api/session')).user)
    }
    catch (error) {
      if (problemOf(error).status !== 401) throw error
      set(null)
    }
  }

  async function signOut() {
    await api.del('/api/session')
    set(null)
  }

  return { user, known, access, mayI, set, load, signOut }
})
