import { readMassEntry, type MassEntry, type MassEntryText } from '../quantity/massEntry'
import type { MassUnit } from '../quantity/mass'

/** A key of the number pad; the point leads from pounds to ounces where both are read. */
export type PadKey = '0' | '1' | '2' | '3' | '4' | '5' | '6' | '7' | '8' | '9' | 'point' | 'rub-out'

/** What was typed on the pad, and which of the two figures is being typed. */
export interface PadText extends MassEntryText { inOunces: boolean }

/** Nothing typed. */
export const EMPTY_PAD: PadText = { figure: '', ounces: '', inOunces: false }

// No scale that a cylinder stands on shows more figures, before the point or behind it (common practice, no source).
const MOST_WHOLE: Record<'weight' | 'ounces', number> = { weight: 4, ounces: 2 }
const MOST_DECIMALS: Record<MassUnit, number> = { 'lb': 2, 'lb-oz': 0, 'kg': 3 }
const MOST_OUNCE_DECIMALS = 1

/** What stands on the pad after a key; a key that fits nowhere changes nothing. */
export function pressPad(text: PadText, key: PadKey, unit: MassUnit): PadText {
  if (key === 'rub-out') return rubOut(text)
  if (key === 'point') return point(text, unit)
  const decimals = text.inOunces ? MOST_OUNCE_DECIMALS : MOST_DECIMALS[unit]
  const typed = withDigit(active(text), key, text.inOunces ? MOST_WHOLE.ounces : MOST_WHOLE.weight, decimals)
  return withActive(text, typed)
}

/** The reading on the pad, or why there is none yet. */
export function readPad(text: PadText, unit: MassUnit): MassEntry {
  return readMassEntry(text, unit)
}

/** The pad's key for a key of a keyboard; null where it is none. */
export function padKeyOf(key: string): PadKey | null {
  if (/^\d$/.test(key)) return key as PadKey
  if (key === 'Backspace') return 'rub-out'
  return key === '.' || key === ',' ? 'point' : null
}

/** What stands on the key of the point: the symbol that it writes. */
export function pointLabel(text: PadText, unit: MassUnit): string {
  return unit === 'lb-oz' && !text.inOunces ? 'lb' : '.'
}

function point(text: PadText, unit: MassUnit): PadText {
  if (unit === 'lb-oz' && !text.inOunces) return { ...text, figure: text.figure || '0', inOunces: true }
  const typed = active(text)
  return typed.includes('.') ? text : withActive(text, `${typed || '0'}.`)
}

function rubOut(text: PadText): PadText {
  if (text.inOunces && text.ounces === '') return { ...text, inOunces: false }
  return withActive(text, active(text).slice(0, -1))
}

function withDigit(typed: string, digit: string, mostWhole: number, mostDecimals: number): string {
  const [whole = '', decimals] = typed.split('.')
  if (decimals !== undefined) return decimals.length < mostDecimals ? typed + digit : typed
  if (whole === '0') return digit
  return whole.length < mostWhole ? typed + digit : typed
}

function active(text: PadText): string {
  return text.inOunces ? text.ounces : text.figure
}

function withActive(text: PadText, typed: string): PadText {
  return text.inOunces ? { ...text, ounces: typed } : { ...text, figure: typed }
}
