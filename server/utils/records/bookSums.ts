import type { InValue, Row } from '@libsql/client'
import type { MovementCause } from '../../../utils/custody/movement'
import type { BookSum, Span, StockSum } from '../../../utils/records/books'
import type { Database } from '../database/database'

/** Which refrigerant and whose: left out for all of them, null for what has no name or is the contractor's own. */
export interface Whose { refrigerant?: string | null, ownerId?: string | null }

const BOOKED = 'refrigerant, owner_id, sum(grams) AS grams, count(*) AS movements'
const HELD = `refrigerant, owner_id, sum(grams) AS grams, sum(not_known) AS not_known,
  sum(weighed_variance) AS weighed_variance, sum(found_variance) AS found_variance,
  sum(weighed_together) AS weighed_together, sum(found_together) AS found_together`

/**
 * The books of a period at one moment: its movements summed as `bookSums` sums them one by one, and the changes of stock
 * as `stockSums` does. Both are read together, so that what is recorded meanwhile stands in both or in neither.
 */
export async function booksOf(db: Database, { fromMs, untilMs }: Span, whose: Whose): Promise<{ books: BookSum[], stock: StockSum[] }> {
  const where = conditions(whose)
  const [bookedBefore, booked, heldBefore, held] = await db.readClient.batch([
    { sql: `SELECT ${BOOKED} FROM movements WHERE at < ?${where.sql} GROUP BY refrigerant, owner_id`, args: [fromMs, ...where.args] },
    {
      sql: `SELECT ${BOOKED}, cause, apart FROM movements WHERE at >= ? AND at < ?${where.sql}
        GROUP BY refrigerant, owner_id, cause, apart`,
      args: [fromMs, untilMs, ...where.args],
    },
    { sql: `SELECT ${HELD} FROM stock_changes WHERE at < ?${where.sql} GROUP BY refrigerant, owner_id`, args: [fromMs, ...where.args] },
    {
      sql: `SELECT ${HELD}, apart FROM stock_changes WHERE at >= ? AND at < ?${where.sql} GROUP BY refrigerant, owner_id, apart`,
      args: [fromMs, untilMs, ...where.args],
    },
  ], 'read')
  return {
    books: [...bookedBefore!.rows, ...booked!.rows].map(bookSumOf),
    stock: [...heldBefore!.rows, ...held!.rows].map(stockSumOf),
  }
}

function bookSumOf(row: Row): BookSum {
  return {
    ...ownerOf(row),
    isBefore: row.cause === undefined,
    cause: (row.cause ?? null) as MovementCause | null,
    apart: row.apart === 1,
    grams: row.grams as number,
    movements: row.movements as number,
  }
}

function stockSumOf(row: Row): StockSum {
  return {
    ...ownerOf(row),
    isBefore: row.apart === undefined,
    apart: row.apart === 1,
    grams: row.grams as number,
    notKnown: row.not_known as number,
    weighedVariance: row.weighed_variance as number,
    foundVariance: row.found_variance as number,
    weighedTogether: row.weighed_together as number,
    foundTogether: row.found_together as number,
  }
}

/** What of the books is asked for, to go behind another condition. */
export function conditions({ refrigerant, ownerId }: Whose): { sql: string, args: InValue[] } {
  const asked: [string, string | null | undefined][] = [['refrigerant', refrigerant], ['owner_id', ownerId]]
  const given = asked.filter((one): one is [string, string | null] => one[1] !== undefined)
  return { sql: given.map(([column]) => ` AND ${column} IS ?`).join(''), args: given.map(([, value]) => value) }
}

function ownerOf(row: Row): Pick<BookSum, 'refrigerant' | 'ownerId'> {
  return { refrigerant: row.refrigerant as string | null, ownerId: row.owner_id as string | null }
}
