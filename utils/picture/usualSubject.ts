import type { EventKind } from '../custody/kinds'
import type { PhotoSubject } from '../photo/subject'

const OF_STAMP: readonly EventKind[] = ['registered', 'labelled', 'retested']
const OF_DAMAGE: readonly EventKind[] = ['inspected', 'lost', 'quarantined', 'retired']
const OF_SCALE: readonly EventKind[] = ['weighed', 'filled', 'drawn', 'emptied', 'received', 'returned', 'reclaimed', 'transferred']

/** What a photo of an event mostly shows; whoever takes it may say otherwise. */
export function usualSubject(kind: EventKind): PhotoSubject {
  if (OF_STAMP.includes(kind)) return 'stamp'
  if (OF_DAMAGE.includes(kind)) return 'damage'
  return OF_SCALE.includes(kind) ? 'scale' : 'other'
}
