import type { Lifecycle } from '../cylinderView'
import type { Correction } from '../corrections'
import type { Finding } from '../finding'
import type { Movement } from '../movement'
import type { Signature } from '../signatures'
import type { CylinderState } from '../state'
import type { StockChange } from '../stockChange'

/** How the cylinder stood before or after one event. */
export interface Snapshot {
  netGrams: number | null
  inStock: boolean
  refrigerant: string | null
  condition: CylinderState['contents']['condition']
  placeId: string | null
  holderId: string | null
  lifecycle: Lifecycle
}

/** What one event did. */
export interface FoldStep {
  eventId: string
  before: Snapshot
  after: Snapshot
  findings: Finding[]
  movements: Movement[]
  correction: Correction | null
  /** null where it needs none. */
  signature: Signature | null
}

/** A label code that an event of this cylinder claims. */
export interface LabelClaim { eventId: string, code: string, effectiveAt: number, deviceId: string, deviceSeq: number }

/** A cylinder as its events have made it, and what each of them did. */
export interface FoldResult {
  state: CylinderState
  movements: Movement[]
  stockChanges: StockChange[]
  /** In order of effect. */
  steps: FoldStep[]
  labelClaims: LabelClaim[]
}
