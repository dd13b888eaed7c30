import type { MassReading } from '../../quantity/mass'
import type { DraftKind } from './draft'

export const LOSS_CAUSES = ['leak', 'relief', 'hose', 'accident', 'unknown'] as const

export interface LostDraft { grossAfter: MassReading | null, cause: (typeof LOSS_CAUSES)[number] | '', unavoidable: boolean }

/** The form of refrigerant that got away. */
export const LOST: DraftKind<'lost', LostDraft> = {
  empty: () => ({ grossAfter: null, cause: '', unavoidable: false }),
  read: ({ grossAfter, cause, unavoidable }) => cause === ''
    ? { reason: 'Choose how it was lost.' }
    : { details: { ...(grossAfter && { grossAfter }), cause, ...(unavoidable && { unavoidable: true }) } },
  of: ({ grossAfter, cause, unavoidable }) => ({ grossAfter: grossAfter ?? null, cause, unavoidable: unavoidable === true }),
}
