import { whereOnCurve } from '../refrigerant/monotoneCurve'
import type { Refrigerant } from '../refrigerant/types'
import { WATER_DENSITY_60F } from './rules/ruleInput'

/** When the liquid fills the whole volume: at a temperature, somewhere above the last one known, or never. Units: C. */
export type LiquidFull = { c: number } | { aboveC: number } | { never: true }

// Far finer than any thermometer.
const STEPS_PER_DEGREE = 1000

/**
 * The temperature at which the liquid of a net weight fills the whole cylinder, with no vapour left.
 *
 * As it warms the liquid swells and presses its vapour back into itself where there is enough of it, and they meet where
 * the volume times the liquid's density is the net weight; where there is too little it all boils away instead, and then
 * it never fills. Which of both is not known where neither has happened at the last row.
 * Rounding: down to the thousandth of a degree. A cylinder already full at the coldest row answers with that temperature.
 * Returns null where the refrigerant or the water capacity is not known.
 */
export function liquidFullTemperature(input: {
  netGrams: number
  waterCapacityGrams: number | null
  refrigerant: Refrigerant | null
}): LiquidFull | null {
  const { netGrams, waterCapacityGrams, refrigerant } = input
  const coldest = refrigerant?.table[0]
  const warmest = refrigerant?.table.at(-1)
  if (!refrigerant || !coldest || !warmest || waterCapacityGrams === null) return null
  // Grams per litre are kilograms per cubic metre.
  const density = netGrams / (waterCapacityGrams / 1000 / WATER_DENSITY_60F)
  if (density <= warmest.vapourDensity) return { never: true }
  if (density < warmest.liquidDensity) return { aboveC: refrigerant.tableMaxC }
  if (density >= coldest.liquidDensity) return { c: coldest.tC }
  return { c: Math.floor(whereOnCurve(refrigerant.curves.liquidDensity, density) * STEPS_PER_DEGREE) / STEPS_PER_DEGREE }
}
