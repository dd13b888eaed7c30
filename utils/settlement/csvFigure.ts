/** Which sign stands before the decimals in a file. */
export type DecimalSign = 'point' | 'comma'

/** A figure of a file, or why it is none. */
export type CsvFigure = { value: number, decimals: number } | { wrong: 'not-a-number' | 'ambiguous' }

const PLAIN = /^[-−]?\d+(?:\.(\d+))?$/

/**
 * A figure with the decimal sign that the whole file has. What would be a figure only by the other sign is refused and
 * not guessed: "1,022" may be a thousand and twenty-two or a little over one.
 *
 * @example csvFigure('11,25', 'comma') // { value: 11.25, decimals: 2 }
 */
export function csvFigure(text: string, decimal: DecimalSign): CsvFigure {
  const typed = text.trim()
  const [own, other] = decimal === 'comma' ? [',', '.'] : ['.', ',']
  const isDigitsOnly = /^[-−]?[\d.,]+$/.test(typed)
  if (typed.includes(other)) return { wrong: isDigitsOnly ? 'ambiguous' : 'not-a-number' }
  const match = PLAIN.exec(typed.replace(own, '.'))
  if (!match) return { wrong: 'not-a-number' }
  const value = Number(typed.replace(own, '.').replace('−', '-'))
  return { value: value === 0 ? 0 : value, decimals: match[1]?.length ?? 0 }
}
