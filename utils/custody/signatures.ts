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
 * Only the supervisor that the entry names signs it, never its author nor a trainee, before or after it in effect. What
 * a trainee has since corrected was not what was signed, and is signed anew. Shape: `standings` in order of effect.
 */
export function signaturesOf(standings: readonly Standing[]): ReadonlyMap<string, string> {
  const placeOf = new Map(standings.map(({ event }, index) => [event.id, index]))
  const signedBy = new Map<string, string>()
  standings.forEach(({ event: signature, isOut }, index) => {
    if (isOut || !isSignature(signature)) return
    const { eventId } = signature.details
    const signed = standings[placeOf.get(eventId) ?? -1]
    if (signed === undefined || signedBy.has(eventId) || !mayHaveSigned(signature, signed.event)) return
    const mendedAt = signed.correction === null ? -1 : placeOf.get(signed.correction.eventId) ?? -1
    if (mendedAt > index && standings[mendedAt]!.event.trainee) return
    signedBy.set(eventId, signature.id)
  })
  return signedBy
}

/** The entries that wait for a signature. Shape: `standings` in order of effect. */
export function waitingEntries(standings: readonly Standing[]): AnyRecordedEvent[] {
  const signed = signaturesOf(standings)
  return standings.filter(({ event, isOut }) => !isOut && needsSignature(event) && !signed.has(event.id)).map(({ event }) => event)
}

function mayHaveSigned(signature: AnyRecordedEvent, signed: AnyRecordedEvent): boolean {
  return needsSignature(signed) && !signature.trainee && signature.actorId === signed.supervisorId && signature.actorId !== signed.actorId
}

function isSignature(event: AnyRecordedEvent): event is RecordedEvent<'countersigned'> {
  return event.kind === 'countersigned'
}
