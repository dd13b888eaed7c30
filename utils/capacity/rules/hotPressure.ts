import { kPaFromPsig } from '../../quantity/pressure'
import type { CurvePoint } from '../../refrigerant/monotoneCurve'
import { valueOnCurve } from '../../refrigerant/monotoneCurve'
import type { SupercriticalTable } from '../../refrigerant/types'
import { markedPressurePsig } from '../fillingDensities'
import type { RuleFigure, RuleInput } from './ruleInput'
import { HOT_REFERENCE_C } from './ruleInput'
import { litresText } from './sumText'

const SOURCE = '49 CFR 173.301a(d): pressure at 131 °F at most 5/4 of the service pressure'

/** The most a cylinder's pressure at 131 F may be, by its service pressure. Units: psig. Source: 49 CFR 173.301a(d). */
export const HOT_PRESSURE_FACTOR = 1.25

// Finer than any scale: a millionth of a kg/m3.
const DENSITY_STEP = 1e-6

/**
 * The limit of a fluid that is a gas at 131 F: the weight at which its pressure reaches 5/4 of the service pressure.
 *
 * Source: 49 CFR 173.301a(d).
 */
export function hotPressure(input: RuleInput): RuleFigure {
  const marked = markedPressurePsig(input.cylinder)
  if (marked === null) return none('the service pressure is not known')
  if (!input.supercritical) return none(`no pressures over fill density for ${input.refrigerant.designation}`)
  const kPa = kPaFromPsig(HOT_PRESSURE_FACTOR * marked)
  const density = hotDensityAtPressure(input.supercritical, kPa)
  if (density === null) return none(`the service pressure of ${marked} psig is too low for ${input.refrigerant.designation}`)
  return {
    exactGrams: input.volumeLitres * density,
    sum: `${litresText(input.volumeLitres)} × ${(density / 1000).toFixed(4)} kg/L (${HOT_PRESSURE_FACTOR} × ${marked} psig at 131 °F)`,
    source: `${SOURCE}; pressure: ${input.supercritical.source}`,
  }
}

/**
 * The density of what fills a cylinder at which its pressure at 131 F is a given one.
 *
 * Units: kPa absolute in, kg/m3 out; the last row of the table where the pressure is above it, null where below the first.
 */
export function hotDensityAtPressure(table: SupercriticalTable, kPa: number): number | null {
  const points = hotPressures(table)
  const first = points[0]
  const last = points.at(-1)
  if (!first || !last || kPa < first.y) return null
  if (kPa >= last.y) return last.x
  let low = first.x
  let high = last.x
  while (high - low > DENSITY_STEP) {
    const middle = (low + high) / 2
    if (valueOnCurve(points, middle) <= kPa) low = middle
    else high = middle
  }
  return low
}

function hotPressures(table: SupercriticalTable): CurvePoint[] {
  const column = table.tempsC.indexOf(HOT_REFERENCE_C)
  return table.rows.flatMap((row) => {
    const density = row[0]
    const kPa = row[column + 1]
    return column >= 0 && density !== undefined && kPa !== undefined ? [{ x: density, y: kPa }] : []
  })
}

function none(because: string): RuleFigure {
  return { exactGrams: null, because, source: SOURCE }
}
