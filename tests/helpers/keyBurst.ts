import { vi } from 'vitest'

let now = 1_000

/** One key after a pause, at the window or in a field, which then shows it; timers are the test's own. Gives the key as the page got it. */
export function press(key: string, pauseMs: number, field?: HTMLInputElement): KeyboardEvent {
  now += pauseMs
  vi.advanceTimersByTime(pauseMs)
  const event = new KeyboardEvent('keydown', { key, bubbles: true, cancelable: true })
  Object.defineProperty(event, 'timeStamp', { value: now })
  ;(field ?? document.body).dispatchEvent(event)
  if (!field || event.defaultPrevented) return event
  if (key === 'Enter') {
    field.form!.dispatchEvent(new Event('submit', { cancelable: true }))
  }
  else {
    field.value += key
    field.dispatchEvent(new Event('input', { bubbles: true }))
  }
  return event
}

/** Keys as a hand scanner types them, after a person's pause. */
export function burst(text: string, pauseMs = 8, field?: HTMLInputElement): void {
  press(text.charAt(0), 1_000, field)
  for (const key of text.slice(1)) press(key, pauseMs, field)
}
