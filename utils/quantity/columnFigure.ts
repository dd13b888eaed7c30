import { ceilToDivision, floorToDivision, formatFigure, nearestToDivision, type MassRounding, type MassUnit } from './mass'

const TO_DIVISION = { down: floorToDivision, up: ceilToDivision, nearest: nearestToDivision }

const NO_BREAK_SPACE = '\u00A0'
const MINUS = '\u2212'
const UNKNOWN = '–'

/** The unit as a column's head names it; pounds and ounces stand in the cells themselves. */
export function columnUnit(unit: MassUnit): string {
  return unit === 'lb-oz' ? 'lb oz' : unit
}

/**
 * A mass as it stands under a head that names the unit; a dash for one that is not known. Rounding: as asked for.
 *
 * Shape: pounds and ounces stand under pounds and ounces: no pounds are written as 0, and ounces take two places.
 */
export function columnFigure(grams: number | null, unit: MassUnit, rounding: MassRounding): string {
  if (grams === null) return UNKNOWN
  const reading = TO_DIVISION[rounding](grams, unit)
  if (reading.unit !== 'lb-oz') return formatFigure(grams, unit, rounding).figure
  const sign = reading.lb < 0 || reading.oz < 0 ? MINUS : ''
  const ounces = String(Math.abs(reading.oz)).padStart(2, NO_BREAK_SPACE)
  return `${sign}${[Math.abs(reading.lb), 'lb', ounces, 'oz'].join(NO_BREAK_SPACE)}`
}

/** The same with its sign, a plus as well as a minus; what rounds to nothing has none. Rounding: to the nearest division. */
export function signedColumnFigure(grams: number, unit: MassUnit): string {
  const text = columnFigure(grams, unit, 'nearest')
  return grams > 0 && /[1-9]/.test(text) ? `+${text}` : text
}
