import { readingGrams, type MassReading } from '../../quantity/mass'
import { scaleAccuracyGrams } from '../../quantity/scale'
import type { CylinderView } from '../cylinderView'
import type { DetailsOf } from '../schema'

/** The form of a transfer between two cylinders. */
export interface TransferDraft {
  /** The cylinder whose page it is gives; else it takes. */
  gives: boolean
  /** '' while none was chosen. */
  otherId: string
  /** Both halves carry it, also when they are sent again. */
  transferId: string
  outBefore: MassReading | null
  outAfter: MassReading | null
  inBefore: MassReading | null
  inAfter: MassReading | null
  /** Whose cylinder it goes into agrees. */
  ownerConsents?: boolean
}

/** A transfer in which nothing was said yet: out of a cylinder that holds something, into one that holds nothing. */
export function emptyTransfer(view: CylinderView | null, transferId: string): TransferDraft {
  return {
    gives: view === null || !view.contents.nothingInIt, otherId: '', transferId, outBefore: null, outAfter: null, inBefore: null, inAfter: null, ownerConsents: false,
  }
}

/** Both halves of a transfer, or what is still missing, in words. */
export type TransferHalves = { out: DetailsOf<'transferred'>, in: DetailsOf<'transferred'> } | { reason: string }

/** Reads the two halves: both say of the refrigerant what the log says of the cylinder that it came out of. */
export function readTransfer(draft: TransferDraft, from: CylinderView | null, into: CylinderView | null): TransferHalves {
  if (!from || !into) return { reason: 'Scan or choose the other cylinder.' }
  if (from.id === into.id) return { reason: 'Choose another cylinder: it cannot go into itself.' }
  const { outBefore, outAfter, inBefore, inAfter, ownerConsents } = draft
  if (!outAfter) return { reason: 'Type what the scale shows of the one it came out of, hoses off.' }
  if (!inAfter) return { reason: 'Type what the scale shows of the one it went into, hoses off.' }
  const both = { transferId: draft.transferId, ...saidOf(from) }
  return {
    out: { ...both, direction: 'out', counterpartId: into.id, ...(outBefore && { grossBefore: outBefore }), grossAfter: outAfter },
    in: { ...both, direction: 'in', counterpartId: from.id, ...(ownerConsents && { ownerConsents: true as const }), ...(inBefore && { grossBefore: inBefore }), grossAfter: inAfter },
  }
}

// Of several owners the one with the most; what comes out of a cylinder that should hold nothing is not known.
function saidOf({ contents }: CylinderView): Pick<DetailsOf<'transferred'>, 'refrigerant' | 'condition' | 'ownerOfRefrigerantId'> {
  if (contents.nothingInIt) return { refrigerant: null, condition: 'unknown' }
  const owner = contents.owners.reduce<{ ownerId: string | null, grams: number | null } | null>(
    (most, one) => most === null || (one.grams ?? 0) > (most.grams ?? 0) ? one : most, null)
  return {
    refrigerant: contents.refrigerant,
    condition: contents.condition === 'clean' && contents.burnt ? 'burnt' : contents.condition,
    ...(owner?.ownerId && { ownerOfRefrigerantId: owner.ownerId }),
  }
}

/** What went out and what came in by the four readings, and what their accuracies explain; null while one is missing. */
export function transferBalance({ outBefore, outAfter, inBefore, inAfter }: TransferDraft): { outGrams: number, inGrams: number, withinGrams: number, balances: boolean } | null {
  if (!outBefore || !outAfter || !inBefore || !inAfter) return null
  const readings = [outBefore, outAfter, inBefore, inAfter].map(readingGrams)
  const outGrams = readings[0]! - readings[1]!
  const inGrams = readings[3]! - readings[2]!
  const withinGrams = readings.reduce((sum, grams) => sum + scaleAccuracyGrams(grams), 0)
  return { outGrams, inGrams, withinGrams, balances: Math.abs(outGrams - inGrams) <= withinGrams }
}
