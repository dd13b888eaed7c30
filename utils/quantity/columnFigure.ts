import { formatFigure, formatMass, type MassRounding, type MassUnit } from './mass'

/** The unit as a column's head names it; pounds and ounces stand in the cells themselves. */
export function columnUnit(unit: MassUnit): string {
  return unit === 'lb-oz' ? 'lb oz' : unit
}

/** A mass as it stands under a head that names the unit. Rounding: as asked for. */
export function columnFigure(grams: number, unit: MassUnit, rounding: MassRounding): string {
  return unit === 'lb-oz' ? formatMass(grams, unit, rounding) : formatFigure(grams, unit, rounding).figure
}
