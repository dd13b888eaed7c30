import { DAMAGE_REASONS, type DamageReason } from '../damage'
import type { DraftKind } from './draft'

/** What the form of an outside look holds; '' while nothing was chosen. */
export interface InspectedDraft { result: 'sound' | 'damaged' | '', reasons: DamageReason[] }

/** The form of an outside look. */
export const INSPECTED: DraftKind<'inspected', InspectedDraft> = {
  empty: () => ({ result: '', reasons: [] }),
  read: ({ result, reasons }) => {
    if (result === '') return { reason: 'Choose what you saw.' }
    if (result === 'sound') return { details: { result } }
    if (reasons.length === 0) return { reason: 'Tick what is damaged.' }
    return { details: { result, reasons: DAMAGE_REASONS.filter(reason => reasons.includes(reason)) } }
  },
  of: details => ({ result: details.result, reasons: details.result === 'damaged' ? [...details.reasons ?? []] : [] }),
}
