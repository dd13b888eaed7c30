import type { MassReading } from '../../quantity/mass'
import type { Condition, CylinderView } from '../cylinderView'
import type { DraftKind } from './draft'

/** The choice of a refrigerant that nobody knows the name of. */
export const NOT_KNOWN = 'not-known'

export interface FilledDraft {
  /** A designation, {@link NOT_KNOWN}, or '' while none is chosen. */
  refrigerant: string
  condition: Condition | ''
  grossBefore: MassReading | null
  grossAfter: MassReading | null
  /** '' = the firm's own. */
  ownerId: string
  looked: boolean
  scaleId: string
}

/** The form of a recovery. */
export const FILLED: DraftKind<'filled', FilledDraft> = {
  empty: ({ view, asked }) => ({
    refrigerant: refrigerantToBegin(view, asked),
    condition: '',
    grossBefore: null,
    grossAfter: null,
    ownerId: '',
    looked: false,
    scaleId: '',
  }),
  read: (draft) => {
    if (draft.refrigerant === '') return { reason: 'Choose the refrigerant that went in.' }
    if (!draft.grossAfter) return { reason: 'Type what the scale shows, hoses off.' }
    return {
      details: {
        refrigerant: draft.refrigerant === NOT_KNOWN ? null : draft.refrigerant,
        ...(draft.condition && { condition: draft.condition }),
        ...(draft.grossBefore && { grossBefore: draft.grossBefore }),
        grossAfter: draft.grossAfter,
        ...(draft.ownerId && { ownerOfRefrigerantId: draft.ownerId }),
        ...(draft.scaleId && { scaleId: draft.scaleId }),
        ...(draft.looked && { looked: true as const }),
      },
    }
  },
  of: details => ({
    refrigerant: details.refrigerant ?? NOT_KNOWN,
    condition: details.condition ?? '',
    grossBefore: details.grossBefore ?? null,
    grossAfter: details.grossAfter,
    ownerId: details.ownerOfRefrigerantId ?? '',
    looked: details.looked === true,
    scaleId: details.scaleId ?? '',
  }),
}

function refrigerantToBegin(view: CylinderView, asked: string | null): string {
  if (!view.contents.nothingInIt) return view.contents.refrigerant ?? ''
  return asked ?? view.stamp?.dedicatedTo ?? ''
}
