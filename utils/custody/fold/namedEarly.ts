import type { AnyRecordedEvent } from '../event'

/** Ids that corrections and signatures name and that no event has yet: what comes under one of them may not count as it came. */
export function namedEarly(events: readonly AnyRecordedEvent[]): string[] {
  const named = new Set(events.flatMap(event => event.kind === 'corrected' || event.kind === 'countersigned' ? namedIn(event.details) : []))
  if (named.size === 0) return []
  for (const { id } of events) named.delete(id)
  return [...named].sort()
}

// A correction may be corrected into one of another event, and that again.
function namedIn(details: object): string[] {
  const { eventId, instead } = details as { eventId?: unknown, instead?: unknown }
  return [
    ...(typeof eventId === 'string' ? [eventId.toLowerCase()] : []),
    ...(typeof instead === 'object' && instead !== null ? namedIn(instead) : []),
  ]
}
