import type { AnyRecordedEvent } from './event'
import { fold, type FoldContext, type FoldStep } from './fold'
import { effectOrder } from './order'

/**
 * What each line did as it was recorded, in order of effect: a correction counts only from its own line on, and the
 * difference it made is that line's.
 */
export function asRecorded(events: readonly AnyRecordedEvent[], context: FoldContext): FoldStep[] {
  const ordered = [...events].sort(effectOrder)
  const corrections = ordered.filter(({ kind }) => kind === 'corrected')
  const steps: FoldStep[] = []
  for (let made = 0; made <= corrections.length; made++) {
    const [from, until] = [corrections[made - 1], corrections[made]]
    const later = new Set(corrections.slice(made).map(({ id }) => id))
    const stepOf = new Map(fold(ordered.filter(({ id }) => !later.has(id)), context).steps.map(step => [step.eventId, step]))
    const lines = ordered.slice(from ? ordered.indexOf(from) : 0, until ? ordered.indexOf(until) : undefined)
    for (const { id } of lines) {
      const step = stepOf.get(id)
      if (step) steps.push(id === from?.id ? { ...step, before: steps.at(-1)?.after ?? step.before } : step)
    }
  }
  return steps
}
