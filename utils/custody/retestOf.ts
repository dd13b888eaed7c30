import { monthOfInstant } from '../quantity/month'
import { requalification, type Requalification } from '../requalification/requalification'
import type { CylinderState } from './state'

/** When and by which of the firm's rules a due month is judged. */
export interface RetestDay { nowMs: number, timeZone: string, intervalMonths: number | null, soonDays?: number }

const UNREGISTERED: Requalification = {
  lastMonth: null, intervalMonths: null, dueMonth: null, state: 'unknown', basis: 'Its collar has not been entered.',
}

/**
 * Where a cylinder stands with its periodic test on a day.
 *
 * A mark of a month after the one in which it was entered is a slip of the pen and never counts.
 */
export function retestOf(state: CylinderState, day: RetestDay): Requalification {
  const { stamp, registeredAt } = state
  if (stamp === null) return UNREGISTERED
  const isPast = (month: string, enteredAt: number) => month <= monthOfInstant(enteredAt, day.timeZone)
  const madeMonth = stamp.madeMonth !== null && registeredAt !== null && isPast(stamp.madeMonth, registeredAt) ? stamp.madeMonth : null
  return requalification({
    spec: stamp.spec,
    marks: state.marks.filter(mark => isPast(mark.month, mark.enteredAt)),
    madeMonth,
    nowMs: day.nowMs,
    timeZone: day.timeZone,
    intervalMonthsSetting: day.intervalMonths,
    ...(day.soonDays === undefined ? {} : { soonDays: day.soonDays }),
  })
}
