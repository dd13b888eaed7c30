import { typedText, type DraftKind } from './draft'

/** What a form that only asks why holds. */
export interface ReasonDraft { reason: string }

/** The form of a cylinder that is set apart. */
export const QUARANTINED: DraftKind<'quarantined', ReasonDraft> = reasonForm('Say why it is set apart.')

/** The form of a cylinder that is set apart no longer. */
export const RELEASED: DraftKind<'released', ReasonDraft> = reasonForm('Say why it may be used again.')

function reasonForm(missing: string): DraftKind<'quarantined', ReasonDraft> & DraftKind<'released', ReasonDraft> {
  return {
    empty: () => ({ reason: '' }),
    read: ({ reason: typed }) => {
      const reason = typedText(typed)
      return reason === undefined ? { reason: missing } : { details: { reason } }
    },
    of: ({ reason }) => ({ reason }),
  }
}
