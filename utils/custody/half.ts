import type { EventKind, PairedKind } from './kinds'
import type { DetailsOf } from './schema'

/** What went over by one half of a transfer. */
export interface HalfTransfer {
  /** As its author wrote it on this half; null = not known. */
  refrigerant: string | null
  /** By the two weights of this half; null where one of them is not known. Negative where the scale moved the wrong way. */
  grams: number | null
  /** How far both weights together may be off. */
  accuracyGrams: number
}

/**
 * One cylinder's half of what happened between two, as its own log has it.
 *
 * Units: grams; `at` in UTC milliseconds of effect.
 */
export interface Half {
  eventId: string
  kind: PairedKind
  /** Both halves carry it. */
  pairId: string
  cylinderId: string
  otherId: string
  direction: 'out' | 'in'
  at: number
  /** null for an exchange: there no weight goes over. */
  transfer: HalfTransfer | null
}

/** The other cylinder that an event of these details names; null where its kind has none. */
export function otherCylinderOf(kind: EventKind, details: unknown): string | null {
  if (kind === 'transferred') return (details as DetailsOf<'transferred'>).counterpartId
  return kind === 'exchanged' ? (details as DetailsOf<'exchanged'>).otherCylinderId : null
}

/** What both halves of a pair carry, of an event of these details; null where its kind has none. */
export function pairIdOf(kind: EventKind, details: unknown): string | null {
  if (kind === 'transferred') return (details as DetailsOf<'transferred'>).transferId
  return kind === 'exchanged' ? (details as DetailsOf<'exchanged'>).exchangeId : null
}

/**
 * The other cylinder's half for each of a cylinder's own; null where it is not recorded.
 *
 * Of several halves with one pair's id each has its own: the first in effect the first, and so on.
 *
 * Shape: `mine` and each cylinder's among `others` in order of effect.
 */
export function withOtherHalf(mine: readonly Half[], others: readonly Half[]): { half: Half, other: Half | null }[] {
  return mine.map((half, index) => {
    const before = mine.slice(0, index).filter(one => isSameSide(one, half)).length
    return { half, other: others.filter(one => isCounter(one, half))[before] ?? null }
  })
}

function isSameSide(a: Half, b: Half): boolean {
  return a.kind === b.kind && a.pairId === b.pairId && a.otherId === b.otherId && a.direction === b.direction
}

function isCounter(other: Half, half: Half): boolean {
  return other.kind === half.kind && other.pairId === half.pairId && other.direction !== half.direction
    && other.cylinderId === half.otherId && other.otherId === half.cylinderId
}
