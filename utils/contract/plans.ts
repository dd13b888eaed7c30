import { z } from 'zod'
import type { CylinderRow, Named } from '../custody/cylinderView'
import type { Condition } from '../capacity/types'
import { eachOnce, id, line } from './parts'

/** A plan is made for so many cylinders at most. */
export const MOST_PLANNED = 200

/** Which cylinders: those named, or those at a place (all within it), or those that hold a refrigerant, with the empty ones. */
const which = {
  cylinderIds: z.array(id).min(1).max(MOST_PLANNED).refine(ids => eachOnce(ids), 'must name each cylinder once').optional(),
  placeId: id.optional(),
  refrigerant: line(40).optional(),
}

/** POST /api/plans: which contents to bring together, or what to ship to whom. */
export const planBody = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('consolidation'), id: id.optional(), ...which, useEmpty: z.boolean().default(true), worseTogether: z.boolean().default(false) }),
  z.strictObject({ kind: z.literal('shipping'), id: id.optional(), ...which }),
])

/** PATCH /api/plans/{id}: it is followed no longer. */
export const planPatch = z.strictObject({ state: z.literal('dropped') })

/** GET /api/plans/tasks: what open plans have for a cylinder to do. */
export const planTasksQuery = z.strictObject({ cylinder: id })

export type PlanQuestion = z.output<typeof planBody>
export type PlanKind = PlanQuestion['kind']

/** A cylinder as it stood when the plan was made, and as it would stand after it. Units: grams. */
export interface PlannedCylinder extends Pick<CylinderRow, 'id' | 'labelCode' | 'serial'> {
  version: number
  place: Named | null
  refrigerant: string | null
  condition: Condition
  /** Whose refrigerant it is, by name; null = our own. */
  owner: string | null
  part: 'emptied' | 'takes' | 'ships' | 'stays'
  beforeGrams: number | null
  afterGrams: number | null
  limitGrams: number | null
  waterCapacityGrams: number | null
  stopWeightGrams: number | null
  /** Why it has this part, in sentences. */
  why: string[]
}

/** One transfer of a plan. */
export interface PlannedTransfer { fromId: string, toId: string, grams: number, isAll: boolean, why: string }

/** What of a plan goes to one reclaimer. */
export interface PlannedShipment {
  firm: Named
  cylinderIds: string[]
  netGrams: number
  /** What it pays, less what it charges for contents. */
  creditCents: number
  /** null = not known. */
  pickUpCents: number | null
  isMinimumMet: boolean
  says: string[]
}

/** What a plan says: frozen as it was made. */
export interface PlanAnswer {
  /** How good it is, in sentences. */
  summary: string[]
  /** What was found and what no plan can pass: cylinders that come free, transfers. Equal where it is the best there is. */
  freed: number
  mostFreed: number
  fewestTransfers: number
  transfers: PlannedTransfer[]
  shipments: PlannedShipment[]
  cylinders: PlannedCylinder[]
}

/** What POST /api/plans answers: the plan that was made; without an id where there is nothing to do, and the answer says why. */
export interface PlanMade { id: string | null, answer: PlanAnswer }

/** How the two halves of a transfer stand: within what the scales may be off, not, or with one of them still missing. */
export type PairBalance = 'balanced' | 'unbalanced' | 'half' | 'not-known'

/** A step of a plan, and what the log says of it. */
export interface PlanTask {
  position: number
  kind: 'transfer' | 'ship'
  fromId: string
  toId: string | null
  /** By the log when the plan was made; null where it is shipped as it is. */
  netGrams: number | null
  /** Whatever it weighs then: only of what is parted the grams count. */
  isAll: boolean
  done: { eventId: string, at: string, grams: number | null, balance: PairBalance | null } | null
}

/** A plan in a list. */
export interface PlanLine {
  id: string
  number: number
  kind: PlanKind
  state: 'open' | 'done' | 'dropped'
  madeAt: string
  madeBy: string
  tasks: number
  tasksDone: number
  freed: number
}

/** What GET /api/plans answers: the newest first. */
export interface PlansAnswer { items: PlanLine[] }

/** What GET /api/plans/{id} answers. */
export interface PlanDetails extends PlanLine {
  question: PlanQuestion
  answer: PlanAnswer
  steps: PlanTask[]
  /** Why what is left of it cannot be done as planned, a sentence for each cylinder; empty while it fits. */
  noLongerFits: { cylinderId: string, why: string }[]
}

/** What GET /api/plans/tasks answers: the next open steps of a cylinder, with their plans. */
export interface CylinderTasksAnswer { items: { planId: string, planNumber: number, step: PlanTask, other: Pick<CylinderRow, 'id' | 'labelCode' | 'serial'> | null }[] }
