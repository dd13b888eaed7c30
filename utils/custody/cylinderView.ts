import type { Month } from '../quantity/month'
import type { LiquidFull } from '../capacity/liquidFull'
import type { Condition, FillRule, FillTermInWords, Stamp } from '../capacity/types'
import type { OwnerChoice } from '../requalification/ownerChoice'
import type { EventKind } from './kinds'
import type { Finding, FindingCode, Severity } from './finding'
import type { ChangedLine } from './laterLines'
import type { Signature } from './signatures'

export type { Condition }

/** Where a cylinder is in its life. */
export type Lifecycle
  = 'in-service' | 'quarantined' | 'rejected' | 'at-reclaim' | 'at-test' | 'missing' | 'condemned' | 'retired'

/** Why nothing may go into a cylinder until that is settled. */
export type Hold = 'quarantined' | 'rejected' | 'damaged' | 'tare-loss' | 'wet'

/** Whose the steel is. */
export type Ownership = 'own' | 'rental' | 'deposit' | 'customer'

/** What must be known before a stop weight can be given. */
export type Missing = 'tareWeight' | 'waterCapacity' | 'servicePressure' | 'refrigerant' | 'weight' | 'testDate'

/** A place, person or firm by its id and the name people know it by. */
export interface Named { id: string, name: string, kind?: string }

/** One requalification mark, as stamped. */
export interface RetestMark {
  month: Month
  method?: 'volumetric' | 'proof' | 'visual'
  rin?: string
  suffix?: string
}

/** What a cylinder may hold, as it is shown. */
export interface CapacityView {
  forRefrigerant: string | null
  governingRule: FillRule | null
  fillLimitGrams: number | null
  stopWeightGrams: number | null
  /** The unrounded sum of tare and limit, from which a screen rounds down to the scale's division; null with stopWeightGrams. */
  exactStopWeightGrams: number | null
  roomGrams: number | null
  liquidFull: LiquidFull | null
  /** How much of the volume is liquid at 131 F, 0 to 1, at the present net or, where nothing is in it, at the limit; null where not known. */
  hotLiquidShare: number | null
  /** The firm's share, 0.8 by default. */
  share: number
  terms: FillTermInWords[]
  missing: Missing[]
  /** Why nothing may be put in now; empty when it may. */
  refusals: Finding[]
}

/** The retest of a cylinder, as it is shown. */
export interface RequalificationView {
  lastMonth: Month | null
  intervalMonths: number | null
  dueMonth: Month | null
  state: 'in-date' | 'due-soon' | 'overdue' | 'unknown' | 'not-required'
  /** In words: from which mark and by which rule. */
  basis: string
  /** The owner's choice that the period is by; null where it is the regulation's shortest. */
  choice: OwnerChoice | null
}

/** Everything the application says of one cylinder today, to one person. */
export interface CylinderView {
  id: string
  version: number
  labelCode: string | null
  /** When the present label was stuck on last, ISO 8601. */
  labelledAt: string | null
  /** Codes that were replaced and still open the cylinder. */
  oldLabelCodes: string[]
  stamp: (Stamp & { tareWeightGrams: number | null, waterCapacityGrams: number | null, dedicatedTo: string | null }) | null
  marks: RetestMark[]
  lifecycle: Lifecycle
  holds: Hold[]
  place: Named | null
  holder: Named | null
  /** null = the contractor's own. */
  owner: Named | null
  ownership: Ownership
  contents: {
    refrigerant: string | null
    condition: Condition
    burnt: boolean
    inStock: boolean
    netGrams: number | null
    /** Of the net, from its one gross; null for a reckoned or unknown net. */
    uncertaintyGrams: number | null
    basis: 'weighed' | 'reckoned' | 'unknown'
    evacuated: boolean
    /** Nothing is in it: evacuated, reclaimed, or wet from a test. Not the same as a net of 0. */
    nothingInIt: boolean
    /** null grams where the net is not known: then only whose it is. */
    owners: { ownerId: string | null, grams: number | null }[]
    /** effectiveAt of the event that set the net, ISO 8601. */
    asOf: string | null
  }
  capacity: CapacityView
  requalification: RequalificationView
  findings: Finding[]
  /** Persons whose signature something here waits for, by id. */
  waitsForSignatureOf: string[]
  /** On a device without the server: so many events that wait there are not in this, for it takes the whole log to know. */
  waitingNotIn?: number
  may: EventKind[]
  mayNot: { kind: EventKind, because: string }[]
  lastEventAt: string | null
}

/** An open shipment or test lot on which a cylinder stands. */
export interface OpenList { kind: 'shipment' | 'test-lot', id: string, number: number }

/** One line of the fleet, from cached columns and today's date. */
export interface CylinderRow {
  id: string
  labelCode: string | null
  serial: string | null
  spec: string | null
  place: Named | null
  holder: Named | null
  /** null: no other than the contractor is named. */
  owner: Named | null
  refrigerant: string | null
  condition: Condition
  lifecycle: Lifecycle
  nothingInIt: boolean
  netGrams: number | null
  fillLimitGrams: number | null
  governingRule: FillRule | null
  roomGrams: number | null
  stopWeightGrams: number | null
  exactStopWeightGrams: number | null
  tareWeightGrams: number | null
  waterCapacityGrams: number | null
  dueMonth: Month | null
  lastEventAt: string | null
  lastEventKind: EventKind | null
  /** null while it was seen lately, or need not be seen here; `isLong`: for so long that it may be missing. */
  unseen: { days: number, isLong: boolean } | null
  worstFinding: { code: FindingCode, severity: Severity } | null
  findingCodes: FindingCode[]
  /** Left out where it stands on none, and where nobody asked. */
  openList?: OpenList
}

/** One line of a cylinder's custody log. */
export interface LogLine {
  id: string
  seq: number
  version: number
  kind: EventKind
  occurredAt: string
  effectiveAt: string
  recordedAt: string
  clockSkewSeconds: number
  author: Named
  postedBy: Named
  supervisor: Named | null
  place: Named | null
  note: string | null
  practice: boolean
  confirmed: string[]
  details: unknown
  /** The details that a correction gave in their place; left out where they stand as recorded. */
  instead?: unknown
  /** Names of the ids inside details, by id. */
  names: Record<string, string>
  /** The other cylinder of what happened between two; null where there is none, or where the log knows none by that id. */
  otherCylinder: { id: string, labelCode: string | null, serial: string | null } | null
  netBeforeGrams: number | null
  netAfterGrams: number | null
  findings: Finding[]
  /** What this line changed in lines that had been recorded before it, where it came late or mends one; left out where nothing. */
  changes?: ChangedLine[]
  /** What a correction did to this event; null when it stands as recorded. */
  correction: { eventId: string, reason: string, takenOut: boolean } | null
  /** The supervisor's signature on a trainee's entry: by which event, null while it waits; null where it needs none. */
  signature: Signature | null
}
