import { kPaFromPsig } from '../../quantity/pressure'
import { whereOnCurve } from '../../refrigerant/monotoneCurve'
import type { SupercriticalTable } from '../../refrigerant/types'
import { markedPressurePsig } from '../fillingDensities'
import { volumeFactor } from './factors'
import type { RuleFigure, RuleInput } from './ruleInput'
import { HOT_REFERENCE_C, isLiquidWhenHot } from './ruleInput'

const HOT_SOURCE = '49 CFR 173.301a(d): pressure at 131 °F at most 5/4 of the service pressure'
const COOL_SOURCE = '49 CFR 173.301a(c): pressure at 70 °F at most the service pressure'
const BOTH_SOURCES = '49 CFR 173.301a(c), (d)'

// 70 F as the tables of pressures have it. Units: C.
const COOL_REFERENCE_C = 21.1

/** The most a cylinder's pressure at 131 F may be, by its service pressure. Units: psig. Source: 49 CFR 173.301a(d). */
export const HOT_PRESSURE_FACTOR = 1.25

/**
 * The limit of a fluid that is a gas at 131 F: the weight at which its pressure reaches 5/4 of the service pressure when
 * hot, or the service pressure itself at 70 F where that is less.
 *
 * Source: 49 CFR 173.301a(c), (d).
 */
export function hotPressure(input: RuleInput): RuleFigure {
  const { designation } = input.fluid
  if (isLiquidWhenHot(input.fluid)) return none(`${designation} is still a liquid at 131 °F: the hot ceiling holds it`)
  const marked = markedPressurePsig(input.cylinder)
  if (marked === null) return none('the service pressure is not known')
  if (!input.supercritical) return none(`no pressures over fill density for ${designation}`)
  const most = mostDensity(input.supercritical, marked)
  if (most === null) return none(`the service pressure of ${marked} psig is too low for ${designation}`)
  const source = `${most.isCool ? COOL_SOURCE : HOT_SOURCE}; pressure: ${input.supercritical.source}`
  return {
    exactGrams: input.volumeLitres * most.kgPerM3,
    factors: [
      volumeFactor(input.volumeLitres),
      {
        name: 'density-at-pressure', value: most.kgPerM3 / 1000, unit: 'kg/L', atC: most.isCool ? COOL_REFERENCE_C : HOT_REFERENCE_C,
        note: most.isCool ? `${marked} psig` : `${HOT_PRESSURE_FACTOR} × ${marked} psig`, source,
      },
    ],
    source,
  }
}

/**
 * The most that may be filled per volume of a gas by a service pressure, and whether the rule at 70 F sets it.
 *
 * Units: psig in, kg/m3 out; null where the service pressure is too low for any density of the table.
 * Source: 49 CFR 173.301a(c), (d).
 */
export function mostDensity(table: SupercriticalTable, markedPsig: number): { kgPerM3: number, isCool: boolean } | null {
  const hot = densityAtPressure(table, HOT_REFERENCE_C, kPaFromPsig(HOT_PRESSURE_FACTOR * markedPsig))
  const cool = densityAtPressure(table, COOL_REFERENCE_C, kPaFromPsig(markedPsig))
  if (hot === null || cool === null) return null
  return cool < hot ? { kgPerM3: cool, isCool: true } : { kgPerM3: hot, isCool: false }
}

/**
 * The density of what fills a cylinder at which its pressure at a temperature of the table is a given one.
 *
 * Units: C and kPa absolute in, kg/m3 out; the last row of the table where the pressure is above it, null where below the
 * first. While liquid and vapour share the cylinder the pressure stays the same: then the most that has it.
 * Errors: RangeError where the table has no pressures at the temperature.
 */
export function densityAtPressure(table: SupercriticalTable, tC: number, kPa: number): number | null {
  const curve = table.curves[table.tempsC.indexOf(tC)]
  const lowest = curve?.y[0]
  const highest = curve?.y.at(-1)
  if (!curve || lowest === undefined || highest === undefined) {
    throw new RangeError(`${table.designation} has no pressures over fill density at ${tC} C`)
  }
  return kPa < lowest ? null : whereOnCurve(curve, Math.min(kPa, highest))
}

function none(because: string): RuleFigure {
  return { exactGrams: null, because, source: BOTH_SOURCES }
}
