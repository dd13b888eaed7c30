import type { EventResult } from '../../../utils/contract/custody'

/** The cylinders that a request's recorded events are about, each once. */
export function cylindersOf(events: readonly unknown[], results: readonly EventResult[]): string[] {
  const ids = events.flatMap((event, index) => {
    const id = (event as { cylinderId?: unknown } | null)?.cylinderId
    return results[index]?.outcome !== 'refused' && typeof id === 'string' ? [id.toLowerCase()] : []
  })
  return [...new Set(ids)]
}
