import type { BalanceLine } from '../contract/balanceLines'
import type { BalanceAccount } from '../contract/massBalance'
import { columnFigure, signedColumnFigure } from '../quantity/columnFigure'
import type { MassUnit } from '../quantity/mass'
import { BALANCE_LINE_WORDS, CLOSING_WORDS, OPENING_WORDS } from './words'

/** One row of an account as a screen draws it. */
export interface AccountRow {
  words: string
  note: string | null
  /** Under a head that names the unit. */
  figure: string
  /** What its movements are listed by; null for the stock at either end. */
  line: BalanceLine | null
  movements: number
}

/** An account as a screen draws it: every cause stands in it once. */
export interface AccountRows {
  opening: AccountRow
  moved: AccountRow[]
  /** The causes by which nothing moved, in words. */
  idle: string[]
  closing: AccountRow
}

/**
 * An account line by line, from the opening stock over what moved to the closing stock.
 *
 * Rounding: each figure to the nearest division on its own; the sum is kept to the gram.
 */
export function accountRows({ openingGrams, causes, apart, closingGrams }: BalanceAccount, unit: MassUnit): AccountRows {
  const stock = (words: string, grams: number): AccountRow => ({ words, note: null, figure: columnFigure(grams, unit, 'nearest'), line: null, movements: 0 })
  const lines = [...causes.map(({ cause, ...sum }) => ({ line: cause, ...sum })), { line: 'apart' as const, ...apart }]
  return {
    opening: stock(OPENING_WORDS, openingGrams),
    moved: lines.filter(({ movements }) => movements > 0).map(({ line, grams, movements }) => ({
      words: BALANCE_LINE_WORDS[line].words, note: BALANCE_LINE_WORDS[line].note ?? null, figure: signedColumnFigure(grams, unit), line, movements,
    })),
    idle: lines.filter(({ movements }) => movements === 0).map(({ line }) => BALANCE_LINE_WORDS[line].words),
    closing: stock(CLOSING_WORDS, closingGrams),
  }
}
