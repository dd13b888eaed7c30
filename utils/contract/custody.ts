import { z } from 'zod'
import type { CylinderRow, CylinderView, LogLine, OpenList } from '../custody/cylinderView'
import type { AnyRecordedEvent } from '../custody/event'
import type { Half } from '../custody/half'
import type { CylinderState } from '../custody/state'
import type { ProblemDetails } from './problem'
import { FLEET_CHOICES, FLEET_TEXTS } from './fleetQuestion'
import { fleetColumns } from './fleetViews'
import { MOST_EVENTS } from './mostEvents'
import { id, page, type Page } from './parts'
import { pastQuery } from './past'

/** The envelope of POST /api/events. Each event in it is parsed on its own, so that a bad one refuses only itself. */
export const eventsBody = z.strictObject({
  events: z.array(z.looseObject({ id: z.string().min(1).max(100) })).min(1).max(MOST_EVENTS),
  deviceNow: z.iso.datetime({ offset: true }).optional(),
  /** The person whose events these are: in anybody else's session nothing of them is recorded. */
  author: id.optional(),
})

/** What became of one event that was posted. */
export interface EventResult {
  id: string
  outcome: 'accepted' | 'duplicate' | 'refused'
  seq?: number
  version?: number
  problem?: ProblemDetails
}

/** What POST /api/events answers: results in the order sent, and each cylinder touched as it now stands. */
export interface EventsAnswer { results: EventResult[], cylinders: CylinderView[] }

/** The query of GET /api/cylinders. */
export const fleetQuery = z.strictObject({
  limit: page.limit,
  cursor: z.string().max(FLEET_TEXTS.cursor).optional(),
  q: z.string().trim().max(FLEET_TEXTS.q).optional(),
  place: id.optional(),
  holder: id.optional(),
  refrigerant: z.string().max(FLEET_TEXTS.refrigerant).optional(),
  condition: z.enum(FLEET_CHOICES.condition).optional(),
  lifecycle: z.enum(FLEET_CHOICES.lifecycle).optional(),
  dueBefore: z.string().regex(/^\d{4}-(0[1-9]|1[0-2])$/).optional(),
  finding: z.string().max(FLEET_TEXTS.finding).optional(),
  owner: id.optional(),
  label: z.string().max(FLEET_TEXTS.label).optional(),
  sort: z.enum(FLEET_CHOICES.sort).default('urgency'),
  order: z.enum(FLEET_CHOICES.order).default('asc'),
  ...pastQuery,
})

export type FleetQuery = z.output<typeof fleetQuery>

/** The same as a table of values (Accept: text/csv), which also takes columns and unit, and comes whole. */
export const fleetListQuery = fleetQuery.extend({
  columns: z.string().max(300).transform(text => text.split(',')).pipe(fleetColumns).optional(),
  unit: z.enum(['lb', 'lb-oz', 'kg']).optional(),
})

export type FleetListQuery = z.output<typeof fleetListQuery>
/** A page of the fleet, how many cylinders the whole list has, and the cursors of the pages beside it. */
export interface FleetAnswer extends Page<CylinderRow> { prevCursor: string | null, total: number }

/** What GET /api/fleet/summary answers: the counts beside the fleet's filters, and what falls due when. */
export interface FleetSummary {
  total: number
  stop: number
  caution: number
  full: { count: number }
  notSeen: { count: number }
  late: number
  /** Twelve months from the present one, with the cylinders that fall due in each. */
  dueByMonth: { month: string, count: number }[]
  refrigerants: { refrigerant: string, count: number }[]
}

/** What GET /api/cylinders/{ref}/events answers. Newest in effect first. */
export interface CustodyLogAnswer extends Page<LogLine> {
  cylinder: { id: string, labelCode: string | null, serial: string | null, version: number }
  /** From a device's copy, which has no lines: they are with the server. */
  isWithServer?: true
}

/** What GET /api/cylinders/{ref}/fold answers: what a browser needs to judge a draft event by the same rules. */
export interface FoldInput {
  events: AnyRecordedEvent[]
  codesOnTwo: string[]
  otherHalves: Half[]
  /** From a device's copy, in place of the events. */
  state?: CylinderState
}

export type { CylinderRow, CylinderView, LogLine, OpenList }

/** GET /api/cylinders/{ref}/open-list: null where it stands on none. */
export interface OpenListAnswer { list: OpenList | null }
