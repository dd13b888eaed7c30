import type { AnyRecordedEvent } from './event'
import { fold, type FoldContext, type FoldResult } from './fold'
import { isSeen, withLastEvent } from './fold/lastEvent'
import { labelClaimsOf, walkFrom, walkOn } from './fold/walk'
import type { EventKind } from './kinds'
import { effectOrder } from './order'
import { needsSignature } from './signatures'
import type { CylinderState } from './state'

/** Kinds that change what other events say, where they stand, or that they count. */
const CHANGES_EARLIER: readonly EventKind[] = ['registered', 'corrected', 'countersigned']

/**
 * A cylinder from its kept state and the events that came since, without those that made the state.
 *
 * The state is what {@link fold} makes of all of them together; movements, changes of stock, steps and labels are those of
 * the new events only. null where it takes the whole log to know: where one of them is not later in effect than all that
 * was known, changes what others say, or was already corrected or signed before it came.
 *
 * @param events none of which made the state.
 */
export function continueFold(before: CylinderState, events: readonly AnyRecordedEvent[], context: FoldContext): FoldResult | null {
  if (before.latestAt === null) return fold(events, context)
  const latestAt = before.latestAt
  if (events.some(({ id, kind, effectiveAt }) => effectiveAt <= latestAt || CHANGES_EARLIER.includes(kind) || before.namedEarly.includes(id))) return null
  const ordered = [...events].sort(effectOrder)
  // Who saw a cylinder last is not kept while it is given away.
  if (before.away?.at === 'given-away' && !ordered.some(isSeen)) return null
  const standings = ordered.map(event => ({ event, correction: null, isOut: false }))
  const walk = walkFrom(before)
  for (const standing of standings) {
    walkOn(walk, standing, { beginsAt: null, signature: needsSignature(standing.event) ? { by: null } : null, context })
  }
  const { movements, stockChanges, steps } = walk
  const state = { ...withLastEvent(walk.state, ordered, before), latestAt: ordered.at(-1)?.effectiveAt ?? latestAt }
  return { state, movements, stockChanges, steps, labelClaims: labelClaimsOf(standings) }
}
