import type { Stamp } from '../capacity/types'
import type { Condition, Hold, Ownership, RetestMark } from './cylinderView'
import type { Half } from './half'
import type { EventKind } from './kinds'

/** How much of the contents belongs to whom; null = the contractor itself. While the net is unknown only the proportion counts. */
export interface Share { ownerId: string | null, grams: number }

/** What is in the steel, as far as the log knows. */
export interface ContentsState {
  refrigerant: string | null
  condition: Condition
  burnt: boolean
  /** Nothing is in it: evacuated, taken over by a reclaimer, or emptied by a wet test. */
  nothingInIt: boolean
  evacuated: boolean
  inStock: boolean
  netGrams: number | null
  basis: 'weighed' | 'reckoned' | 'unknown'
  /** The reading that the net rests on, from which a new tare gives a new net. */
  grossGrams: number | null
  uncertaintyGrams: number | null
  /** Of the event that set the net. */
  asOf: number | null
  shares: Share[]
  /** Every refrigerant known to have been in it since the last deep vacuum, the last one last. */
  knownSinceVacuum: string[]
  /** The net when it was last known, unrounded where a weight told it; null once nothing is in it. */
  lastKnownNetGrams: number | null
  /** Came back from a reclaimer: a weight at its tare would show that nothing is in it. */
  backFromReclaim: boolean
}

/** Where a cylinder may be that has gone from us. */
export type AwayAt = 'at-reclaim' | 'at-test' | 'given-away'

/** What keeps the cylinder from use, and since when. Several events for one hold add their reasons: a text, or what an outside look found. */
export interface StateHold { hold: Hold, since: number, reasons: string[] }

/** Findings that an event raises and that then stand until another event ends them. */
export const STANDING_CODES = ['second-refrigerant', 'unknown-onto-known', 'registered-twice', 'unsigned', 'unsupervised', 'after-end'] as const
export type StandingCode = (typeof STANDING_CODES)[number]

/**
 * One cylinder as its events have made it, whatever the date and the firm's rules. Plain data: it may be kept as JSON.
 *
 * Units: grams; instants in UTC milliseconds of effect.
 */
export interface CylinderState {
  id: string
  version: number
  /** null while no registration has arrived. */
  registeredAt: number | null
  stamp: Stamp | null
  marks: (RetestMark & { enteredAt: number })[]
  dedicatedTo: string | null
  ownership: Ownership
  ownerId: string | null
  /** The tare in force, unrounded; null where none can be read. */
  tare: { exactGrams: number, since: number, isWeighedAnew: boolean } | null
  labelCode: string | null
  /** `replacedAt`: since when another stands in its place; left out for one that is on it still. */
  labels: { code: string, firstAt: number, lastAt: number, replacedAt?: number }[]
  placeId: string | null
  holderId: string | null
  /** Where it has gone, and the shipment, the lot or the exchange it went with. */
  away: { at: AwayAt, since: number, listId: string } | null
  /** Nobody knows where it is; `lastSeen` in words. */
  missing: { since: number, lastSeen: string | null } | null
  condemnedAt: number | null
  retired: { since: number } | null
  holds: StateHold[]
  contents: ContentsState
  /** Burnt refrigerant was in it at any time, whatever was done since. */
  hasHeldBurnt: boolean
  /** Something was put in while the cylinder was in our hands. */
  filledHere: boolean
  /** The last event that put refrigerant in: its day's fill rule also judges an overfill. */
  lastPutInAt: number | null
  overfilledAt: number | null
  standing: { code: StandingCode, since: number }[]
  /** Its halves of what happened between two cylinders, in order of effect. */
  halves: Half[]
  /** Supervisors who have not signed all that trainees recorded under them. */
  waitsForSignatureOf: string[]
  firstEventAt: number | null
  lastEventAt: number | null
  lastEventKind: EventKind | null
  lastSeenAt: number | null
  /** Of the last line in effect, whether it counts or was taken out: what comes later than this comes last. */
  latestAt: number | null
  /** Ids that corrections and signatures name and that no event has yet. */
  namedEarly: string[]
}

/** A cylinder of which nothing is known yet. */
export function initialState(id: string): CylinderState {
  return {
    id,
    version: 0,
    registeredAt: null,
    stamp: null,
    marks: [],
    dedicatedTo: null,
    ownership: 'own',
    ownerId: null,
    tare: null,
    labelCode: null,
    labels: [],
    placeId: null,
    holderId: null,
    away: null,
    missing: null,
    condemnedAt: null,
    retired: null,
    holds: [],
    contents: {
      refrigerant: null,
      condition: 'unknown',
      burnt: false,
      nothingInIt: false,
      evacuated: false,
      inStock: true,
      netGrams: null,
      basis: 'unknown',
      grossGrams: null,
      uncertaintyGrams: null,
      asOf: null,
      shares: [],
      knownSinceVacuum: [],
      lastKnownNetGrams: null,
      backFromReclaim: false,
    },
    hasHeldBurnt: false,
    filledHere: false,
    lastPutInAt: null,
    overfilledAt: null,
    standing: [],
    halves: [],
    waitsForSignatureOf: [],
    firstEventAt: null,
    lastEventAt: null,
    lastEventKind: null,
    lastSeenAt: null,
    latestAt: null,
    namedEarly: [],
  }
}
