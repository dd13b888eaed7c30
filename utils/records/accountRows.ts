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
  /** What its movements are listed by; null for the stock at either end, and where nothing moved. */
  line: BalanceLine | null
  movements: number
  /** Nothing moved by this cause. */
  isIdle: boolean
  /** Stock at the beginning or the end. */
  isStock: boolean
}

/**
 * An account line by line, from the opening stock over every cause to the closing stock.
 *
 * Rounding: each figure to the nearest division on its own; the sum is kept to the gram.
 */
export function accountRows({ openingGrams, causes, apart, closingGrams }: BalanceAccount, unit: MassUnit): AccountRow[] {
  const stock = (words: string, grams: number): AccountRow =>
    ({ words, note: null, figure: columnFigure(grams, unit, 'nearest'), line: null, movements: 0, isIdle: false, isStock: true })
  const moved = (line: BalanceLine, { grams, movements }: { grams: number, movements: number }): AccountRow => ({
    words: BALANCE_LINE_WORDS[line].words,
    note: BALANCE_LINE_WORDS[line].note ?? null,
    figure: signedColumnFigure(grams, unit),
    line: movements > 0 ? line : null,
    movements,
    isIdle: movements === 0,
    isStock: false,
  })
  return [
    stock(OPENING_WORDS, openingGrams), ...causes.map(cause => moved(cause.cause, cause)), moved('apart', apart), stock(CLOSING_WORDS, closingGrams),
  ]
}
