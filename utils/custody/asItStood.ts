import type { AnyRecordedEvent } from './event'
import { fold, type FoldContext, type FoldResult } from './fold'

/**
 * An instant of the past from which a cylinder is looked at (UTC milliseconds).
 *
 * `asOf`: by what had happened then, with all that is known of it. `knownAt`: by what had been recorded then. At least
 * one of them is there.
 */
export interface Past { asOf: number | null, knownAt: number | null }

/** The instant whose day and rules count. */
export function instantOf({ asOf, knownAt }: Past): number {
  return asOf ?? knownAt ?? 0
}

/** A cylinder as it stood, or as it was known; null where nothing had happened to it by then. */
export function foldAsItStood(events: readonly AnyRecordedEvent[], context: FoldContext, { asOf, knownAt }: Past): FoldResult | null {
  const folded = fold(knownBy(events, knownAt), context, asOf ?? Infinity)
  return folded.steps.length === 0 ? null : folded
}

/** The events that had been recorded by an instant; all of them where none is asked for. */
export function knownBy(events: readonly AnyRecordedEvent[], knownAt: number | null): readonly AnyRecordedEvent[] {
  return knownAt === null ? events : events.filter(({ recordedAt }) => recordedAt <= knownAt)
}
