import { WATER_DENSITY_60F } from './rules/ruleInput'
import { liquidDensityAt } from '../refrigerant/saturation'
import type { Refrigerant } from '../refrigerant/types'

/** When the liquid fills the whole volume: at a temperature, somewhere above the last one known, or never. Units: C. */
export type LiquidFull = { c: number } | { aboveC: number } | { never: true }

// Far finer than any thermometer.
const STEP_C = 0.001

/**
 * The temperature at which the liquid of a net weight fills the whole cylinder, with no vapour left.
 *
 * As it warms the liquid swells and its vapour is pressed back into it; they meet where the volume times the liquid's
 * density is the net weight.
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
  if (!refrigerant || !coldest || waterCapacityGrams === null) return null
  const liquidGramsAt = (tC: number) => waterCapacityGrams / 1000 / WATER_DENSITY_60F * liquidDensityAt(refrigerant, tC)
  if (netGrams < liquidGramsAt(refrigerant.tableMaxC)) return { aboveC: refrigerant.tableMaxC }
  let roomLeft = coldest.tC
  let full = refrigerant.tableMaxC
  while (full - roomLeft > STEP_C) {
    const middle = (roomLeft + full) / 2
    if (liquidGramsAt(middle) > netGrams) roomLeft = middle
    else full = middle
  }
  return { c: roomLeft }
}
