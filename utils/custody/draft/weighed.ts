import type { MassReading } from '../../quantity/mass'
import type { DraftKind } from './draft'

/** What the form of a weighing holds. */
export interface WeighedDraft { gross: MassReading | null, scaleId: string }

/** The form of a weighing. */
export const WEIGHED: DraftKind<'weighed', WeighedDraft> = {
  empty: ({ scaleId = '' }) => ({ gross: null, scaleId }),
  read: ({ gross, scaleId }) => gross
    ? { details: { gross, ...(scaleId && { scaleId }) } }
    : { reason: 'Type what the scale shows.' },
  of: ({ gross, scaleId }) => ({ gross, scaleId: scaleId ?? '' }),
}
