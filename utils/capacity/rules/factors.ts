import type { MassReading } from '../../quantity/mass'
import { exactGrams, formatReading } from '../../quantity/mass'
import type { LiquidTable } from '../../refrigerant/types'
import type { Factor } from '../types'
import { WATER_DENSITY_60F } from './ruleInput'

const VOLUME_NOTE = `WC ÷ ${WATER_DENSITY_60F} kg/L`
const DERATE_SOURCE = 'ours; it covers the mixing errors seen on computed blends'

/** What the factors of a sum make together. Units: grams, unrounded. */
export function productGrams(factors: readonly Factor[]): number {
  const value = factors.reduce((product, factor) => product * (factor.unit === '%' ? factor.value / 100 : factor.value), 1)
  return exactGrams({ unit: factors.some(({ unit }) => unit === 'lb') ? 'lb' : 'kg', value })
}

/** A share of the whole, in thousandths, as a factor of one. */
export function shareFactor(thousandths: number): Factor {
  return { name: 'share', value: thousandths / 1000, unit: '' }
}

/** A water capacity in the unit of its stamp; pounds and ounces as pounds. */
export function waterCapacityFactor(waterCapacity: MassReading): Factor {
  return waterCapacity.unit === 'lb-oz'
    ? { name: 'water-capacity', value: exactGrams(waterCapacity) / exactGrams({ unit: 'lb', value: 1 }), unit: 'lb', note: formatReading(waterCapacity) }
    : { name: 'water-capacity', value: waterCapacity.value, unit: waterCapacity.unit }
}

/** The volume of a cylinder. Units: litres, unrounded. */
export function volumeFactor(litres: number): Factor {
  return { name: 'volume', value: litres, unit: 'L', note: VOLUME_NOTE }
}

/** A density of a fluid's liquid, as its table has it. Units: kg/m3 in, kg/L out; the density before the derate of an estimated one. */
export function liquidDensityFactor(fluid: LiquidTable, tC: number, kgPerM3: number): Factor {
  const value = fluid.derate === undefined ? kgPerM3 / 1000 : kgPerM3 / fluid.derate / 1000
  return withError({ name: 'liquid-density', value, unit: 'kg/L', atC: tC, note: `liquid ${fluid.designation}`, source: fluid.source }, fluid)
}

/** A factor that rests on a fluid's density, with how far it may be off. */
export function withError(factor: Factor, { relativeErrorDensity, doubt }: LiquidTable): Factor {
  factor.relativeError = relativeErrorDensity
  if (doubt !== undefined) factor.doubt = doubt
  return factor
}

/** What an estimated density is taken with. */
export function derateFactor(derate: number): Factor {
  return { name: 'derate', value: derate, unit: '', note: 'for ideal mixing', source: DERATE_SOURCE }
}
