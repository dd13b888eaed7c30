import type { MassReading } from '../../quantity/mass'
import { typedText, type DraftContext, type DraftKind } from './draft'

export interface ReceivedDraft { placeId: string, fromFirmId: string, gross: MassReading | null, paper: string }
export interface ReturnedDraft { placeId: string, fromFirmId: string, gross: MassReading | null }

/** The form of a cylinder that came in. */
export const RECEIVED: DraftKind<'received', ReceivedDraft> = {
  empty: context => ({ placeId: shopToBegin(context), fromFirmId: '', gross: null, paper: '' }),
  read: ({ placeId, fromFirmId, gross, paper }) => placeId === ''
    ? { reason: 'Choose where it came in.' }
    : { details: { ...(fromFirmId && { fromFirmId }), ...(gross && { gross }), ...(typedText(paper) && { paper: typedText(paper) }) }, placeId },
  of: ({ fromFirmId, gross, paper }, placeId) => ({ placeId: placeId ?? '', fromFirmId: fromFirmId ?? '', gross: gross ?? null, paper: paper ?? '' }),
}

/** The form of a cylinder that came back. */
export const RETURNED: DraftKind<'returned', ReturnedDraft> = {
  empty: context => ({ placeId: shopToBegin(context), fromFirmId: firmToBegin(context), gross: null }),
  read: ({ placeId, fromFirmId, gross }) => {
    if (placeId === '') return { reason: 'Choose where it came back to.' }
    if (fromFirmId === '') return { reason: 'Choose the firm that it came back from. Between places of our own it is a move.' }
    return { details: { fromFirmId, ...(gross && { gross }) }, placeId }
  },
  of: ({ fromFirmId, gross }, placeId) => ({ placeId: placeId ?? '', fromFirmId, gross: gross ?? null }),
}

/** The only shop, where there is one. */
function shopToBegin({ places }: DraftContext): string {
  const shops = places.filter(place => place.kind === 'shop')
  return shops.length === 1 ? shops[0]!.id : ''
}

/** The firm at whose place it is said to be. */
function firmToBegin({ view, places }: DraftContext): string {
  return places.find(place => place.id === view.place?.id)?.firmId ?? ''
}
