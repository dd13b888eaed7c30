import { openCylinder, useScanToOpen } from '~~/composables/useScanToOpen'
import { useSignOut } from '~~/composables/useSignOut'
import { useWedge } from '~~/composables/useWedge'
import { usePreferencesStore } from '~~/stores/preferences'
import { useSessionStore } from '~~/stores/session'
import { navigationFor } from '~~/utils/access/navigation'
import { readScannedText } from '~~/utils/label/code'

const LONGEST_BURST_GAP_MS = 60

/**
 * What the desk's frame asks of every page: who is signed in, where one may go, and what a scanned or typed code does.
 *
 * A page with a list or a form of its own takes what a hand scanner reads; elsewhere it opens the cylinder. Handed to
 * the layout whole: `<NuxtLayout name="desk" v-bind="frame">`.
 */
export function useDeskFrame(title: string | (() => string), onScan?: (code: string) => unknown) {
  const session = useSessionStore()
  const preferences = usePreferencesStore()
  const { signOut } = useSignOut()
  let lastKeyAt = -Infinity
  useHead({ title })
  if (onScan) useWedge(code => void onScan(code))
  else useScanToOpen()

  function openCode(typed: string) {
    const found = readScannedText(typed)
    return found ? openCylinder(found.code) : navigateTo({ path: '/fleet', query: { q: typed } })
  }

  function key(event: KeyboardEvent) {
    const isBurst = event.timeStamp - lastKeyAt < LONGEST_BURST_GAP_MS
    lastKeyAt = event.timeStamp
    // An address in a hand scanner's burst has slashes too.
    if (isBurst || !preferences.keyShortcuts || event.key !== '/' || event.ctrlKey || event.metaKey || event.altKey) return
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
