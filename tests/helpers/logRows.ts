import type { LogRow } from '../../server/utils/custody/logRow'
import type { AnyRecordedEvent } from '../../utils/custody/event'
import { rechained } from './tampering'

/** The lines of one cylinder's log as the writer would have stored these events, numbered from `seq` on. */
export function logRowsOf(events: readonly AnyRecordedEvent[], seq: number): LogRow[] {
  return rechained(events.map((event, index): LogRow => ({
    seq: seq + index,
    id: event.id,
    cylinder_id: event.cylinderId,
    version: event.version,
    device_id: event.deviceId,
    device_seq: event.deviceSeq,
    kind: event.kind,
    occurred_at: event.occurredAt,
    occurred_offset_minutes: event.occurredOffsetMinutes,
    clock_skew_seconds: event.clockSkewSeconds,
    effective_at: event.effectiveAt,
    recorded_at: event.recordedAt,
    actor_id: event.actorId,
    posted_by: event.postedBy,
    supervisor_id: event.supervisorId,
    trainee: event.trainee ? 1 : 0,
    place_id: event.placeId,
    body: JSON.stringify({ details: event.details }),
    content_hash: '',
    prev_hash: '',
    hash: '',
  })))
}
