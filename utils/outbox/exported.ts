import type { DroppedEntry, OutboxEntry } from './entry'

/** The outbox as a file: whoever reads it finds every event as it would have been sent. */
export interface ExportedOutbox {
  what: 'Collarbook: events of a device that are not recorded'
  shape: 1
  exportedAt: string
  entries: OutboxEntry[]
  dropped: DroppedEntry[]
}

/** What a person takes along of their own entries; those of others stay sealed. */
export function exportedOutbox(personId: string, entries: readonly OutboxEntry[], dropped: readonly DroppedEntry[], exportedAt: string): ExportedOutbox {
  return {
    what: 'Collarbook: events of a device that are not recorded',
    shape: 1,
    exportedAt,
    entries: entries.filter(entry => entry.personId === personId),
    dropped: dropped.filter(entry => entry.personId === personId),
  }
}
