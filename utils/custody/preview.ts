import type { AnyCustodyEvent, AnyRecordedEvent } from './event'
import type { CylinderView } from './cylinderView'
import type { Finding } from './finding'
import type { Half } from './half'
import { urgencyOrder } from './findings/order'
import { fold } from './fold'
import { laterLines, type ChangedLine } from './laterLines'
import { view, type ViewContext } from './view'

/** What would be said if an event were recorded now. */
export interface Preview {
  view: CylinderView
  /** What the event itself would be told, and what would stand after it that does not stand now. */
  findings: Finding[]
  /** Lines in the log that would say something else, where it comes late or mends one. */
  changes: ChangedLine[]
}

/**
 * Judges a draft as it would be judged once recorded, by the same rules, here or on the server.
 *
 * The author's clock is taken as right, for it is only measured when the event is sent.
 *
 * @param counter the other cylinder's events and its half, where the draft is one half of what happens between two.
 */
export function preview(
  events: readonly AnyRecordedEvent[], draft: AnyCustodyEvent, outside: ViewContext, counter?: { events: readonly AnyRecordedEvent[], draft: AnyCustodyEvent },
): Preview {
  const context = counter ? { ...outside, otherHalves: halvesWith(counter, outside) } : outside
  const now = view(fold(events, context).state, context)
  const withDraft = [...events, recordedNow(events, draft, context)]
  const { state, steps } = fold(withDraft, context)
  const then = view(state, context)
  const raised = then.findings.filter(finding => !now.findings.some(({ code, severity }) => code === finding.code && severity === finding.severity))
  const told = steps.find(({ eventId }) => eventId === draft.id)?.findings ?? []
  return {
    view: then,
    findings: [...told, ...raised.filter(({ code }) => !told.some(other => other.code === code))].sort(urgencyOrder),
    changes: laterLines(withDraft, context, new Set([draft.id])).get(draft.id) ?? [],
  }
}

/** What other cylinders say, with the half that is recorded of one of them at the same time. */
function halvesWith({ events, draft }: { events: readonly AnyRecordedEvent[], draft: AnyCustodyEvent }, context: ViewContext): Half[] {
  const { halves } = fold([...events, recordedNow(events, draft, context)], context).state
  return [...context.otherHalves.filter(({ cylinderId }) => cylinderId !== draft.cylinderId), ...halves]
}

function recordedNow(events: readonly AnyRecordedEvent[], draft: AnyCustodyEvent, { access, nowMs }: ViewContext): AnyRecordedEvent {
  const occurredAt = Date.parse(draft.occurredAt)
  const authorId = access?.personId ?? ''
  return {
    seq: Math.max(0, ...events.map(({ seq }) => seq)) + 1,
    id: draft.id,
    cylinderId: draft.cylinderId,
    version: Math.max(0, ...events.map(({ version }) => version)) + 1,
    kind: draft.kind,
    occurredAt,
    occurredOffsetMinutes: 0,
    clockSkewSeconds: 0,
    effectiveAt: Math.min(occurredAt, nowMs),
    recordedAt: nowMs,
    deviceId: draft.deviceId,
    deviceSeq: draft.deviceSeq,
    actorId: authorId,
    postedBy: authorId,
    supervisorId: draft.supervisorId ?? null,
    trainee: access?.trainee ?? false,
    placeId: draft.placeId ?? null,
    note: draft.note ?? null,
    practice: draft.practice ?? false,
    confirmed: draft.confirmed ?? [],
    details: draft.details,
  } as AnyRecordedEvent
}
