import type { MassReading } from '../../quantity/mass'
import type { Condition } from '../cylinderView'
import type { PairedKind } from '../kinds'
import type { DetailsOf } from '../schema'
import type { DraftKind } from './draft'
import { NOT_KNOWN } from './filled'

/** What a correction may say anew of one half of a transfer; which cylinders it was between stays. */
export interface TransferHalfDraft {
  /** A designation, or {@link NOT_KNOWN}. */
  refrigerant: string
  condition: Condition
  grossBefore: MassReading | null
  grossAfter: MassReading | null
  /** What stays as it was said. */
  stays: Pick<DetailsOf<'transferred'>, 'direction' | 'counterpartId' | 'transferId' | 'ownerOfRefrigerantId' | 'ownerConsents'> | null
}

/** The form that mends one half of a transfer. */
export const TRANSFER_HALF: DraftKind<'transferred', TransferHalfDraft> = {
  empty: () => ({ refrigerant: NOT_KNOWN, condition: 'unknown', grossBefore: null, grossAfter: null, stays: null }),
  read: ({ refrigerant, condition, grossBefore, grossAfter, stays }) => {
    if (!grossAfter || !stays) return { reason: 'Type what the scale showed after, hoses off.' }
    return { details: { ...stays, refrigerant: refrigerant === NOT_KNOWN ? null : refrigerant, condition, ...(grossBefore && { grossBefore }), grossAfter } }
  },
  of: ({ refrigerant, condition, grossBefore, grossAfter, ...stays }) => ({ refrigerant: refrigerant ?? NOT_KNOWN, condition, grossBefore: grossBefore ?? null, grossAfter, stays }),
}

/** What a correction may say anew of one half of an exchange: with which firm it was. */
export interface ExchangeHalfDraft {
  firmId: string
  stays: Omit<DetailsOf<'exchanged'>, 'firmId'> | null
}

/** The form that mends one half of an exchange. */
export const EXCHANGE_HALF: DraftKind<'exchanged', ExchangeHalfDraft> = {
  empty: () => ({ firmId: '', stays: null }),
  read: ({ firmId, stays }) => firmId && stays ? { details: { ...stays, firmId } } : { reason: 'Choose the firm.' },
  of: ({ firmId, ...stays }) => ({ firmId, stays }),
}

/** What both halves of a pair say alike; each has its own weights. */
const SAID_BY_BOTH: Record<PairedKind, readonly string[]> = {
  transferred: ['refrigerant', 'condition'],
  exchanged: ['firmId'],
} satisfies { [K in PairedKind]: readonly (keyof DetailsOf<K>)[] }

/** Whether two halves of a pair say the same of what both of them say. */
export function sayTheSame(kind: PairedKind, one: unknown, other: unknown): boolean {
  return SAID_BY_BOTH[kind].every(key => Object(one)[key] === Object(other)[key])
}

/** The other half with what both say taken from this one, and its own weights. */
export function otherHalfMended(kind: PairedKind, mended: unknown, other: unknown): Record<string, unknown> {
  return { ...Object(other), ...Object.fromEntries(SAID_BY_BOTH[kind].map(key => [key, Object(mended)[key]])) }
}

/** Whether two lines of different cylinders are the two halves of one pair. */
export function areHalvesOfOne(one: { kind: string, details: unknown }, other: { kind: string, details: unknown }): boolean {
  const [mine, theirs] = [Object(one.details), Object(other.details)]
  return one.kind === other.kind && mine.direction !== theirs.direction
    && (one.kind === 'transferred' ? mine.transferId === theirs.transferId : one.kind === 'exchanged' && mine.exchangeId === theirs.exchangeId)
}
