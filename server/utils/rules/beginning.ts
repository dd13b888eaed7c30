import { firstInstantOfDay } from '../../../utils/quantity/day'
import { formatInstant } from '../../../utils/quantity/instant'
import { problem } from '../http/problem'

/** The instant (UTC milliseconds) that a rule names for its beginning; null where it names none: at once. */
export function instantNamed(from: string | undefined, timeZone: string): number | null {
  if (from === undefined) return null
  return from.length === 'YYYY-MM-DD'.length ? firstInstantOfDay(from, timeZone) : Date.parse(from)
}

/**
 * The instant (UTC milliseconds) at which a rule is asked to begin; null for at once.
 *
 * Errors: 422 where that has passed: what was recorded keeps the rule of its day.
 */
export function beginningOf(from: string | undefined, timeZone: string, nowMs: number): number | null {
  const fromAt = instantNamed(from, timeZone)
  if (fromAt === null || fromAt >= nowMs) return fromAt
  throw problem(422, 'That has passed', 'A rule begins now or later: what was recorded keeps the rule of its day.', [
    { path: 'from', message: `${formatInstant(fromAt, timeZone, nowMs)} has passed. Leave it out to begin at once.` },
  ], { type: 'in-the-past' })
}
