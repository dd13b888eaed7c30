import type { CylinderView } from '../cylinderView'
import type { DetailsOf } from '../schema'

/** The form of an exchange with a firm. */
export interface ExchangeDraft {
  /** The cylinder whose page it is goes to the firm; else it comes from it. */
  goes: boolean
  /** '' while none was chosen. */
  otherId: string
  firmId: string
  /** Where the one that came is put. */
  placeId: string
  /** Both halves carry it, also when they are sent again. */
  exchangeId: string
}

/** Both halves of an exchange, or what is still missing, in words. */
export type ExchangeHalves = { out: DetailsOf<'exchanged'>, in: DetailsOf<'exchanged'>, placeId: string } | { reason: string }

/** Reads the two halves. */
export function readExchange(draft: ExchangeDraft, out: CylinderView | null, into: CylinderView | null): ExchangeHalves {
  if (draft.firmId === '') return { reason: 'Choose the firm.' }
  if (!out || !into) return { reason: 'Scan or choose the other cylinder, or register it first.' }
  if (out.id === into.id) return { reason: 'Choose another cylinder: it cannot be exchanged for itself.' }
  if (draft.placeId === '') return { reason: 'Choose where the one that came stands.' }
  const both = { exchangeId: draft.exchangeId, firmId: draft.firmId }
  return {
    out: { ...both, direction: 'out', otherCylinderId: into.id },
    in: { ...both, direction: 'in', otherCylinderId: out.id },
    placeId: draft.placeId,
  }
}
