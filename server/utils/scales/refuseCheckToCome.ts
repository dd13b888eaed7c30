import type { Day } from '../../../utils/quantity/day'
import { dayOfInstant } from '../../../utils/quantity/day'
import { problem } from '../http/problem'

/** Errors: 422 for a last check on a day that the firm has not seen yet. */
export function refuseCheckToCome(lastCheckOn: Day | null | undefined, timeZone: string, now: number): void {
  if (!lastCheckOn || lastCheckOn <= dayOfInstant(now, timeZone)) return
  throw problem(422, 'This scale cannot be', 'Mend what is named.', [{ path: 'lastCheckOn', message: 'is still to come' }])
}
