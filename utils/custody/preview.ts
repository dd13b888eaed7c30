import type { AnyCustodyEvent, AnyRecordedEvent } from './event'
import type { CylinderView } from './cylinderView'
import type { Finding } from './finding'
import type { Half } from './half'
import { urgencyOrder } from './findings/order'
import { continueFold } from './continueFold'
import { fold, type FoldResult } from './fold'
import { laterLines, type ChangedLine } from './laterLines'
import { recordedNow } from './recordedNow'
import type { CylinderState } from './state'
import { view, type ViewContext } from './view'

/** What would be said if an event were recorded now. */
export interface Preview {
  view: CylinderView
  /** What the event itself would be told, and what would stand after it that does not stand now. */
  findings: Finding[]
  /** Lines in the log that would say something else, where it comes late or mends one. */
  changes: ChangedLine[]
}

/** What is known of a cylinder: its events, or where these are not at hand the state that they made. */
export type KnownCylinder = readonly AnyRecordedEvent[] | CylinderState

/**
 * Judges a draft as it would be judged once recorded, by the same rules, here or on the server.
 *
 * The author's clock is taken as right, for it is only measured when the event is sent. From a state alone nothing is found
 * where it takes the whole log to know; it is judged once it is recorded.
 *
 * @param counter the other cylinder and its half, where the draft is one half of what happens between two.
 */
export function preview(known: KnownCylinder, draft: AnyCustodyEvent, outside: ViewContext, counter?: { known: KnownCylinder, draft: AnyCustodyEvent }): Preview {
  const context = counter ? { ...outside, otherHalves: halvesWith(counter, outside) } : outside
  const now = view(isEvents(known) ? fold(known, context).state : known, context)
  const folded = withDraft(known, draft, context)
  if (folded === null) return { view: now, findings: [], changes: [] }
  const then = view(folded.state, context)
  const raised = then.findings.filter(finding => !now.findings.some(({ code, severity }) => code === finding.code && severity === finding.severity))
  const told = folded.steps.find(({ eventId }) => eventId === draft.id)?.findings ?? []
  return {
    view: then,
    findings: [...told, ...raised.filter(({ code }) => !told.some(other => other.code === code))].sort(urgencyOrder),
    // A state is only gone on from by what comes last: nothing recorded before it changes.
    changes: isEvents(known) ? laterLines([...known, recordedAfter(known, draft, context)], context, new Set([draft.id])).get(draft.id) ?? [] : [],
  }
}

/** What other cylinders say, with the half that is recorded of one of them at the same time. */
function halvesWith({ known, draft }: { known: KnownCylinder, draft: AnyCustodyEvent }, context: ViewContext): readonly Half[] {
  const folded = withDraft(known, draft, context)
  if (folded === null) return context.otherHalves
  return [...context.otherHalves.filter(({ cylinderId }) => cylinderId !== draft.cylinderId), ...folded.state.halves]
}

function withDraft(known: KnownCylinder, draft: AnyCustodyEvent, context: ViewContext): FoldResult | null {
  const last = recordedAfter(known, draft, context)
  return isEvents(known) ? fold([...known, last], context) : continueFold(known, [last], context)
}

function recordedAfter(known: KnownCylinder, draft: AnyCustodyEvent, context: ViewContext): AnyRecordedEvent {
  const last = isEvents(known)
    ? { seq: Math.max(0, ...known.map(({ seq }) => seq)), version: Math.max(0, ...known.map(({ version }) => version)) }
    : { seq: 0, version: known.version }
  return recordedNow(draft, last, context)
}

function isEvents(known: KnownCylinder): known is readonly AnyRecordedEvent[] {
  return Array.isArray(known)
}
