import { requestUnits } from '../custody/requestUnits'
import { inOrder, isWaiting, type OutboxEntry } from './entry'

/** How long what was saved last is not sent by itself, so that it can be taken out again. Units: milliseconds. Our choice. */
export const HOLD_MS = 10_000

/**
 * How long the events of one request are together at most, as JSON: the server takes half a mebibyte, and a character three
 * bytes at most. Whoever sends more than it takes may find the connection cut before the answer. Units: characters. Our choice.
 */
const MOST_CHARACTERS = 150_000

/** What the sender does next: send these in one request, look again at an instant, or nothing. */
export type Step = { is: 'send', entries: OutboxEntry[] } | { is: 'wait', untilMs: number } | { is: 'done' }

/**
 * The next step of the one sender of a device.
 *
 * What was saved together and last is held for a while, unless it is sent by hand, was sent before, or another follows it.
 *
 * Shape: `most` is how many events go in one request, fewer where they are long; the halves of a pair go together even
 * where that is too many.
 */
export function nextStep(entries: readonly OutboxEntry[], given: { personId: string, nowMs: number, most: number, byHand: boolean }): Step {
  const waiting = inOrder(entries.filter(entry => entry.personId === given.personId && isWaiting(entry)))
  const last = waiting.at(-1)
  if (!last) return { is: 'done' }
  const age = given.nowMs - last.queuedAt
  // A clock that was set back since then must hold nothing for ever.
  const isHeld = !given.byHand && age >= 0 && age < HOLD_MS
  const free = isHeld ? waiting.filter(({ queuedAt, tries }) => queuedAt !== last.queuedAt || tries > 0) : waiting
  return free.length === 0 ? { is: 'wait', untilMs: last.queuedAt + HOLD_MS } : { is: 'send', entries: firstOf(free, given.most) }
}

function firstOf(entries: readonly OutboxEntry[], most: number): OutboxEntry[] {
  const units = requestUnits(entries.map(({ event }) => event))
  const taken = new Set<number>()
  let characters = 0
  for (const unit of units) {
    characters += unit.reduce((sum, position) => sum + JSON.stringify(entries[position]!.event).length, 0)
    if (taken.size > 0 && (taken.size + unit.length > most || characters > MOST_CHARACTERS)) break
    for (const position of unit) taken.add(position)
  }
  return entries.filter((_, position) => taken.has(position))
}

/** How many parts a request can be divided into: the halves of a pair are one. */
export function unitsOf(entries: readonly OutboxEntry[]): number {
  return requestUnits(entries.map(({ event }) => event)).length
}
