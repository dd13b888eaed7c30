import { formatWholeDay, type Day } from '../quantity/day'

/** A price for a mass: thousandths of the currency for each pound or kilogram; negative is charged. */
export interface Rate { mills: number, per: 'lb' | 'kg' }

/** What a reclaimer pays or charges for a refrigerant in a condition, from a day to another. */
export interface DatedPrice {
  id: string
  /** null for contents whose refrigerant is mixed or not known. */
  refrigerant: string | null
  condition: string
  fromDay: Day
  /** The last day it holds; null where no end was said. */
  untilDay: Day | null
  rate: Rate
  /** UTC milliseconds. */
  recordedAt: number
}

/** What a price is asked for. */
export interface Priced { refrigerant: string | null, condition: string }

const MINUS = '\u2212'
const NO_BREAK_SPACE = '\u00A0'
const MILLS_PER_CENT = 10n
const HUNDRED_THOUSANDTHS = 100_000n
// Exact by definition of the international pound (1959): 1 lb = 0.45359237 kg. In hundred-thousandths of a gram.
const UNIT_MASS: Record<Rate['per'], bigint> = { lb: 45_359_237n, kg: 100_000_000n }

/**
 * What a mass is worth at a rate, in cents; below zero where it is charged.
 *
 * Units: whole grams. Rounding: to the nearest cent, halves away from zero; reckoned without a rounding in between.
 *
 * @example creditCents({ mills: 2500, per: 'kg' }, 1_234) // 309: 3.085 of the currency
 */
export function creditCents({ mills, per }: Rate, grams: number): number {
  const above = BigInt(mills) * BigInt(grams) * HUNDRED_THOUSANDTHS
  const below = UNIT_MASS[per] * MILLS_PER_CENT
  const size = above < 0n ? -above : above
  const cents = Number((2n * size + below) / (2n * below))
  return above < 0n && cents !== 0 ? -cents : cents
}

/**
 * The price that counts on a day: of those that cover it the one that began last, and of two from one day the one
 * recorded last; null where none is recorded.
 *
 * A price of its own for a mixed refrigerant goes before the one for mixed contents; what nobody has named has the
 * price for its condition, or else the one for contents not known.
 */
export function priceOn(prices: readonly DatedPrice[], { day, ...what }: Priced & { day: Day }): DatedPrice | null {
  for (const { refrigerant, condition } of namesOf(what)) {
    const found = prices
      .filter(price => price.refrigerant === refrigerant && price.condition === condition && holdsOn(price, day))
      .sort(latestFirst)[0]
    if (found) return found
  }
  return null
}

/** Whether a price covers a day, both of its ends included. */
export function holdsOn({ fromDay, untilDay }: Pick<DatedPrice, 'fromDay' | 'untilDay'>, day: Day): boolean {
  return fromDay <= day && (untilDay === null || day <= untilDay)
}

/** The order in which prices go before each other: the later beginning first, then the later record. */
export function latestFirst(a: Pick<DatedPrice, 'fromDay' | 'recordedAt' | 'id'>, b: Pick<DatedPrice, 'fromDay' | 'recordedAt' | 'id'>): number {
  return b.fromDay.localeCompare(a.fromDay) || b.recordedAt - a.recordedAt || b.id.localeCompare(a.id)
}

/** An amount in the firm's currency, which is the United States dollar. @example formatMoney(-123_456) // '−$1,234.56' */
export function formatMoney(cents: number): string {
  return `${cents < 0 ? MINUS : ''}$${grouped(Math.floor(Math.abs(cents) / 100))}.${String(Math.abs(cents) % 100).padStart(2, '0')}`
}

/** A rate, with the thousandths only where there are any. @example formatRate({ mills: 2_125, per: 'lb' }) // '$2.125 a lb' */
export function formatRate({ mills, per }: Rate): string {
  const size = Math.abs(mills)
  const decimals = size % 10 === 0 ? String(size % 1000 / 10).padStart(2, '0') : String(size % 1000).padStart(3, '0')
  return `${mills < 0 ? MINUS : ''}$${grouped(Math.floor(size / 1000))}.${decimals}${NO_BREAK_SPACE}a${NO_BREAK_SPACE}${per}`
}

/** From when to when a price holds, in words. @example priceSpan({ fromDay: '2026-03-01', untilDay: null }) // 'from 1 Mar 2026' */
export function priceSpan({ fromDay, untilDay }: Pick<DatedPrice, 'fromDay' | 'untilDay'>): string {
  return `from ${formatWholeDay(fromDay)}${untilDay === null ? '' : ` to ${formatWholeDay(untilDay)}`}`
}

function namesOf({ refrigerant, condition }: Priced): Priced[] {
  const own = { refrigerant, condition }
  if (condition === 'mixed') return refrigerant === null ? [own] : [own, { refrigerant: null, condition }]
  return refrigerant === null && condition !== 'unknown' ? [own, { refrigerant: null, condition: 'unknown' }] : [own]
}

function grouped(whole: number): string {
  return String(whole).replace(/\B(?=(\d{3})+$)/g, ',')
}
