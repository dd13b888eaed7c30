import { useWedge } from '~~/composables/useWedge'
import { useSessionStore } from '~~/stores/session'
import { navigationFor } from '~~/utils/access/navigation'
import { readScannedText } from '~~/utils/label/code'

/**
 * What the desk's frame asks of every page: who is signed in, where one may go, and what a scanned or typed code does.
 *
 * Handed to the layout whole: `<NuxtLayout name="desk" v-bind="frame">`.
 */
export function useDeskFrame(title: string | (() => string)) {
  const session = useSessionStore()
  useHead({ title })
  useWedge(code => navigateTo(`/c/${code.toLowerCase()}`))

  function openCode(typed: string) {
    const found = readScannedText(typed)
    return navigateTo(found ? `/c/${found.code.toLowerCase()}` : { path: '/fleet', query: { q: typed } })
  }

  async function signOut() {
    await session.signOut()
    await navigateTo('/sign-in')
  }

  function key(event: KeyboardEvent) {
    if (event.key !== '/' || event.ctrlKey || event.metaKey || event.altKey) return
    if (takesText(event.target)) return
    const field = document.querySelector<HTMLInputElement>('[data-search]') ?? document.querySelector<HTMLInputElement>('[data-code-field]')
    if (!field) return
    event.preventDefault()
    field.focus()
    field.select()
  }

  onMounted(() => window.addEventListener('keydown', key))
  onBeforeUnmount(() => window.removeEventListener('keydown', key))

  return computed(() => ({
    items: navigationFor(session.access),
    person: session.user && { name: session.user.name, role: session.user.roles.join(', ') },
    onCode: openCode,
    onSignOut: signOut,
  }))
}

function takesText(target: EventTarget | null): boolean {
  if (!(target instanceof HTMLElement)) return false
  if (target instanceof HTMLInputElement) return !['checkbox', 'radio', 'button', 'submit'].includes(target.type)
  return target.isContentEditable || ['TEXTAREA', 'SELECT'].includes(target.tagName)
}
