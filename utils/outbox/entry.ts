import type { ProblemDetails } from '../contract/problem'
import type { CustodyEvent } from '../custody/event'
import { PAIRED_KINDS, type EventKind } from '../custody/kinds'

/**
 * An event on this device that is not known to stand in the custody log.
 *
 * Units: UTC milliseconds by the device's own clock.
 */
export interface OutboxEntry {
  /** The event's id. */
  id: string
  /** Its author: it stays sealed for whoever else signs in on this device. */
  personId: string
  event: CustodyEvent
  queuedAt: number
  state: 'queued' | 'sending' | 'refused'
  tries: number
  /** null while it cannot have arrived: only then may it be taken out again. */
  firstSentAt: number | null
  /** What was last said against it; null while nothing was. */
  problem: ProblemDetails | null
  /** How an entry is built. Pages of two versions may share one store. */
  shape: 1
}

/** An event that has left the outbox because the server said that it stands in the log. */
export interface RecordedEntry { id: string, personId: string, event: CustodyEvent, version: number, recordedAt: number }

/** An entry that its author gave up, with the reason. */
export interface DroppedEntry extends OutboxEntry { droppedAt: number, reason: string }

/** An entry as it begins. */
export function newEntry(event: CustodyEvent, personId: string, queuedAt: number): OutboxEntry {
  return { id: event.id, personId, event, queuedAt, state: 'queued', tries: 0, firstSentAt: null, problem: null, shape: 1 }
}

/** Entries in the order in which they were recorded on this device, which is that of sending. */
export function inOrder<Entry extends Pick<OutboxEntry, 'event'>>(entries: readonly Entry[]): Entry[] {
  return [...entries].sort((a, b) => a.event.deviceSeq - b.event.deviceSeq)
}

/**
 * What goes out of the outbox with an entry that is taken back, itself included: the other half of its pair, and what was
 * saved with it of its cylinder, such as the label with the registration.
 */
export function savedTogether(entries: readonly OutboxEntry[], { queuedAt, event: { kind, cylinderId } }: OutboxEntry): OutboxEntry[] {
  const isHalf = (PAIRED_KINDS as readonly EventKind[]).includes(kind)
  return entries.filter(other => other.queuedAt === queuedAt && (isHalf || other.event.cylinderId === cylinderId))
}

/** Whether an entry still goes by itself. A refused one waits for its author. */
export function isWaiting({ state }: Pick<OutboxEntry, 'state'>): boolean {
  return state !== 'refused'
}
