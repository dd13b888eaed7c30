import { keptPrefix } from '~~/composables/keptPrefix'
import { useSessionStore } from '~~/stores/session'

/** Where something is kept: until the tab is closed, or on the device until it is forgotten. */
export type KeptOn = 'tab' | 'device'

/**
 * What is typed into a form and not recorded yet, kept in this tab for its author: a lost session or a reloaded page
 * loses nothing, and whoever signs in next finds nothing. Kept on the device, a closed tab loses nothing either.
 *
 * Shape: `key` names the form; `restored` is what was kept from before, once the page stands in the browser.
 */
export function useKept<T extends object>(key: string, where: KeptOn = 'tab') {
  const storageKey = keptPrefix(useSessionStore().user?.id) + key
  const restored = shallowRef<T | null>(null)

  onMounted(() => {
    restored.value = read<T>(where, storageKey)
  })

  function keep(entry: T | null) {
    write(where, storageKey, entry)
  }

  function forget() {
    restored.value = null
    // What is being drawn anew now is kept no more either.
    nextTick(() => keep(null))
  }

  /** Calls back with what another tab keeps on the device from now on; null where it has forgotten it. */
  function followOtherTabs(changed: (entry: T | null) => void) {
    const hear = ({ key: about }: StorageEvent) => {
      if (about === storageKey) changed(read<T>(where, storageKey))
    }
    onMounted(() => window.addEventListener('storage', hear))
    onBeforeUnmount(() => window.removeEventListener('storage', hear))
  }

  return { restored, keep, forget, followOtherTabs }
}

function storageOf(where: KeptOn): Storage {
  return where === 'tab' ? sessionStorage : localStorage
}

function read<T>(where: KeptOn, key: string): T | null {
  try {
    const text = storageOf(where).getItem(key)
    return text === null ? null : JSON.parse(text) as T
  }
  catch {
    return null
  }
}

function write(where: KeptOn, key: string, value: object | null) {
  try {
    if (value === null) storageOf(where).removeItem(key)
    else storageOf(where).setItem(key, JSON.stringify(value))
  }
  catch {
    // Without storage the entry is kept as long as the page is open.
  }
}
