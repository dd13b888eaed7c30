import type { DraftKind } from './draft'

/** What the form of a move holds. */
export interface MovedDraft { toPlaceId: string }

/** The form of a move; who holds the cylinder follows from the van. */
export const MOVED: DraftKind<'moved', MovedDraft> = {
  empty: () => ({ toPlaceId: '' }),
  read: ({ toPlaceId }, { places }) => {
    if (toPlaceId === '') return { reason: 'Choose where it went.' }
    const technicianId = places.find(place => place.id === toPlaceId)?.technicianId
    return { details: { toPlaceId, ...(technicianId && { toHolderId: technicianId }) } }
  },
  of: ({ toPlaceId }) => ({ toPlaceId }),
}
