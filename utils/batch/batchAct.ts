import type { CustodyEvent } from '../custody/event'

/** What is done with several cylinders at once. */
export const BATCH_ACTS = ['load', 'unload', 'receive', 'move'] as const
export type BatchAct = (typeof BATCH_ACTS)[number]

/** The place that they all come to. */
export interface BatchTarget {
  id: string
  name: string
  /** Whose van it is; null where nobody holds what stands there. */
  technicianId: string | null
}

/** What of an event a batch settles; its id and its place in the device's count come with the posting. */
export type BatchEvent = Pick<CustodyEvent<'moved' | 'received'>, 'cylinderId' | 'kind' | 'occurredAt' | 'placeId' | 'supervisorId' | 'note' | 'confirmed' | 'details'>

interface Words {
  /** The heading, where the place is known. */
  title: (place: string) => string
  /** On the one button. */
  verb: (count: number, place: string) => string
  done: (count: number, place: string) => string
}

/** A batch in words. */
export const BATCH_WORDS: Record<BatchAct, Words> = {
  load: { title: place => `Load ${place}`, verb: (count, place) => `Put ${count} on ${place}`, done: (count, place) => `${count} put on ${place}` },
  unload: { title: place => `Unload ${place}`, verb: (count, place) => `Bring ${count} to ${place}`, done: (count, place) => `${count} brought to ${place}` },
  receive: { title: place => `Receive at ${place}`, verb: (count, place) => `Receive ${count} at ${place}`, done: (count, place) => `${count} received at ${place}` },
  move: { title: place => `Move to ${place}`, verb: (count, place) => `Move ${count} to ${place}`, done: (count, place) => `${count} moved to ${place}` },
}

/** The act that a word of an address names; a load where it names none. */
export function batchActOf(word: unknown): BatchAct {
  return BATCH_ACTS.find(act => act === word) ?? 'load'
}

/** Whether an act only plans to take a cylinder along, so that it may be refused; the others say what has happened. */
export function isPlan(act: BatchAct): boolean {
  return act === 'load' || act === 'move'
}

/** What the log is told of one cylinder of a batch: that it came in, or that it moved and who holds it then. */
export function batchEvent(act: BatchAct, target: BatchTarget, line: {
  cylinderId: string
  /** ISO 8601 with offset: when it was scanned. */
  scannedAt: string
  /** Why it goes along although it should not. */
  keepReason: string | null
  /** Codes of what was seen and kept all the same. */
  confirmed: string[]
}, supervisorId: string | null): BatchEvent {
  const envelope = {
    cylinderId: line.cylinderId,
    occurredAt: line.scannedAt,
    ...(supervisorId && { supervisorId }),
    ...(line.keepReason && { note: line.keepReason }),
    ...(line.confirmed.length && { confirmed: line.confirmed }),
  }
  if (act === 'receive') return { ...envelope, kind: 'received', placeId: target.id, details: {} }
  return { ...envelope, kind: 'moved', details: { toPlaceId: target.id, ...(target.technicianId && { toHolderId: target.technicianId }) } }
}
