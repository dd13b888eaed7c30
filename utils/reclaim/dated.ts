import { dayBefore, type Day } from '../quantity/day'

/** Something that counts from a day on, as it was recorded. */
export interface DatedRow { id: string, fromDay: Day, recordedAt: number, isWithdrawn: boolean }

/** How a row stands on a day: it counts now, will, has counted, never did because another took its place at once, or was withdrawn. */
export type RowStanding
  = | { is: 'in-force' | 'to-come' | 'replaced' | 'withdrawn' }
    | { is: 'ended', untilDay: Day }

/** The standing of each row on a day, by its id. Of those that have begun the latest counts; of two from one day the one recorded last. */
export function standings(rows: readonly DatedRow[], today: Day): Map<string, RowStanding> {
  const counting = rows.filter(({ isWithdrawn }) => !isWithdrawn)
    .sort((a, b) => a.fromDay.localeCompare(b.fromDay) || a.recordedAt - b.recordedAt || a.id.localeCompare(b.id))
  const found = new Map<string, RowStanding>(rows.filter(({ isWithdrawn }) => isWithdrawn).map(({ id }) => [id, { is: 'withdrawn' }]))
  counting.forEach(({ id, fromDay }, index) => {
    const next = counting[index + 1]
    found.set(id, next?.fromDay === fromDay
      ? { is: 'replaced' }
      : fromDay > today
        ? { is: 'to-come' }
        : next && next.fromDay <= today ? { is: 'ended', untilDay: dayBefore(next.fromDay) } : { is: 'in-force' })
  })
  return found
}

/** Whether a row may still be taken back: before it begins, and on the day it was recorded, for a slip of the pen. */
export function mayBeWithdrawn({ fromDay, isWithdrawn }: Pick<DatedRow, 'fromDay' | 'isWithdrawn'>, recordedOn: Day, today: Day): boolean {
  return !isWithdrawn && (fromDay > today || recordedOn === today)
}
