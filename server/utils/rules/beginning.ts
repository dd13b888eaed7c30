import { firstInstantOfDay } from '../../../utils/quantity/day'
import { formatInstant } from '../../../utils/quantity/instant'
import { problem } from '../http/problem'

/**
 * The instant (UTC milliseconds) at which a rule is asked to begin; null for at once.
 *
 * Errors: 422 where that has passed: what was recorded keeps the rule of its day.
 */
export function beginningOf(from: string | undefined, timeZone: string, nowMs: number): number | null {
  if (from === undefined) return null
  const fromAt = from.length === 'YYYY-MM-DD'.length ? firstInstantOfDay(from, timeZone) : Date.parse(from)
  if (fromAt >= nowMs) return fromAt
  throw problem(422, 'That has passed', 'A rule begins now or later: what was recorded keeps the rule of its day.', [
    { path: 'from', message: `${formatInstant(fromAt, timeZone, nowMs)} has passed. Leave it out to begin at once.` },
  ], { type: 'in-the-past' })
}
