import type { Movement, MovementCause } from '../custody/movement'
import type { StockChange } from '../custody/stockChange'

/** Movements of one refrigerant and owner summed: all of those before a period, or those in it of one cause. */
export interface BookSum {
  refrigerant: string | null
  ownerId: string | null
  isBefore: boolean
  /** null of what came before the period, whatever its cause. */
  cause: MovementCause | null
  /** Likewise false of what came before. */
  apart: boolean
  grams: number
  movements: number
}

/** Changes of stock of one refrigerant and owner, summed: those before a period, or those in it. */
export interface StockSum {
  refrigerant: string | null
  ownerId: string | null
  isBefore: boolean
  /** false of what came before the period. */
  apart: boolean
  grams: number
  notKnown: number
  weighedVariance: number
  foundVariance: number
  weighedTogether: number
  foundTogether: number
}

/** A span of time: from an instant on, until before another. Units: UTC milliseconds. */
export interface Span { fromMs: number, untilMs: number }

/** Movements summed for a period; what comes after it counts for nothing. */
export function bookSums(movements: readonly Movement[], { fromMs, untilMs }: Span): BookSum[] {
  const sums = new Map<string, BookSum>()
  for (const { refrigerant, ownerId, grams, at, ...movement } of movements) {
    if (at >= untilMs) continue
    const isBefore = at < fromMs
    const { cause, apart } = isBefore ? { cause: null, apart: false } : movement
    const sum = entry(sums, [refrigerant, ownerId, isBefore, cause, apart], { refrigerant, ownerId, isBefore, cause, apart, grams: 0, movements: 0 })
    sum.grams += grams
    sum.movements += 1
  }
  return [...sums.values()]
}

/** Changes of stock summed for a period; what comes after it counts for nothing. */
export function stockSums(changes: readonly StockChange[], { fromMs, untilMs }: Span): StockSum[] {
  const sums = new Map<string, StockSum>()
  for (const change of changes) {
    if (change.at >= untilMs) continue
    const { refrigerant, ownerId } = change
    const isBefore = change.at < fromMs
    const apart = change.apart && !isBefore
    const sum = entry(sums, [refrigerant, ownerId, isBefore, apart], { refrigerant, ownerId, isBefore, apart, grams: 0, notKnown: 0, weighedVariance: 0, foundVariance: 0, weighedTogether: 0, foundTogether: 0 })
    sum.grams += change.grams
    sum.notKnown += change.notKnown
    sum.weighedVariance += change.weighedVariance
    sum.foundVariance += change.foundVariance
    sum.weighedTogether += change.weighedTogether
    sum.foundTogether += change.foundTogether
  }
  return [...sums.values()]
}

function entry<T>(map: Map<string, T>, key: unknown[], fresh: T): T {
  const name = JSON.stringify(key)
  const known = map.get(name)
  if (known) return known
  map.set(name, fresh)
  return fresh
}
