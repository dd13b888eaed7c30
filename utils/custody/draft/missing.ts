import { typedText, type DraftKind } from './draft'

export interface MissingDraft { lastSeen: string }
export interface FoundDraft { placeId: string }

/** The form of a cylinder that nobody finds. */
export const MISSING: DraftKind<'missing', MissingDraft> = {
  empty: () => ({ lastSeen: '' }),
  read: ({ lastSeen }) => ({ details: { ...(typedText(lastSeen) && { lastSeen: typedText(lastSeen) }) } }),
  of: ({ lastSeen }) => ({ lastSeen: lastSeen ?? '' }),
}

/** The form of a cylinder that is there again; without a place it stands where the log has it. */
export const FOUND: DraftKind<'found', FoundDraft> = {
  empty: () => ({ placeId: '' }),
  read: ({ placeId }) => ({ details: { ...(placeId && { placeId }) } }),
  of: ({ placeId }) => ({ placeId: placeId ?? '' }),
}
