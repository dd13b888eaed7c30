import { daysUntilEndOfMonth, type Month } from '../quantity/month'
import type { Lifecycle } from './cylinderView'
import { daysSince } from './daysSince'
import type { Finding } from './finding'
import { notSeen } from './findings/record'
import { retestOverdue, retestSoon } from './findings/retest'

/** A day, and the firm's settings of its reminders. */
export interface Day {
  nowMs: number
  timeZone: string
  retest: { soonDays: number, notSeenDays: number, missingDays: number }
}

/** What of a cylinder a date is held against. */
export interface Dated {
  lifecycle: Lifecycle
  nothingInIt: boolean
  /** null where no retest is required or no date is known. */
  dueMonth: Month | null
  lastSeenAt: number | null
}

const ENDED: readonly Lifecycle[] = ['condemned', 'retired']
const ELSEWHERE: readonly Lifecycle[] = ['missing', 'at-reclaim', 'at-test']

/** Whether the due month has passed: it is in date through that month's last day. */
export function isOverdue(dueMonth: Month | null, { nowMs, timeZone }: Pick<Day, 'nowMs' | 'timeZone'>): boolean {
  return dueMonth !== null && daysUntilEndOfMonth(dueMonth, nowMs, timeZone) < 0
}

/** The findings that come and go with the date alone: the one place that knows them, for the view and for the list. */
export function dateFindings(dated: Dated, day: Day): Finding[] {
  if (ENDED.includes(dated.lifecycle)) return []
  return [...ofRetest(dated, day), ...ofSight(dated, day)]
}

function ofRetest({ dueMonth, nothingInIt }: Dated, day: Day): Finding[] {
  if (dueMonth === null) return []
  if (isOverdue(dueMonth, day)) return [retestOverdue(dueMonth, { severity: nothingInIt ? 'stop' : 'caution', nothingInIt })]
  return daysUntilEndOfMonth(dueMonth, day.nowMs, day.timeZone) <= day.retest.soonDays ? [retestSoon(dueMonth)] : []
}

/** Calendar days for which nobody has seen a cylinder that ought to be here; null while these are not too many. */
export function unseenDays({ lifecycle, lastSeenAt }: Pick<Dated, 'lifecycle' | 'lastSeenAt'>, { nowMs, timeZone, retest }: Day): number | null {
  if (lastSeenAt === null || ENDED.includes(lifecycle) || ELSEWHERE.includes(lifecycle)) return null
  const days = daysSince(lastSeenAt, nowMs, timeZone)
  return days >= retest.notSeenDays ? days : null
}

function ofSight(dated: Dated, day: Day): Finding[] {
  const days = unseenDays(dated, day)
  return days === null ? [] : [notSeen(days, dated.lastSeenAt!, day.retest.missingDays)]
}
