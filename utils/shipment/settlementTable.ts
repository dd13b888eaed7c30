import { exactGrams } from '../quantity/mass'
import type { SettlementLine } from '../contract/settlement'
import type { SettlementCredit } from '../settlement/credit'
import { STATEMENT_COLUMNS } from '../settlement/statementColumns'

/** One cell of a table of values. */
export type Cell = string | number | null

/** A settlement as a table of values: its heads, and a row for each line. */
export interface SettlementTable { heads: string[], rows: Cell[][] }

const MILLS_PER_WHOLE = 1_000
const CENTS_PER_WHOLE = 100

/** The four weights, price and credit of every line. Rounding: weights to the hundredth of the unit. */
export function settlementTable(lines: readonly SettlementLine[], credit: SettlementCredit, unit: 'lb' | 'kg'): SettlementTable {
  const creditOf = new Map(credit.lines.map(line => [line.cylinderId, line]))
  const mass = (grams: number | null) => grams === null ? null : Math.round(grams / exactGrams({ unit, value: 1 }) * 100) / 100
  return {
    heads: [
      'serial', 'label code', 'refrigerant', 'condition', 'outcome', 'unit', 'our gross', 'our net', 'their gross', 'accepted net',
      'gross difference', 'net difference', 'beyond both scales', 'grade', 'price', 'per', 'credit', 'stated credit',
    ],
    rows: lines.map(({ cylinder, sent, figures, weights }) => {
      const own = creditOf.get(cylinder.id)
      return [
        cylinder.serial, cylinder.labelCode, sent?.refrigerant ?? null, sent?.condition ?? null, figures.outcome, unit,
        mass(weights.ourGrossGrams), mass(weights.ourNetGrams), mass(weights.theirGrossGrams), mass(weights.acceptedNetGrams),
        mass(weights.gross?.grams ?? null), mass(weights.net?.grams ?? null), weights.gross?.isBeyond || weights.net?.isBeyond ? 'yes' : 'no',
        figures.grade, figures.rate && figures.rate.mills / MILLS_PER_WHOLE, figures.rate?.per ?? null, money(own?.cents ?? null), money(figures.statedCents),
      ]
    }),
  }
}

/** The table that a reclaimer fills in: our names of the columns, and the serials. */
export function emptyStatement(lines: readonly SettlementLine[], unit: 'lb' | 'kg'): SettlementTable {
  return {
    heads: [...STATEMENT_COLUMNS],
    rows: lines.map(({ cylinder }) => STATEMENT_COLUMNS.map((column) => {
      if (column === 'serial') return cylinder.serial
      return column === 'unit' || column === 'per' ? unit : null
    })),
  }
}

function money(cents: number | null): number | null {
  return cents === null ? null : cents / CENTS_PER_WHOLE
}
