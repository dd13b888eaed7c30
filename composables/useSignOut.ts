import { problemOf } from '~~/composables/useApi'
import { useOutboxStore } from '~~/stores/outbox'
import { usePostingStore } from '~~/stores/posting'
import { useSessionStore } from '~~/stores/session'

/** Signing out; asked about first where entries of this person are not sent. The question is drawn once, in `app.vue`. */
export function useSignOut() {
  const session = useSessionStore()
  const outbox = useOutboxStore()
  const posting = usePostingStore()
  const asks = useState('asks-to-sign-out', () => false)
  const busy = useState('signing-out', () => false)

  async function signOut() {
    await outbox.read()
    if (outbox.entries.length > 0) asks.value = true
    else await confirm()
  }

  async function confirm() {
    busy.value = true
    try {
      await session.signOut()
      // By a fresh page, which holds nothing of what this person has read.
      await navigateTo('/sign-in', { external: true })
    }
    catch (error) {
      posting.say(`Still signed in. ${problemOf(error).detail}`)
    }
    finally {
      busy.value = false
      asks.value = false
    }
  }

  return { asks, busy, signOut, confirm }
}
