import { exactGrams } from '../quantity/mass'
import { monthOfInstant } from '../quantity/month'
import type { RetestRules } from '../requalification/ownerChoice'
import { requalification, type Requalification } from '../requalification/requalification'
import type { Service } from '../requalification/testPeriod'
import type { CylinderState } from './state'

/** When and by which of the owner's rules a due month is judged. */
export interface RetestDay { nowMs: number, timeZone: string, rules: RetestRules, soonDays?: number }

const UNREGISTERED: Requalification = {
  lastMonth: null, intervalMonths: null, dueMonth: null, state: 'unknown', basis: 'Its collar has not been entered.', choice: null,
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
  return requalification({
    steel: {
      spec: stamp.spec,
      madeMonth: stamp.madeMonth !== null && registeredAt !== null && isPast(stamp.madeMonth, registeredAt) ? stamp.madeMonth : null,
      waterCapacityGrams: stamp.waterCapacity === null ? null : exactGrams(stamp.waterCapacity),
      service: serviceOf(state),
    },
    marks: state.marks.filter(mark => isPast(mark.month, mark.enteredAt)),
    nowMs: day.nowMs,
    timeZone: day.timeZone,
    rules: day.rules,
    ...(day.soonDays === undefined ? {} : { soonDays: day.soonDays }),
  })
}

function serviceOf({ ownership, dedicatedTo, contents, hasHeldBurnt }: CylinderState): Service {
  const { refrigerant, knownSinceVacuum } = contents
  return {
    isOwn: ownership === 'own',
    dedicatedTo,
    holds: refrigerant === null ? knownSinceVacuum : [...knownSinceVacuum, refrigerant],
    hasHeldBurnt,
  }
}
