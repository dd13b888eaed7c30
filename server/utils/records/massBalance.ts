import { OWN, UNKNOWN } from '../../../utils/contract/balanceLines'
import type { MassBalanceAnswer, MassBalanceQuery } from '../../../utils/contract/massBalance'
import { CATALOGUE } from '../../../utils/refrigerant/allRefrigerants'
import { asListed } from '../../../utils/refrigerant/designation'
import type { Span } from '../../../utils/records/books'
import { massBalances } from '../../../utils/records/massBalance'
import { askedDays, periodOf, spanOf, type Days } from '../../../utils/records/period'
import type { Database } from '../database/database'
import { directory, namesOf, type Directory } from '../directory/directory'
import { problem } from '../http/problem'
import { booksOf, type Whose } from './bookSums'

/** A question about the books, understood: which days, from when to when, of what. */
export interface Asked { days: Days, span: Span, whose: Whose }

/** The balance of each refrigerant over the days asked for. Errors: 422 where the last day is before the first. */
export async function massBalance(db: Database, query: MassBalanceQuery, nowMs: number): Promise<MassBalanceAnswer> {
  const from = await directory(db)
  const { days, span, whose } = askedOf(query, from, nowMs)
  const { books, stock } = await booksOf(db, span, whose)
  const names = namesOf(from)
  return {
    period: periodOf(days, span),
    balances: massBalances(books, stock).map(({ refrigerant, account, owners }) => ({
      refrigerant,
      account,
      owners: owners.map(({ ownerId, account: own }) => ({ owner: ownerId === null ? null : names.firm(ownerId), account: own })),
    })),
  }
}

/** What a query asks of the books. Errors: 422 where the last day is before the first. */
export function askedOf(query: MassBalanceQuery, { timeZone }: Directory, nowMs: number): Asked {
  const days = askedDays(query, nowMs, timeZone)
  if (days.to < days.from) {
    throw problem(422, 'No such period', 'The last day comes before the first.', [{ path: 'to', message: `must not be before ${days.from}` }])
  }
  const { refrigerant, owner } = query
  return {
    days,
    span: spanOf(days, timeZone),
    whose: {
      refrigerant: refrigerant === undefined ? undefined : refrigerant === UNKNOWN ? null : asListed(refrigerant, CATALOGUE.refrigerants.keys()),
      ownerId: owner === undefined ? undefined : owner === OWN ? null : owner,
    },
  }
}
