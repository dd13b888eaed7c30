import type { Access } from '../access/roles'
import type { AnyCustodyEvent, AnyRecordedEvent } from './event'

/** Where an event would stand: after these numbers of the whole log and of its cylinder. */
export interface LastNumbers { seq: number, version: number }

/**
 * An event as it would stand in the log if it were recorded now by whoever is signed in.
 *
 * The author's clock is taken as right, for it is only measured when the event is sent.
 */
export function recordedNow(event: AnyCustodyEvent, last: LastNumbers, { access, nowMs }: { access: Access | null, nowMs: number }): AnyRecordedEvent {
  const occurredAt = Date.parse(event.occurredAt)
  const authorId = access?.personId ?? ''
  return {
    seq: last.seq + 1,
    id: event.id,
    cylinderId: event.cylinderId,
    version: last.version + 1,
    kind: event.kind,
    occurredAt,
    occurredOffsetMinutes: 0,
    clockSkewSeconds: 0,
    effectiveAt: Math.min(occurredAt, nowMs),
    recordedAt: nowMs,
    deviceId: event.deviceId,
    deviceSeq: event.deviceSeq,
    actorId: authorId,
    postedBy: authorId,
    supervisorId: event.supervisorId ?? null,
    trainee: access?.trainee ?? false,
    placeId: event.placeId ?? null,
    note: event.note ?? null,
    practice: event.practice ?? false,
    confirmed: event.confirmed ?? [],
    details: event.details,
  } as AnyRecordedEvent
}
