import { LABEL_CODE_LENGTH, isLabelCode, readScannedText } from './code'

/** One key as a keyboard event names it: what the device's layout makes of it, and where it sits on the keyboard. */
export interface TypedKey {
  /** Such as 'a', 'A' or '&'. */
  key: string
  /** Such as 'KeyQ'; '' where the device does not say. */
  code: string
  shift: boolean
}

/** What sits where on the keyboard that hand scanners take for granted (US): of each key, plain and with shift. */
const US_KEYS: Record<string, readonly [string, string]> = {
  Semicolon: [';', ':'], Slash: ['/', '?'], Period: ['.', '>'], Minus: ['-', '_'], Equal: ['=', '+'], Space: [' ', ' '],
  Comma: [',', '<'], Quote: ['\'', '"'], NumpadDecimal: ['.', '.'], NumpadDivide: ['/', '/'], NumpadSubtract: ['-', '-'],
}
const US_SHIFTED_DIGITS = ')!@#$%^&*('

/** The address of a label in full, where nothing of it was turned into another mark. */
const WHOLE_ADDRESS = /^HTTPS?:\/\/[^/]+\/C\/[0-9A-Z]{9}$/

/**
 * The label codes in a burst of keys that a hand scanner typed, in their order; several where bursts ran together.
 *
 * A scanner set for another keyboard than the device's has its letters, digits and marks exchanged. So the burst is
 * read twice: as the device wrote it, and by where its keys sit on a US keyboard. The check character tells which of
 * the two is right; where both are, the one with a whole address is, and without one there is no telling: nothing is read.
 *
 * @example typedCodes([...'7K3M9Q2TX'].map(key => ({ key, code: '', shift: false }))) // ['7K3M9Q2TX']
 */
export function typedCodes(keys: readonly TypedKey[]): string[] {
  const asWritten = keys.map(({ key }) => key).join('')
  const bySeat = keys.map(onUsKeyboard).join('')
  const [written, seated] = [codesIn(asWritten), codesIn(bySeat)]
  if (written.length === 0 || seated.length === 0 || written.join() === seated.join()) return written.length ? written : seated
  const [isWrittenWhole, isSeatedWhole] = [isWhole(asWritten), isWhole(bySeat)]
  if (isWrittenWhole === isSeatedWhole) return []
  return isWrittenWhole ? written : seated
}

function onUsKeyboard({ key, code, shift }: TypedKey): string {
  const letter = /^Key([A-Z])$/.exec(code)?.[1]
  if (letter) return letter
  const digit = /^(Digit|Numpad)([0-9])$/.exec(code)
  if (digit) return shift && digit[1] === 'Digit' ? US_SHIFTED_DIGITS.charAt(Number(digit[2])) : digit[2]!
  return US_KEYS[code]?.[shift ? 1 : 0] ?? key
}

function codesIn(text: string): string[] {
  const bursts = burstsIn(text).map(readScannedText)
  return bursts.every(found => found !== null) ? bursts.map(({ code }) => code) : []
}

/** Bursts that ran together: each begins with an address, or all are bare codes. */
function burstsIn(text: string): string[] {
  const bare = text.toUpperCase().match(/.{1,9}/gsu) ?? []
  if (bare.length > 1 && text.length % LABEL_CODE_LENGTH === 0 && bare.every(isLabelCode)) return bare
  return text.split(/(?=https?[^0-9a-z])/i)
}

function isWhole(text: string): boolean {
  return burstsIn(text.toUpperCase()).every(burst => WHOLE_ADDRESS.test(burst))
}
