import { formatFigure, formatMass, type MassUnit } from '../quantity/mass'
import { MASS_UNITS } from '../quantity/massUnits'

/** A stop weight as it is set large: each figure with its symbol, and the same in the other units. */
export interface WeightParts {
  parts: { figure: string, symbol: string }[]
  /** How many characters wide it is, symbols counted by their smaller type. */
  length: number
  others: string[]
}

// A symbol beside a large figure takes about so much of one of its characters.
const SYMBOL_LENGTH = 1.3

/**
 * Takes a stop weight apart for large type.
 *
 * Rounding: down. @example 66.0 lb, or 66 lb 0 oz in two parts
 */
export function weightParts(stopGrams: number, unit: MassUnit): WeightParts {
  const { figure, symbol } = formatFigure(stopGrams, unit, 'down')
  const words = [...figure.split('\u00A0'), symbol]
  const parts = words.flatMap((word, index) => index % 2 === 0 ? [{ figure: word, symbol: words[index + 1]! }] : [])
  return {
    parts,
    length: parts.reduce((sum, part) => sum + part.figure.length + SYMBOL_LENGTH, 0),
    others: MASS_UNITS.filter(({ value }) => value !== unit).map(({ value }) => formatMass(stopGrams, value, 'down')),
  }
}
