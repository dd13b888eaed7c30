import { typedText, type DraftKind } from './draft'

/** What the form of a missing cylinder holds. */
export interface MissingDraft { lastSeen: string }
/** What the form of a found cylinder holds. */
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
