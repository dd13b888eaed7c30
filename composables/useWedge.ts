import { typedCodes, type TypedKey } from '~~/utils/label/typedKeys'

// Hand scanners leave 7 to 16 ms between characters, people over 100 ms (common practice, from memory).
const LONGEST_GAP_MS = 50
const SILENCE_MS = 100
const SHORTEST_BURST = 9

type TextField = HTMLInputElement | HTMLTextAreaElement

/** A text field as it was before a burst ran into it. */
interface Before { field: TextField, value: string, from: number | null, to: number | null }

/**
 * A hand scanner that types: calls back with each label code in a burst of keys, with or without Enter at its end.
 *
 * A burst that runs into a text field is lifted out: the field gets back what stood in it, its form is not sent, and
 * the call names the field.
 */
export function useWedge(onCode: (code: string, field: HTMLElement | null) => void) {
  let keys: TypedKey[] = []
  let before: Before | null = null
  let lastAt = -Infinity
  let timer: ReturnType<typeof setTimeout> | undefined

  /** Whether what has run in was a burst of codes. */
  function finish(): boolean {
    clearTimeout(timer)
    const codes = keys.length < SHORTEST_BURST ? [] : typedCodes(keys)
    keys = []
    const field = before?.field ?? null
    if (codes.length && before) restore(before)
    before = null
    codes.forEach(code => onCode(code, field))
    return codes.length > 0
  }

  function press(event: KeyboardEvent) {
    const isOurs = !event.ctrlKey && !event.metaKey && !event.altKey && !event.repeat && !event.isComposing
    if (event.key === 'Shift' || event.key === 'CapsLock') return
    if (isOurs && (event.key === 'Enter' || event.key === 'Tab')) {
      // Later than a burst's own gap it is a person's.
      if (event.timeStamp - lastAt > SILENCE_MS || !finish()) return drop()
      event.preventDefault()
      event.stopPropagation()
      return
    }
    if (!isOurs || event.key.length !== 1) return drop()
    if (event.timeStamp - lastAt > LONGEST_GAP_MS) drop()
    lastAt = event.timeStamp
    if (keys.length === 0) before = snapshot(event.target)
    keys.push({ key: event.key, code: event.code, shift: event.shiftKey })
    clearTimeout(timer)
    timer = setTimeout(finish, SILENCE_MS)
  }

  function drop() {
    clearTimeout(timer)
    keys = []
    before = null
  }

  // Before the field or its form takes the key.
  onMounted(() => window.addEventListener('keydown', press, true))
  onBeforeUnmount(() => {
    clearTimeout(timer)
    window.removeEventListener('keydown', press, true)
  })
}

function snapshot(target: EventTarget | null): Before | null {
  if (!(target instanceof HTMLInputElement || target instanceof HTMLTextAreaElement)) return null
  return { field: target, value: target.value, from: target.selectionStart, to: target.selectionEnd }
}

/** Tells the page of it as if it were typed, so that what is bound to the field follows. */
function restore({ field, value, from, to }: Before) {
  field.value = value
  field.dispatchEvent(new Event('input', { bubbles: true }))
  // Fields of numbers and dates have no selection.
  if (from !== null && document.activeElement === field) field.setSelectionRange(from, to)
}
