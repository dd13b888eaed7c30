import type { FillPolicy } from '../../capacity/types'
import type { Scale } from '../../quantity/scale'
import type { Catalogue } from '../../refrigerant/types'
import type { RetestRules } from '../../requalification/ownerChoice'
import type { RecordedEvent } from '../event'
import type { Finding } from '../finding'
import type { EventKind } from '../kinds'
import type { Movement } from '../movement'
import type { Signature } from '../signatures'
import type { CylinderState } from '../state'

/** What the fold takes from outside the log. */
export interface FoldContext {
  scales: ReadonlyMap<string, Scale>
  catalogue: Catalogue
  /** The firm's fill rule as it stood at an instant. */
  policyAt: (ms: number) => FillPolicy
  /** The firm's IANA time zone, in which months begin and end. */
  timeZone: string
  /** What the owner had settled about tests at an instant. */
  retestAt: (ms: number) => RetestRules
  /** The one place of a firm; null where it has none. */
  placeOfFirm: (firmId: string) => string | null
}

/** A weight that differs from the log, or agrees with it, without a cause: how far its two readings may be off together. `wholeGrams`: for all owners, of whom this one has a part. */
export interface Difference { refrigerant: string | null, ownerId: string | null, uncertaintyGrams: number, wholeGrams: number }

/** One event's turn: the state it finds and changes, and what it leaves in the books. */
export interface Turn<K extends EventKind = EventKind> {
  readonly event: RecordedEvent<K>
  readonly context: FoldContext
  /** A copy of the cylinder's state, of this turn alone. */
  readonly state: CylinderState
  /** When it counts in the books: its own time; the beginning's is never after the cylinder's first event. */
  readonly at: number
  /** Practice, or a trainee's without a countersignature. */
  readonly apart: boolean
  /** Of the supervisor, on a trainee's entry; null where it needs none. */
  readonly signature: Signature | null
  readonly movements: Movement[]
  readonly found: Difference[]
  readonly findings: Finding[]
}

/** Whether the author had seen a finding and stood by the reading. */
export function isConfirmed(turn: Turn, code: Finding['code']): boolean {
  return turn.event.confirmed.includes(code)
}
