import { readScannedText } from '~~/utils/label/code'

// Hand scanners leave 7 to 16 ms between characters, people over 100 ms (common practice, from memory).
const LONGEST_GAP_MS = 50
const SILENCE_MS = 100
const SHORTEST_BURST = 9

/**
 * A hand scanner that types: calls back with the label code in a burst of keys, wherever the focus is but in a field.
 *
 * In a field the text stays where it is: the field itself reads it.
 */
export function useWedge(onCode: (code: string) => void) {
  let buffer = ''
  let lastAt = 0
  let timer: ReturnType<typeof setTimeout> | undefined

  function finish() {
    clearTimeout(timer)
    const text = buffer
    buffer = ''
    if (text.length < SHORTEST_BURST) return false
    const found = readScannedText(text)
    if (found) onCode(found.code)
    return found !== null
  }

  function key(event: KeyboardEvent) {
    if (event.ctrlKey || event.metaKey || event.altKey || takesText(event.target)) return
    if (event.key === 'Enter' || event.key === 'Tab') {
      if (buffer.length >= SHORTEST_BURST && finish()) event.preventDefault()
      buffer = ''
      return
    }
    if (event.key.length !== 1) return
    if (event.timeStamp - lastAt > LONGEST_GAP_MS) buffer = ''
    lastAt = event.timeStamp
    buffer += event.key
    clearTimeout(timer)
    timer = setTimeout(finish, SILENCE_MS)
  }

  onMounted(() => window.addEventListener('keydown', key))
  onBeforeUnmount(() => {
    clearTimeout(timer)
    window.removeEventListener('keydown', key)
  })
}

function takesText(target: EventTarget | null): boolean {
  return target instanceof HTMLElement && (target.isContentEditable || ['INPUT', 'TEXTAREA', 'SELECT'].includes(target.tagName))
}
