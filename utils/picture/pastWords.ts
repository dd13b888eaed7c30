import { formatInstant } from '../quantity/instant'

/** The past that a page's address asks for, each part an instant in ISO 8601; null where it does not. */
export interface AskedPast { asOf: string | null, knownAt: string | null }

/** Which past a page shows, and what that takes in, in two sentences. */
export function pastInWords({ asOf, knownAt }: AskedPast, timeZone: string, nowMs: number): { title: string, what: string } {
  const at = (instant: string) => formatInstant(Date.parse(instant), timeZone, nowMs)
  if (asOf !== null && knownAt !== null) {
    return { title: `As it stood ${at(asOf)}, as known ${at(knownAt)}`, what: 'What happened or was recorded later is not in it.' }
  }
  if (knownAt !== null) return { title: `As it was known ${at(knownAt)}`, what: 'What was recorded later is not in it, also where it had happened before.' }
  return { title: `As it stood ${asOf === null ? '' : at(asOf)}`.trim(), what: 'By all that is known of that time now: late entries and corrections are in it.' }
}
