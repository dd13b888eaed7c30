import type { CylinderState } from './state'
import type { AnyRecordedEvent } from './event'
import type { FindingCode } from './finding'
import { fold, type FoldContext, type FoldStep } from './fold'
import type { EventKind } from './kinds'
import { effectOrder } from './order'

/** What a line of the log says of the cylinder as it stood after it. Units: grams. */
export interface SaidAfter {
  netGrams: number | null
  refrigerant: string | null
  condition: CylinderState['contents']['condition']
  /** What the line itself was told. */
  findings: FindingCode[]
}

/** A line that says something else since another was recorded. */
export interface ChangedLine { eventId: string, version: number, kind: EventKind, before: SaidAfter, now: SaidAfter }

/** Kinds that change what other lines say on purpose. */
const MENDING: readonly EventKind[] = ['corrected', 'countersigned']

/**
 * Whether an event took its place before others that had been recorded already; the registration that a cylinder begins
 * with before all of them, whatever time it claims.
 */
export function cameLate(event: AnyRecordedEvent, events: readonly AnyRecordedEvent[]): boolean {
  if (MENDING.includes(event.kind)) return false
  const earlier = events.filter(other => other.version < event.version && !MENDING.includes(other.kind))
  const isBeginning = event.kind === 'registered' && !earlier.some(other => other.kind === 'registered' && effectOrder(other, event) < 0)
  return isBeginning ? earlier.length > 0 : earlier.some(other => effectOrder(event, other) < 0)
}

/**
 * What each late event, correction and signature changed in the lines that had been recorded before it, by its id; only
 * those that changed any.
 */
export function laterLines(events: readonly AnyRecordedEvent[], context: FoldContext, asked: ReadonlySet<string> | null = null): Map<string, ChangedLine[]> {
  const byVersion = [...events].sort((a, b) => a.version - b.version)
  const answer = new Map<string, ChangedLine[]>()
  for (const [index, event] of byVersion.entries()) {
    if (asked && !asked.has(event.id)) continue
    if (!MENDING.includes(event.kind) && !cameLate(event, byVersion.slice(0, index))) continue
    const earlier = byVersion.slice(0, index)
    const changed = changedLines(earlier, fold(earlier, context).steps, fold(byVersion.slice(0, index + 1), context).steps)
    if (changed.length > 0) answer.set(event.id, changed)
  }
  return answer
}

function changedLines(earlier: readonly AnyRecordedEvent[], before: readonly FoldStep[], after: readonly FoldStep[]): ChangedLine[] {
  const byId = new Map(earlier.map(event => [event.id, event]))
  const stepOf = new Map(before.map(step => [step.eventId, step]))
  return after.flatMap((step) => {
    const [event, was] = [byId.get(step.eventId), stepOf.get(step.eventId)]
    if (!event || !was || MENDING.includes(event.kind)) return []
    const [then, now] = [saidAfter(was), saidAfter(step)]
    return JSON.stringify(then) === JSON.stringify(now) ? [] : [{ eventId: event.id, version: event.version, kind: event.kind, before: then, now }]
  })
}

function saidAfter({ after: { netGrams, refrigerant, condition }, findings }: FoldStep): SaidAfter {
  return { netGrams, refrigerant, condition, findings: [...new Set(findings.map(({ code }) => code))].sort() }
}
