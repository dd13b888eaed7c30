import { parseFigure, type MassReading, type MassUnit } from './mass'

/** What stands in the boxes of a weight field: one box for a decimal weight, a second one for ounces. */
export type MassEntryText = { figure: string, ounces: string }

/** The reading that was typed, or why there is none yet. */
export type MassEntry = { reading: MassReading } | { reason: string, empty: boolean }

const OUNCES_PER_POUND = 16

/**
 * Reads the boxes of a weight field.
 *
 * Errors: an empty box is no weight, never 0; ounces are asked for even where the scale shows none.
 *
 * @example readMassEntry({ figure: '41', ounces: '13' }, 'lb-oz') // { reading: { unit: 'lb-oz', lb: 41, oz: 13 } }
 */
export function readMassEntry(text: MassEntryText, unit: MassUnit): MassEntry {
  if (unit !== 'lb-oz') {
    const figure = read(text.figure, 'weight')
    return typeof figure === 'number' ? { reading: { unit, value: figure } } : figure
  }
  if (text.figure.trim() === '' && text.ounces.trim() === '') return { reason: 'The weight is not typed yet.', empty: true }
  const lb = read(text.figure, 'pounds')
  if (typeof lb !== 'number') return { ...lb, empty: false }
  if (!Number.isInteger(lb)) return { reason: 'Whole pounds go in the first box, ounces in the second. For decimal pounds choose lb.', empty: false }
  if (text.ounces.trim() === '') return { reason: 'The ounces are missing. Write 0 if the scale shows none.', empty: false }
  const oz = read(text.ounces, 'ounces')
  if (typeof oz !== 'number') return { ...oz, empty: false }
  if (oz >= OUNCES_PER_POUND) return { reason: 'Ounces go from 0 to less than 16.', empty: false }
  return { reading: { unit, lb, oz } }
}

/** What the boxes show for a reading. */
export function massEntryText(reading: MassReading | null): MassEntryText {
  if (reading === null) return { figure: '', ounces: '' }
  if (reading.unit === 'lb-oz') return { figure: String(reading.lb), ounces: String(reading.oz) }
  return { figure: String(reading.value), ounces: '' }
}

function read(text: string, what: 'weight' | 'pounds' | 'ounces'): number | { reason: string, empty: boolean } {
  const parsed = parseFigure(text)
  if ('value' in parsed) return parsed.value
  if (parsed.error === 'empty') return { reason: what === 'weight' ? 'The weight is not typed yet.' : `The ${what} are missing.`, empty: true }
  if (parsed.error === 'ambiguous') return { reason: `“${text.trim()}” can be read in two ways. Write it without a comma, such as 1022 or 1.022.`, empty: false }
  return { reason: `“${text.trim()}” is not a weight. Write figures, such as 62.3.`, empty: false }
}
