import type { EventKind } from './kinds'
import type { DetailsOf } from './schema'

/** An event as its author sent it, parsed by its kind's schema. */
export interface CustodyEvent<K extends EventKind = EventKind> {
  id: string
  cylinderId: string
  kind: K
  /** ISO 8601 with offset, as the author's clock had it. */
  occurredAt: string
  /** '' where a script left it out. */
  deviceId: string
  /** 0 where a script left it out. */
  deviceSeq: number
  placeId?: string
  supervisorId?: string
  note?: string
  photoIds?: string[]
  practice?: boolean
  /** Finding codes that the author had seen and confirmed. */
  confirmed?: string[]
  /** Version of the cylinder that a decision was made on. */
  expects?: number
  details: DetailsOf<K>
}

/** An event as the log holds it. Instants are UTC milliseconds. */
export interface RecordedEvent<K extends EventKind = EventKind> {
  seq: number
  id: string
  cylinderId: string
  /** 1..n within the cylinder, by arrival. */
  version: number
  kind: K
  occurredAt: number
  occurredOffsetMinutes: number
  /** Whole seconds by which the author's clock ran ahead of ours when it was sent; 0 below a minute. */
  clockSkewSeconds: number
  /** occurredAt less the skew, never after recordedAt: the order that the fold follows. */
  effectiveAt: number
  recordedAt: number
  deviceId: string
  deviceSeq: number
  actorId: string
  postedBy: string
  supervisorId: string | null
  /** Its author was a trainee when it was recorded. */
  trainee: boolean
  placeId: string | null
  note: string | null
  practice: boolean
  confirmed: string[]
  details: DetailsOf<K>
}

/** Any recorded event, told apart by its kind. */
export type AnyRecordedEvent = { [K in EventKind]: RecordedEvent<K> }[EventKind]
/** Any event as sent, told apart by its kind. */
export type AnyCustodyEvent = { [K in EventKind]: CustodyEvent<K> }[EventKind]
