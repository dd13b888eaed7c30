import type { DraftKind } from './draft'

/** What the form of a hand-over holds. */
export interface HandedOverDraft { toHolderId: string }

/** The form of a cylinder that went from hand to hand. */
export const HANDED_OVER: DraftKind<'handed-over', HandedOverDraft> = {
  empty: () => ({ toHolderId: '' }),
  read: ({ toHolderId }) => toHolderId === ''
    ? { reason: 'Choose who has it now.' }
    : { details: { toHolderId } },
  of: ({ toHolderId }) => ({ toHolderId }),
}
