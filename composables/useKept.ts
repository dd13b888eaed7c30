import { useSessionStore } from '~~/stores/session'

/**
 * What is typed into a form and not recorded yet, kept in this tab for its author: a lost session or a reloaded page
 * loses nothing, and whoever signs in next finds nothing.
 *
 * Shape: `key` names the form; `restored` is what was kept from before, once the page stands in the browser.
 */
export function useKept<T extends object>(key: string) {
  const storageKey = `collarbook-form ${useSessionStore().user?.id ?? ''} ${key}`
  const restored = shallowRef<T | null>(null)

  onMounted(() => {
    restored.value = read<T>(storageKey)
  })

  function keep(entry: T | null) {
    write(storageKey, entry)
  }

  function forget() {
    restored.value = null
    // What is being drawn anew now is kept no more either.
    nextTick(() => keep(null))
  }

  return { restored, keep, forget }
}

function read<T>(key: string): T | null {
  try {
    const text = sessionStorage.getItem(key)
    return text === null ? null : JSON.parse(text) as T
  }
  catch {
    return null
  }
}

function write(key: string, value: object | null) {
  try {
    if (value === null) sessionStorage.removeItem(key)
    else sessionStorage.setItem(key, JSON.stringify(value))
  }
  catch {
    // Without storage the entry is kept as long as the page is open.
  }
}
