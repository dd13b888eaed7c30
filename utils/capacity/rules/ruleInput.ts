import type { MassReading } from '../../quantity/mass'
import { exactGrams } from '../../quantity/mass'
import { celsiusFromFahrenheit } from '../../quantity/temperature'
import { hasLiquidAt } from '../../refrigerant/saturation'
import type { LiquidTable, SupercriticalTable } from '../../refrigerant/types'
import type { CylinderMark } from '../fillingDensities'
import type { Factor, FillPolicy } from '../types'

/** What a rule needs of a cylinder and a fluid. Units: litres of volume, grams of water capacity, unrounded. */
export type RuleInput = {
  waterCapacity: MassReading
  waterCapacityGrams: number
  volumeLitres: number
  cylinder: CylinderMark
  fluid: LiquidTable
  supercritical: SupercriticalTable | null
  policy: FillPolicy
}

/** What a rule gives: net grams, unrounded, and the factors whose product they are; or why it has none. */
export type RuleFigure
  = | { exactGrams: number, factors: Factor[], source: string }
    | { exactGrams: null, because: string, source: string }

/**
 * Density of water at 60 F, the temperature at which a water capacity is taken (49 CFR 173.304a(a)(2) Note 1).
 * Units: kg/L. Source: the figure is from memory; the note's own 27.737 in3 a pound gives 0.9979, which would make every volume larger.
 */
export const WATER_DENSITY_60F = 0.99904

/** Reference temperature at which no cylinder may be liquid-full, 131 F (49 CFR 173.304(b)). Units: C. */
export const HOT_REFERENCE_C = celsiusFromFahrenheit(131)

/** The volume of a cylinder from its water capacity. Units: litres, unrounded. */
export function volumeLitres(waterCapacity: MassReading): number {
  return exactGrams(waterCapacity) / 1000 / WATER_DENSITY_60F
}

/** Whether a fluid is still a liquid with a vapour at 131 F, so that its density sets the limit. */
export function isLiquidWhenHot(fluid: LiquidTable): boolean {
  return hasLiquidAt(fluid, HOT_REFERENCE_C)
}
