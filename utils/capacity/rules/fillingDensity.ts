import { celsiusFromFahrenheit } from '../../quantity/temperature'
import { liquidDensityAt } from '../../refrigerant/saturation'
import { bestRow, fillingDensityRows, hydrocarbonPercent, isHydrocarbon } from '../fillingDensities'
import { waterCapacityFactor } from './factors'
import type { RuleFigure, RuleInput } from './ruleInput'
import { isLiquidWhenHot, WATER_DENSITY_60F } from './ruleInput'

const NAMED_SOURCE = '49 CFR 173.304a(a)(2)'
const HYDROCARBON_SOURCE = '49 CFR 173.304a(d)(1)'

/**
 * The maximum filling density that the regulation prints for a gas, in percent of the water capacity.
 *
 * Source: 49 CFR 173.304a(a)(2); hydrocarbons by specific gravity at 60 F, 49 CFR 173.304a(d)(1).
 */
export function fillingDensity(input: RuleInput): RuleFigure {
  return isHydrocarbon(input.fluid.designation) ? hydrocarbonFigure(input) : namedFigure(input)
}

function hydrocarbonFigure(input: RuleInput): RuleFigure {
  const gravity = liquidDensityAt(input.fluid, celsiusFromFahrenheit(60)) / 1000 / WATER_DENSITY_60F
  const percent = hydrocarbonPercent(gravity)
  if (percent === null) {
    return { exactGrams: null, because: `no filling density for a specific gravity of ${gravity.toFixed(3)}`, source: HYDROCARBON_SOURCE }
  }
  return percentFigure(input, percent, `specific gravity ${gravity.toFixed(3)} at 60 °F`, HYDROCARBON_SOURCE)
}

function namedFigure(input: RuleInput): RuleFigure {
  const { fluid, cylinder } = input
  const rows = fillingDensityRows(fluid.designation)
  if (rows.length === 0) return { exactGrams: null, because: `the table does not name ${fluid.designation}`, source: NAMED_SOURCE }
  const best = bestRow(fluid.designation, cylinder)
  // A liquid's density holds in any cylinder; a gas that is above its critical point when hot leans on its cylinder's pressure.
  const row = best ?? (isLiquidWhenHot(fluid) ? rows[0] : undefined)
  if (!row) return { exactGrams: null, because: `no row of ${fluid.designation} is met by this spec and service pressure`, source: NAMED_SOURCE }
  if (row.percent === null) {
    return { exactGrams: null, because: `the row of ${fluid.designation} asks only that it is not liquid-full at 131 °F`, source: NAMED_SOURCE }
  }
  return percentFigure(input, row.percent, `filling density of ${fluid.designation}`, NAMED_SOURCE)
}

function percentFigure(input: RuleInput, percent: number, note: string, source: string): RuleFigure {
  return {
    exactGrams: input.waterCapacityGrams * percent / 100,
    factors: [{ name: 'filling-density', value: percent, unit: '%', note, source }, waterCapacityFactor(input.waterCapacity)],
    source,
  }
}
