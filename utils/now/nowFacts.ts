import type { CylinderRow } from '../custody/cylinderView'
import type { Day } from '../quantity/day'
import type { Month } from '../quantity/month'
import type { VanLoad } from '../transport/vanLoad'
import type { FleetQuestion, FleetTopic } from './fleetQuestions'

/** Cylinders that a filter of the fleet finds. */
export interface CylinderFacts {
  question: FleetQuestion
  count: number
  /** Net of those whose weight is known. Units: grams. */
  netGrams: number
  withContents: number
  /** The first few of them, at least one; a new label is given to these. */
  first: CylinderRow[]
}

/** Full cylinders of one refrigerant that stand in a shop, on no list yet. */
export interface FullFacts { refrigerant: string, netGrams: number, ids: string[], places: string[] }

/** What stands in a shop and is worth a pick-up by a reclaimer; `comesToCents` is null where a price or a cost is not recorded. */
export interface WorthFacts { firm: string, place: string, refrigerant: string | null, cylinders: number, netGrams: number, comesToCents: number | null }

/** Shipments or test lots in one state. `since` is the earliest instant (UTC milliseconds) among them. */
export interface ListFacts { count: number, id: string, number: number, since: number }

/** Plans of what to bring together that are not done: the oldest of them, and the steps that all have left. */
export interface PlanFacts { id: string, number: number, plans: number, steps: number }

/** Lines of the custody log of the last days that an auditor looks at. */
export interface EntryFacts { count: number, cylinders: number, newest: Pick<CylinderRow, 'id' | 'labelCode' | 'serial'> | null }

/** What a person's own van carries. */
export interface VanFacts { id: string, name: string, load: VanLoad }

/** A scale that wants a check: its last one is over a year old, or known to nobody. */
export interface ScaleFacts { name: string, lastCheckOn: Day | null }

/** Cylinders that the last check-in of a van did not find, and that nobody has seen since; `checkedAt` in UTC milliseconds. */
export interface ShortVanFacts { id: string, name: string, names: string[], checkedAt: number }

/** Fewer empty cylinders than this that may be filled are told of, in each shop: common practice, no source. */
export const FEW_EMPTY = 3

/** A shop with few empty cylinders that may be filled, its racks among it. */
export interface FewEmptyFacts { id: string, name: string, count: number }

/** What trainees recorded that waits for the signature of one supervisor. */
export interface UnsignedFacts { supervisor: string | null, count: number, cylinders: Pick<CylinderRow, 'id' | 'labelCode' | 'serial'>[] }

/** What came late or mended another line this week, and how many lines recorded before say something else since. */
export interface LateFacts { count: number, lines: number, cylinders: Pick<CylinderRow, 'id' | 'labelCode' | 'serial'>[] }

/** A shipment of which the log now says something else than its papers; `lines` that differ. */
export interface PaperFacts { id: string, number: number, lines: number }

/** How the last check of the custody log went; `at` in UTC milliseconds. */
export interface LogCheckFacts { last: { at: number, isOk: boolean } | null, newEvents: number }

/** All that the lines of one person are made of; what was not asked for, or is nothing, is left out. */
export interface NowFacts {
  cylinders: Partial<Record<FleetTopic, CylinderFacts>>
  /** Of the cylinders not seen lately. */
  unseen?: { days: number, longDays: number, longCount: number, holders: { name: string | null, count: number }[] }
  /** The last month within the firm's warning time. */
  lastSoonMonth: Month
  vans?: VanFacts[]
  full?: FullFacts[]
  /** The best of them. */
  worthPickUp?: WorthFacts
  /** Cylinders in use that wear no label. */
  unlabelled?: { count: number, first: CylinderRow[] }
  shipmentsReady?: ListFacts
  shipmentsAway?: ListFacts
  lotsAway?: ListFacts
  plansOpen?: PlanFacts
  shipmentDrafts?: ListFacts
  lotDrafts?: ListFacts
  /** The next rule of the firm that begins soon. */
  rule?: { fromAt: number, isFillRule: boolean, count: number }
  shortVans?: ShortVanFacts[]
  scaleChecks?: ScaleFacts[]
  fewEmpty?: FewEmptyFacts[]
  /** What waits for the signature of the person who reads. */
  toCountersign?: UnsignedFacts
  /** What waits for anybody's, the most first. */
  unsigned?: UnsignedFacts[]
  cameLate?: LateFacts
  papersDiffer?: PaperFacts[]
  logCheck?: LogCheckFacts
  entries?: { doubtful: EntryFacts, late: EntryFacts, corrected: EntryFacts }
  mailFailed?: { count: number, recipient: string }
  uncertified?: string[]
  notTakenUp?: string[]
  missing?: { shop: boolean, reclaimer: boolean, testStation: boolean, vansWithoutTechnician: string[] }
}
