import type { AnyRecordedEvent, RecordedEvent } from './event'
import { effectOrder } from './order'
import { DETAILS, type DetailsOf } from './schema'

/** What a correction did to an event. */
export interface Correction { eventId: string, reason: string, takenOut: boolean }

/** An event as it counts: with other details in place of its own, or taken out. */
export interface Standing { event: AnyRecordedEvent, correction: Correction | null, isOut: boolean }

type CorrectionEvent = RecordedEvent<'corrected'>

/**
 * The events as they now stand, in order of effect.
 *
 * Of several corrections of one event the latest in effect counts; a correction may itself be corrected. One that would
 * take out a registration, or whose details do not fit the kind it mends, does nothing.
 */
export function applyCorrections(events: readonly AnyRecordedEvent[]): Standing[] {
  const ordered = [...events].sort(effectOrder)
  const corrections = ordered.filter((event): event is CorrectionEvent => event.kind === 'corrected')
  if (corrections.length === 0) return ordered.map(event => ({ event, correction: null, isOut: false }))

  // Whom a correction names may itself be corrected, so all that it may come to name are looked at.
  const onCorrections = byTarget(corrections, ({ id, details }) => [
    details.eventId,
    ...corrections.flatMap(({ details: { eventId, instead } }) => eventId === id && typeof instead?.['eventId'] === 'string' ? [instead['eventId']] : []),
  ])
  const decided = new Map<string, CorrectionEvent | null>()
  const deciding = new Set<string>()

  /** A correction as it counts, or null where another took it out; one that is corrected by itself in a circle counts as it is. */
  function inEffect(correction: CorrectionEvent): CorrectionEvent | null {
    const known = decided.get(correction.id)
    if (known !== undefined) return known
    if (deciding.has(correction.id)) return correction
    deciding.add(correction.id)
    const latest = latestFitting(correction, onCorrections.get(correction.id) ?? [], inEffect)
    deciding.delete(correction.id)
    const answer = latest === null ? correction : latest.standing
    decided.set(correction.id, answer as CorrectionEvent | null)
    return answer as CorrectionEvent | null
  }

  const effective = corrections.flatMap(correction => inEffect(correction) ?? [])
  const onEvents = byTarget(effective, correction => [correction.details.eventId])
  return ordered.map((event) => {
    const mends = event.kind === 'corrected' ? onCorrections.get(event.id) : onEvents.get(event.id)
    const latest = latestFitting(event, mends ?? [], event.kind === 'corrected' ? inEffect : correction => correction)
    if (latest === null) return { event, correction: null, isOut: false }
    const { id, details } = latest.by
    return {
      event: latest.standing ?? event,
      correction: { eventId: id, reason: details.reason, takenOut: latest.standing === null },
      isOut: latest.standing === null,
    }
  })
}

/** The latest correction of an event that fits it, with the event as it then stands; null where none fits. */
function latestFitting(
  event: AnyRecordedEvent, corrections: readonly CorrectionEvent[], inEffect: (correction: CorrectionEvent) => CorrectionEvent | null,
): { by: CorrectionEvent, standing: AnyRecordedEvent | null } | null {
  for (const raw of [...corrections].reverse()) {
    const by = inEffect(raw)
    if (by === null || by.id === event.id || by.details.eventId !== event.id) continue
    const { instead } = by.details
    if (instead === undefined) {
      if (event.kind === 'registered') continue
      return { by, standing: null }
    }
    const parsed = DETAILS[event.kind].safeParse(instead)
    // The details were parsed by the schema of this very kind, which the compiler cannot follow.
    if (parsed.success) return { by, standing: { ...event, details: parsed.data as DetailsOf<typeof event.kind> } as AnyRecordedEvent }
  }
  return null
}

function byTarget(corrections: readonly CorrectionEvent[], targets: (correction: CorrectionEvent) => string[]): Map<string, CorrectionEvent[]> {
  const map = new Map<string, CorrectionEvent[]>()
  for (const correction of corrections) {
    for (const id of new Set(targets(correction))) map.set(id, [...map.get(id) ?? [], correction])
  }
  return map
}
