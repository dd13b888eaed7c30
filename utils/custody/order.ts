import type { AnyRecordedEvent } from './event'

type Placed = Pick<AnyRecordedEvent, 'id' | 'deviceId' | 'deviceSeq' | 'occurredAt' | 'clockSkewSeconds' | 'effectiveAt'>

/**
 * Which of two events took effect first; below zero where the first did.
 *
 * An event that claims a time still to come is held back to the instant of its recording; such events stand after those
 * that truly happened then, and among themselves by the times they claim. Where the times are equal the device's own
 * count decides, and in the end the id, so that any order of arrival gives one order of effect.
 */
export function effectOrder(a: Placed, b: Placed): number {
  return a.effectiveAt - b.effectiveAt
    || unclampedTime(a) - unclampedTime(b)
    || compareText(a.deviceId, b.deviceId)
    || a.deviceSeq - b.deviceSeq
    || compareText(a.id.toLowerCase(), b.id.toLowerCase())
}

/** The time an event claims, put right by the skew of its author's clock. Units: UTC milliseconds. */
export function unclampedTime(event: Pick<Placed, 'occurredAt' | 'clockSkewSeconds'>): number {
  return event.occurredAt - event.clockSkewSeconds * 1000
}

/** Whether an event claims a time after it was recorded, and is therefore held back. */
export function isClamped(event: Placed): boolean {
  return unclampedTime(event) > event.effectiveAt
}

// By code units: the same on every machine, whatever its language.
function compareText(a: string, b: string): number {
  if (a === b) return 0
  return a < b ? -1 : 1
}
