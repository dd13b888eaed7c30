import { hashEvent } from '../../../utils/custody/chain'
import type { ParsedPost } from './judge'
import type { LogRow } from './logRow'
import type { Posting } from './posting'
import { sha256 } from './sha256'

/** A clock that is off by less is taken as right. */
const SKEW_IGNORED_MS = 60_000

/** The last line of a cylinder's chain. */
export interface ChainHead { version: number, hash: string }

/**
 * An accepted event as the line that the log will hold: its times settled, its chain closed.
 *
 * @param supervisorId of a trainee's entry, by what the firm knew when it was recorded; the body keeps whom it named.
 */
export function sealedRow(post: ParsedPost, posting: Posting, head: ChainHead, seq: number, supervisorId: string | null): LogRow {
  const { event } = post
  const occurredAt = Date.parse(event.occurredAt)
  const clockSkewSeconds = skewSeconds(posting)
  const open: Omit<LogRow, 'hash'> = {
    seq,
    id: event.id,
    cylinder_id: event.cylinderId,
    version: head.version + 1,
    device_id: event.deviceId,
    device_seq: event.deviceSeq,
    kind: event.kind,
    occurred_at: occurredAt,
    occurred_offset_minutes: offsetMinutes(event.occurredAt),
    clock_skew_seconds: clockSkewSeconds,
    effective_at: Math.min(occurredAt - clockSkewSeconds * 1000, posting.now),
    recorded_at: posting.now,
    actor_id: posting.access.personId,
    posted_by: posting.access.personId,
    supervisor_id: supervisorId,
    trainee: posting.access.trainee ? 1 : 0,
    place_id: event.placeId ?? null,
    body: post.body,
    content_hash: post.contentHash,
    prev_hash: head.hash,
  }
  return { ...open, hash: hashEvent(open, sha256) }
}

/** Whole seconds by which the sender's clock runs ahead; 0 below a minute and where it did not say. */
function skewSeconds({ deviceNow, now }: Posting): number {
  if (deviceNow === null) return 0
  const skew = deviceNow - now
  return Math.abs(skew) < SKEW_IGNORED_MS ? 0 : Math.trunc(skew / 1000)
}

function offsetMinutes(instant: string): number {
  const match = /([+-])(\d\d):?(\d\d)$/.exec(instant)
  if (!match) return 0
  const minutes = Number(match[2]) * 60 + Number(match[3])
  return match[1] === '-' ? -minutes : minutes
}
