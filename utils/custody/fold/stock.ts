import type { CylinderState, Share } from '../state'
import type { StockChange } from '../stockChange'
import { ownerOfFound, partsOf } from './ledger'
import type { Turn } from './turn'

/** What a cylinder holds in stock of one owner. */
export interface Held {
  refrigerant: string | null
  ownerId: string | null
  grams: number
  notKnown: number
  weighedVariance: number
  weighedTogether: number
}

/**
 * What a cylinder holds in stock, owner by owner; nothing where nothing is in it or it is out of stock.
 *
 * Rounding: an owner's part of an uncertainty up to the whole gram.
 */
export function heldIn(state: CylinderState): Held[] {
  const { inStock, nothingInIt, netGrams, refrigerant, shares, uncertaintyGrams } = state.contents
  if (!inStock || (nothingInIt && (netGrams === null || netGrams === 0))) return []
  if (netGrams === null) return [{ refrigerant, ownerId: mainOwner(shares, ownerOfFound(state)), grams: 0, notKnown: 1, weighedVariance: 0, weighedTogether: 0 }]
  const { parts, whole } = partsOf(uncertaintyGrams ?? 0, shares)
  return shares.map(({ ownerId, grams }, index) => ({
    refrigerant, ownerId, grams, notKnown: 0, weighedVariance: parts[index]! ** 2, weighedTogether: parts[index]! * whole,
  }))
}

/** What a turn changed in what is held, and in how surely: one change for each refrigerant and owner. */
export function stockChanges(before: readonly Held[], after: readonly Held[], { event, found, at, apart }: Pick<Turn, 'event' | 'found' | 'at' | 'apart'>): StockChange[] {
  const changes = new Map<string, StockChange>()
  const changeOf = ({ refrigerant, ownerId }: Pick<Held, 'refrigerant' | 'ownerId'>) => {
    const key = JSON.stringify([refrigerant, ownerId])
    const known = changes.get(key)
    if (known) return known
    const change = { eventId: event.id, ordinal: 0, refrigerant, ownerId, grams: 0, notKnown: 0, weighedVariance: 0, foundVariance: 0, weighedTogether: 0, foundTogether: 0, at, apart }
    changes.set(key, change)
    return change
  }
  const count = (held: Held, sign: 1 | -1) => {
    const change = changeOf(held)
    change.grams += sign * held.grams
    change.notKnown += sign * held.notKnown
    change.weighedVariance += sign * held.weighedVariance
    change.weighedTogether += sign * held.weighedTogether
  }
  for (const held of before) count(held, -1)
  for (const held of after) count(held, 1)
  for (const { uncertaintyGrams, wholeGrams, ...of } of found) {
    const change = changeOf(of)
    change.foundVariance += uncertaintyGrams ** 2
    change.foundTogether += uncertaintyGrams * wholeGrams
  }
  return [...changes.values()]
    .filter(one => [one.grams, one.notKnown, one.weighedVariance, one.foundVariance, one.weighedTogether, one.foundTogether].some(figure => figure !== 0))
    .map((change, ordinal) => ({ ...change, ordinal }))
}

function mainOwner(shares: readonly Share[], otherwise: string | null): string | null {
  const largest = shares.reduce<Share | null>((most, share) => most === null || share.grams > most.grams ? share : most, null)
  return largest ? largest.ownerId : otherwise
}
