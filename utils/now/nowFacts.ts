import type { CylinderRow } from '../custody/cylinderView'
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

/** Shipments or test lots in one state. `since` is the earliest instant (UTC milliseconds) among them. */
export interface ListFacts { count: number, id: string, number: number, since: number }

/** Lines of the custody log of the last days that an auditor looks at. */
export interface EntryFacts { count: number, cylinders: number, newest: Pick<CylinderRow, 'id' | 'labelCode' | 'serial'> | null }

/** How the last check of the custody log went; `at` in UTC milliseconds. */
export interface LogCheckFacts { last: { at: number, isOk: boolean } | null, newEvents: number }

/** All that the lines of one person are made of; what was not asked for, or is nothing, is left out. */
export interface NowFacts {
  cylinders: Partial<Record<FleetTopic, CylinderFacts>>
  /** Of the cylinders not seen lately. */
  unseen?: { days: number, longDays: number, longCount: number, holders: { name: string | null, count: number }[] }
  /** The last month within the firm's warning time. */
  lastSoonMonth: Month
  van?: { name: string, load: VanLoad }
  full?: FullFacts[]
  /** Cylinders in use that wear no label. */
  unlabelled?: { count: number, first: CylinderRow[] }
  shipmentsAway?: ListFacts
  lotsAway?: ListFacts
  shipmentDrafts?: ListFacts
  lotDrafts?: ListFacts
  /** The next rule of the firm that begins soon. */
  rule?: { fromAt: number, isFillRule: boolean, count: number }
  logCheck?: LogCheckFacts
  entries?: { doubtful: EntryFacts, late: EntryFacts, corrected: EntryFacts }
  mailFailed?: { count: number, recipient: string }
  uncertified?: string[]
  notTakenUp?: string[]
  missing?: { shop: boolean, reclaimer: boolean, testStation: boolean, vansWithoutTechnician: string[] }
}
