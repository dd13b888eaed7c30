import type { BalanceAccount, BalanceStock } from '../contract/massBalance'
import { isUnexplained, MOVEMENT_CAUSES } from '../custody/movement'
import type { BookSum, StockSum } from './books'

/** One refrigerant's balance, owners by id. */
export interface OwnersBalance {
  refrigerant: string | null
  account: BalanceAccount
  owners: { ownerId: string | null, account: BalanceAccount }[]
}

/**
 * The balance of each refrigerant over a period: opening plus every movement makes closing, to the gram; beside it what
 * the cylinders held by their own account, which must be the same.
 *
 * Refrigerants by name, the unnamed last; the contractor first among the owners. A refrigerant or owner of which there
 * was nothing, and nothing moved, has no account.
 */
export function massBalances(books: readonly BookSum[], stock: readonly StockSum[]): OwnersBalance[] {
  const names = distinct([...books, ...stock].map(({ refrigerant }) => refrigerant))
  return names.flatMap((refrigerant) => {
    const mine = books.filter(sum => sum.refrigerant === refrigerant)
    const held = stock.filter(sum => sum.refrigerant === refrigerant)
    const everybody = distinct([...mine, ...held].map(({ ownerId }) => ownerId), 'first')
    const owners = everybody.map(ownerId => ({
      ownerId,
      account: accountOf(mine.filter(sum => sum.ownerId === ownerId), held.filter(sum => sum.ownerId === ownerId)),
    })).filter(({ account }) => hasAnything(account))
    return owners.length === 0 ? [] : [{ refrigerant, account: accountOf(mine, everybody.length > 1 ? held.map(together) : held), owners }]
  })
}

/** A sum as it counts beside those of the other owners: what one weight tells of several of them errs alike. */
function together(sum: StockSum): StockSum {
  return { ...sum, weighedVariance: sum.weighedTogether, foundVariance: sum.foundTogether }
}

/**
 * One account. `unexplained` is what weighing and new tares found. Its uncertainty: each time a weight was set against
 * the log the uncertainties of both readings are added, of which a new tare has but one; over all of them the root of
 * the sum of the squares.
 */
export function accountOf(books: readonly BookSum[], stock: readonly StockSum[]): BalanceAccount {
  const within = books.filter(sum => !sum.isBefore)
  const openingGrams = total(books.filter(sum => sum.isBefore), 'grams')
  const causes = MOVEMENT_CAUSES.map((cause) => {
    const sums = within.filter(sum => sum.cause === cause && !sum.apart)
    return { cause, grams: total(sums, 'grams'), movements: total(sums, 'movements') }
  })
  const set = within.filter(sum => sum.apart)
  const apart = { grams: total(set, 'grams'), movements: total(set, 'movements') }
  const closingGrams = openingGrams + total(causes, 'grams') + apart.grams
  const opening = stockOf(stock.filter(sum => sum.isBefore))
  const closing = stockOf(stock)
  return {
    openingGrams,
    causes,
    apart,
    closingGrams,
    unexplained: unexplained(causes, stock.filter(sum => !sum.isBefore && !sum.apart)),
    stock: { opening, closing },
    agrees: opening.grams === openingGrams && closing.grams === closingGrams,
  }
}

function unexplained(causes: BalanceAccount['causes'], stock: readonly StockSum[]): BalanceAccount['unexplained'] {
  const grams = total(causes.filter(({ cause }) => isUnexplained(cause)), 'grams')
  const uncertaintyGrams = rootUp(total(stock, 'foundVariance'))
  return { grams, uncertaintyGrams, isMore: Math.abs(grams) > uncertaintyGrams }
}

function stockOf(sums: readonly StockSum[]): BalanceStock {
  return { grams: total(sums, 'grams'), uncertaintyGrams: rootUp(total(sums, 'weighedVariance')), notKnown: total(sums, 'notKnown') }
}

function hasAnything({ openingGrams, causes, apart, stock }: BalanceAccount): boolean {
  return openingGrams !== 0 || apart.movements > 0 || causes.some(({ movements }) => movements > 0)
    || [stock.opening, stock.closing].some(({ grams, notKnown }) => grams !== 0 || notKnown !== 0)
}

function rootUp(variance: number): number {
  return Math.ceil(Math.sqrt(variance))
}

function total<Key extends string>(sums: readonly Record<Key, number>[], key: Key): number {
  return sums.reduce((sum, one) => sum + one[key], 0)
}

/** Each once, in order of their names; the unnamed last, or first. */
function distinct(names: (string | null)[], unnamed: 'first' | 'last' = 'last'): (string | null)[] {
  const named = [...new Set(names.filter(name => name !== null))].sort()
  if (!names.includes(null)) return named
  return unnamed === 'first' ? [null, ...named] : [...named, null]
}
