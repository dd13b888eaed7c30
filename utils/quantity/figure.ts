/** What a typed field gave: its value, or why it is none. */
export type ParsedFigure = { value: number } | { error: 'empty' | 'not-a-number' | 'ambiguous' }

const PLAIN = /^(?:\d+[.,]?\d*|[.,]\d+)$/
const GROUPED = /^\d[\d.,]*[.,][\d.,]*\d$/
// "1,022" is a thousand and twenty-two to one reader and a little over one to another.
const COMMA_AND_THREE_DIGITS = /^[1-9]\d{0,2},\d{3}$/

/**
 * The figure a person typed, with a comma or a point before the decimals.
 *
 * Errors: a text that could be read in two ways is `ambiguous`; a sign or an exponent is no figure of a scale.
 *
 * @example parseFigure('41,8') // { value: 41.8 }
 */
export function parseFigure(text: string): ParsedFigure {
  const typed = text.trim()
  if (typed === '') return { error: 'empty' }
  if (COMMA_AND_THREE_DIGITS.test(typed)) return { error: 'ambiguous' }
  if (PLAIN.test(typed)) return { value: Number(typed.replace(',', '.')) }
  return { error: GROUPED.test(typed) ? 'ambiguous' : 'not-a-number' }
}

/**
 * The same for what may lie below zero, such as a temperature or a gauge in a vacuum.
 *
 * @example parseSignedFigure('-4.9') // { value: -4.9 }
 */
export function parseSignedFigure(text: string): ParsedFigure {
  const [, sign, rest] = /^\s*([-\u2212]?)(.*)$/s.exec(text)!
  const parsed = parseFigure(rest!)
  if (sign === '') return parsed
  if ('error' in parsed) return parsed.error === 'empty' ? { error: 'not-a-number' } : parsed
  return { value: parsed.value === 0 ? 0 : -parsed.value }
}
