import type { MassReading } from '../../quantity/mass'
import { isRecoveryMethod, type RecoveryMethod } from '../../recovery/methods'
import type { Condition, CylinderView } from '../cylinderView'
import type { DetailsOf } from '../schema'
import { typedText, type DraftKind, type ReadDraft } from './draft'

/** The choice of a refrigerant that nobody knows the name of. */
export const NOT_KNOWN = 'not-known'

/** The choice of a method that has no name here. */
export const OTHER_METHOD = 'other'

export interface FilledDraft {
  /** A designation, {@link NOT_KNOWN}, or '' while none is chosen. */
  refrigerant: string
  condition: Condition | ''
  grossBefore: MassReading | null
  grossAfter: MassReading | null
  /** '' = not said. */
  method: RecoveryMethod | typeof OTHER_METHOD | ''
  /** How, where the method is another one. */
  otherMethod: string
  /** '' = the firm's own. */
  ownerId: string
  /** '' = of no job. */
  jobId: string
  /** Whose cylinder it is agrees. */
  ownerConsents: boolean
  looked: boolean
  scaleId: string
  /** What was noted while it was filled; a correction of the weights leaves it as it is. */
  onTheWay: OnTheWay
}

/** What only whoever stood by while it was filled can say. */
export type OnTheWay = Pick<DetailsOf<'filled'>, 'readings' | 'purged' | 'reached'>

/** The form of a recovery. */
export const FILLED: DraftKind<'filled', FilledDraft> = {
  empty: ({ view, asked, scaleId }) => emptyFill(refrigerantToBegin(view, asked), scaleId),
  read: draft => readFill(draft),
  of: details => ({
    refrigerant: details.refrigerant ?? NOT_KNOWN,
    condition: details.condition ?? '',
    grossBefore: details.grossBefore ?? null,
    grossAfter: details.grossAfter,
    ...methodOf(details.method),
    ownerId: details.ownerOfRefrigerantId ?? '',
    jobId: details.jobId ?? '',
    ownerConsents: details.ownerConsents === true,
    looked: details.looked === true,
    scaleId: details.scaleId ?? '',
    onTheWay: onTheWayOf(details),
  }),
}

/** A recovery of which nothing is said yet. */
export function emptyFill(refrigerant = '', scaleId = ''): FilledDraft {
  return {
    refrigerant, condition: '', grossBefore: null, grossAfter: null, method: '', otherMethod: '', ownerId: '', jobId: '', ownerConsents: false, looked: false, scaleId, onTheWay: {},
  }
}

/** The details of a recovery, or what is still missing; nothing of it depends on the cylinder. */
export function readFill(draft: FilledDraft): ReadDraft<'filled'> {
  if (draft.refrigerant === '') return { reason: 'Choose the refrigerant that went in.' }
  if (!draft.grossAfter) return { reason: 'Type what the scale shows, hoses off.' }
  const method = draft.method === OTHER_METHOD ? typedText(draft.otherMethod) : draft.method
  if (draft.method === OTHER_METHOD && !method) return { reason: 'Write how it was brought out, or leave the method open.' }
  return {
    details: {
      refrigerant: draft.refrigerant === NOT_KNOWN ? null : draft.refrigerant,
      ...(draft.condition && { condition: draft.condition }),
      ...(draft.grossBefore && { grossBefore: draft.grossBefore }),
      grossAfter: draft.grossAfter,
      ...(method && { method }),
      ...(draft.ownerId && { ownerOfRefrigerantId: draft.ownerId }),
      ...(draft.jobId && { jobId: draft.jobId }),
      ...(draft.ownerConsents && { ownerConsents: true as const }),
      ...(draft.scaleId && { scaleId: draft.scaleId }),
      ...(draft.looked && { looked: true as const }),
      ...draft.onTheWay,
    },
  }
}

function onTheWayOf({ readings, purged, reached }: OnTheWay): OnTheWay {
  return { ...(readings && { readings }), ...(purged && { purged }), ...(reached && { reached }) }
}

function methodOf(line: string | undefined): Pick<FilledDraft, 'method' | 'otherMethod'> {
  if (line === undefined) return { method: '', otherMethod: '' }
  return isRecoveryMethod(line) ? { method: line, otherMethod: '' } : { method: OTHER_METHOD, otherMethod: line }
}

function refrigerantToBegin(view: CylinderView, asked: string | null): string {
  if (!view.contents.nothingInIt) return view.contents.refrigerant ?? ''
  return asked ?? view.stamp?.dedicatedTo ?? ''
}
