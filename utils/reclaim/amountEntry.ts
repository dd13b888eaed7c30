import { parseFigure } from '../quantity/figure'

/** An amount of money as typed: whole parts of the last decimal that it may have, or why it is none. */
export type AmountEntry = { parts: number } | { reason: string, isEmpty: boolean }

/**
 * Reads an amount with so many decimals at most: two for an amount in cents, three for a rate in thousandths.
 *
 * Errors: an empty box is no amount, never 0; more decimals are refused, not rounded away; a sign is none of an amount.
 *
 * @example readAmount('2.125', 3) // { parts: 2125 }
 */
export function readAmount(typed: string, decimals: 2 | 3): AmountEntry {
  const parsed = parseFigure(typed)
  if ('error' in parsed) {
    if (parsed.error === 'empty') return { reason: 'The amount is not typed yet.', isEmpty: true }
    const why = parsed.error === 'ambiguous' ? 'can be read in two ways. Write it without a comma, such as 1250.50' : 'is not an amount. Write figures, such as 4.25'
    return { reason: `“${typed.trim()}” ${why}.`, isEmpty: false }
  }
  const [, fraction = ''] = typed.trim().split(/[.,]/)
  if (fraction.length > decimals) return { reason: `At most ${decimals === 2 ? 'two' : 'three'} decimals.`, isEmpty: false }
  return { parts: Math.round(parsed.value * 10 ** decimals) }
}

/** Parts of the last decimal as they are typed. @example amountText(2125, 3) // '2.125' */
export function amountText(parts: number, decimals: 2 | 3): string {
  const whole = (parts / 10 ** decimals).toFixed(decimals)
  return decimals === 3 && whole.endsWith('0') ? whole.slice(0, -1) : whole
}
