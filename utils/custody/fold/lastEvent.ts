import type { AnyRecordedEvent } from '../event'
import type { EventKind } from '../kinds'
import type { CylinderState } from '../state'

/** Kinds that say nothing of where the cylinder is. */
const UNSEEN: readonly EventKind[] = ['labelled', 'corrected', 'reclaimed', 'missing', 'countersigned']

/** When a cylinder had its first and its last event, and when it was last seen. Events are the ones that count, in order of effect, after those of `before`. */
export function withLastEvent(state: CylinderState, counting: readonly AnyRecordedEvent[], before: Pick<CylinderState, 'firstEventAt' | 'lastEventAt' | 'lastEventKind' | 'lastSeenAt'>): CylinderState {
  const last = counting.at(-1)
  return {
    ...state,
    firstEventAt: before.firstEventAt ?? counting[0]?.effectiveAt ?? null,
    lastEventAt: last?.effectiveAt ?? before.lastEventAt,
    lastEventKind: last?.kind ?? before.lastEventKind,
    // What was given away is no longer ours to look for.
    lastSeenAt: state.away?.at === 'given-away' ? null : counting.findLast(isSeen)?.effectiveAt ?? before.lastSeenAt,
  }
}

/** Whether who recorded an event was at the cylinder. */
export function isSeen({ kind }: AnyRecordedEvent): boolean {
  return !UNSEEN.includes(kind)
}
