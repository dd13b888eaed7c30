import type { ProblemDetails } from '../contract/problem'
import type { CustodyEvent } from '../custody/event'
import { KIND_WORDS } from '../custody/words'
import { formatSpan } from '../quantity/instant'
import type { MassReading } from '../quantity/mass'
import type { OutboxEntry } from './entry'
import type { Pause } from './settlement'

/** From this age on it is warned of what was not sent. Units: milliseconds. Our choice. */
export const WARN_AFTER_MS = 24 * 3_600_000

/** @example waitingWords(3) // '3 waiting to send' */
export function waitingWords(count: number): string {
  return `${count} waiting to send`
}

/** How long the oldest has been here. @example ageWords(7_200_000) // 'oldest 2 h' */
export function ageWords(ageMs: number): string {
  return ageMs < 60_000 ? 'just now' : `oldest ${formatSpan(ageMs)}`
}

/** Why nothing goes at present, and when it goes on. */
export const PAUSE_WORDS: Record<Pause, { title: string, text: string }> = {
  'offline': { title: 'No signal', text: 'They go by themselves when there is signal. Nothing is lost if the phone is switched off.' },
  'sign-in': { title: 'Sign in again to send', text: 'The session has ended, or somebody else is signed in. What is saved here stays until you sign in again.' },
  'server': { title: 'The server could not take them', text: 'They are kept here and tried again by themselves.' },
  'storage': { title: 'This phone could not be read', text: 'Its storage did not answer. Close other pages of Collarbook, then open this one again.' },
}

/** The state of an entry in a word. */
export const STATE_WORDS: Record<OutboxEntry['state'], string> = { queued: 'Waiting to send', sending: 'Sending', refused: 'Refused' }

/** What is said once events are saved and not sent. @example 'Saved on this phone, waiting to send: filled' */
export function savedWords(events: readonly Pick<CustodyEvent, 'kind'>[]): string {
  const what = events.length === 1 ? KIND_WORDS[events[0]!.kind].done.toLowerCase() : `${events.length} entries`
  return `Saved on this phone, waiting to send: ${what}`
}

/** The reading of the scale that an event ends with, where it has one. */
export function readingOf({ details }: Pick<CustodyEvent, 'details'>): MassReading | null {
  const { grossAfter, gross } = details as { grossAfter?: MassReading, gross?: MassReading }
  return grossAfter ?? gross ?? null
}

/** A problem in one line, its fields by what a person calls them. */
export function problemWords({ title, detail, errors }: ProblemDetails): string {
  return [detail || title, ...errors?.map(({ path, message }) => path ? `${fieldWords(path)}: ${message}` : message) ?? []].join(' ')
}

/** A field's name as words. @example fieldWords('details.grossAfter.value') // 'gross after' */
function fieldWords(path: string): string {
  const name = path.split('.').filter(part => part !== 'value').at(-1) ?? ''
  return name.replace(/Id$/, '').replaceAll(/[A-Z]/g, letter => ` ${letter.toLowerCase()}`)
}
