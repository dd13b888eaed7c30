import type { MassReading } from '../../quantity/mass'
import { exactGrams, formatReading } from '../../quantity/mass'
import { liquidDensityAt } from '../../refrigerant/saturation'
import type { LiquidTable } from '../../refrigerant/types'
import type { Factor } from '../types'
import { WATER_DENSITY_60F } from './ruleInput'

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
  return { name: 'volume', value: litres, unit: 'L', note: `WC ÷ ${WATER_DENSITY_60F} kg/L` }
}

/** The density of a liquid, and the derate that an estimated one is taken with. Errors: RangeError outside its table. */
export function liquidDensityFactors(fluid: LiquidTable, tC: number): Factor[] {
  const { derate = 1 } = fluid
  const density: Factor = {
    name: 'liquid-density', value: liquidDensityAt(fluid, tC) / derate / 1000, unit: 'kg/L', atC: tC,
    note: `liquid ${fluid.designation}`, source: fluid.source,
  }
  return fluid.derate === undefined ? [density] : [density, derateFactor(fluid.derate)]
}

function derateFactor(derate: number): Factor {
  return { name: 'derate', value: derate, unit: '', note: 'for ideal mixing', source: 'ours; it covers the mixing errors seen on computed blends' }
}
