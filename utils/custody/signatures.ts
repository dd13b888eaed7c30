import type { Standing } from './corrections'
import type { AnyRecordedEvent, RecordedEvent } from './event'

/** A trainee's entry waits for the signature of its supervisor; `by` is the event that gave it, null while it waits. */
export interface Signature { by: string | null }

/** Whether an entry needs a supervisor's signature before the firm's totals count it. */
export function needsSignature(event: Pick<AnyRecordedEvent, 'kind' | 'trainee'>): boolean {
  return event.trainee && event.kind !== 'corrected' && event.kind !== 'countersigned'
}

/**
 * The signatures on trainees' entries: by the id of the entry, the id of the event that signed it first.
 *
 * Only the supervisor that the entry names signs it, never its author nor a trainee, before or after it in effect. A
 * signature that was corrected is none: nobody puts another's name under what they did not sign. What a trainee has since
 * changed, by the time of the change or of its recording, was not what was signed, and is signed anew, unless somebody else
 * has corrected it after that.
 *
 * Shape: `standings` in order of effect.
 */
export function signaturesOf(standings: readonly Standing[]): ReadonlyMap<string, string> {
  const placeOf = new Map(standings.map(({ event }, index) => [event.id, index]))
  const changes = traineesChanges(standings, placeOf)
  const signedBy = new Map<string, string>()
  standings.forEach(({ event: signature, isOut, correction }, index) => {
    if (isOut || correction !== null || !isSignature(signature)) return
    const { eventId } = signature.details
    const signed = standings[placeOf.get(eventId) ?? -1]
    if (signed === undefined || signedBy.has(eventId) || !mayHaveSigned(signature, signed.event)) return
    const unseen = (changes.get(eventId) ?? []).filter(place => place > index || standings[place]!.event.recordedAt > signature.recordedAt)
    const mended = placeOf.get(signed.correction?.eventId ?? '')
    const isOthersWord = mended !== undefined && mended > Math.max(...unseen) && !standings[mended]!.event.trainee
    if (unseen.length > 0 && !isOthersWord) return
    signedBy.set(eventId, signature.id)
  })
  return signedBy
}

/** The entries that wait for a signature. Shape: `standings` in order of effect. */
export function waitingEntries(standings: readonly Standing[]): AnyRecordedEvent[] {
  const signed = signaturesOf(standings)
  return standings.filter(({ event, isOut }) => !isOut && needsSignature(event) && !signed.has(event.id)).map(({ event }) => event)
}

/**
 * The places at which trainees changed an entry, by the entry's id: by correcting it, or by correcting or taking out a
 * correction of it, however many there are in a row.
 */
function traineesChanges(standings: readonly Standing[], placeOf: ReadonlyMap<string, number>): ReadonlyMap<string, number[]> {
  const changes = new Map<string, number[]>()
  standings.forEach(({ event, isOut }, index) => {
    if (isOut || !event.trainee || !isCorrection(event)) return
    const passed = new Set<string>()
    let named = event.details.eventId
    while (!passed.has(named)) {
      passed.add(named)
      const next = standings[placeOf.get(named) ?? -1]?.event
      if (next && isCorrection(next)) named = next.details.eventId
    }
    changes.set(named, [...changes.get(named) ?? [], index])
  })
  return changes
}

function mayHaveSigned(signature: AnyRecordedEvent, signed: AnyRecordedEvent): boolean {
  return needsSignature(signed) && !signature.trainee && signature.actorId === signed.supervisorId && signature.actorId !== signed.actorId
}

function isSignature(event: AnyRecordedEvent): event is RecordedEvent<'countersigned'> {
  return event.kind === 'countersigned'
}

function isCorrection(event: AnyRecordedEvent): event is RecordedEvent<'corrected'> {
  return event.kind === 'corrected'
}
