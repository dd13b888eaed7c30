import { RULE_WORDS } from '../capacity/words'
import type { CylinderView } from '../custody/cylinderView'
import { mayFill } from '../custody/plan'

/** Where a recovery stops, as it was settled when it began. Every mass is in grams. */
export interface RecoveryPlan {
  refrigerant: string
  /** Tare and fill limit together, unrounded. */
  stopGrams: number
  tareGrams: number
  limitGrams: number
  /** Tare and water capacity together. */
  waterFullGrams: number
  /** The rule that gives the limit, in words. */
  rule: string
  /** When it was settled, ISO 8601 with its offset. */
  at: string
}

/** Settles where filling stops; null where nothing may go in, or something is not known. */
export function recoveryPlan(view: CylinderView, at: string): RecoveryPlan | null {
  const { forRefrigerant, exactStopWeightGrams, fillLimitGrams, governingRule } = view.capacity
  const { tareWeightGrams = null, waterCapacityGrams = null } = view.stamp ?? {}
  if (!mayFill(view).allowed || forRefrigerant === null || governingRule === null) return null
  if (exactStopWeightGrams === null || fillLimitGrams === null || tareWeightGrams === null || waterCapacityGrams === null) return null
  return {
    refrigerant: forRefrigerant,
    stopGrams: exactStopWeightGrams,
    tareGrams: tareWeightGrams,
    limitGrams: fillLimitGrams,
    waterFullGrams: tareWeightGrams + waterCapacityGrams,
    rule: RULE_WORDS[governingRule],
    at,
  }
}
