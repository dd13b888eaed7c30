import type { JobCorrection } from '../contract/jobs'
import type { AnyRecordedEvent, RecordedEvent } from '../custody/event'

/**
 * The corrections of a job's fills and draws, of those that came to it and of those that left it, in order of recording. A
 * correction of a correction is one too.
 */
export function jobCorrections(jobId: string, logs: Iterable<readonly AnyRecordedEvent[]>): JobCorrection[] {
  const found: RecordedEvent<'corrected'>[] = []
  for (const events of logs) {
    const corrections = events.filter((event): event is RecordedEvent<'corrected'> => event.kind === 'corrected')
    const byId = new Map(corrections.map(correction => [correction.id, correction]))
    const named = new Set([
      ...events.filter(({ details }) => (details as { jobId?: string }).jobId === jobId).map(({ id }) => id),
      ...corrections.filter(({ details }) => String(details.instead?.['jobId']).toLowerCase() === jobId).map(({ details }) => rootOf(details.eventId, byId)),
    ])
    found.push(...corrections.filter(({ details }) => named.has(rootOf(details.eventId, byId))))
  }
  return found.sort((a, b) => a.seq - b.seq).map(({ id, recordedAt, details }) => ({ eventId: id, at: new Date(recordedAt).toISOString(), reason: details.reason }))
}

/** The event at the end of a row of corrections of corrections. */
function rootOf(eventId: string, corrections: ReadonlyMap<string, RecordedEvent<'corrected'>>): string {
  const passed = new Set<string>()
  let id = eventId
  for (let next = corrections.get(id); next && !passed.has(id); next = corrections.get(id)) {
    passed.add(id)
    id = next.details.eventId
  }
  return id
}
