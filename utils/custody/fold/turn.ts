import type { FillPolicy } from '../../capacity/types'
import type { Scale } from '../../quantity/scale'
import type { Catalogue } from '../../refrigerant/types'
import type { RetestRules } from '../../requalification/ownerChoice'
import type { RecordedEvent } from '../event'
import type { Finding } from '../finding'
import type { EventKind } from '../kinds'
import type { Movement } from '../movement'
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
}

/** One event's turn: the state it finds and changes, and what it leaves in the books. */
export interface Turn<K extends EventKind = EventKind> {
  readonly event: RecordedEvent<K>
  readonly context: FoldContext
  /** A copy of the cylinder's state, of this turn alone. */
  readonly state: CylinderState
  readonly movements: Movement[]
  readonly findings: Finding[]
}

/** Whether the author had seen a finding and stood by the reading. */
export function isConfirmed(turn: Turn, code: Finding['code']): boolean {
  return turn.event.confirmed.includes(code)
}
