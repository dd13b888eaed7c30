import type { Condition } from '../capacity/types'

/** What may be brought together with each other: at one place, one refrigerant in one condition, of one owner. */
export interface Lot {
  placeId: string
  refrigerant: string
  condition: Condition
  /** Burnt refrigerant was in the cylinder since its last deep vacuum. */
  burnt: boolean
  /** Of the refrigerant; null = the contractor itself. */
  ownerId: string | null
}

/** A lot as one word, the same for two that are the same. */
export function lotKey({ placeId, refrigerant, condition, burnt, ownerId }: Lot): string {
  return [placeId, refrigerant, condition, burnt ? 'after burnt' : '', ownerId ?? ''].join('|')
}

/**
 * Whether contents of one lot may go onto another, beside their own, where the firm allows worse with worse: suspect onto
 * burnt, which stays what it is. Never clean onto anything else, and never burnt onto what is not burnt.
 */
export function isWorseOntoWorse(from: Lot, onto: Lot): boolean {
  return from.condition === 'suspect' && onto.condition === 'burnt' && (onto.burnt || !from.burnt)
    && from.placeId === onto.placeId && from.refrigerant === onto.refrigerant && from.ownerId === onto.ownerId
}
