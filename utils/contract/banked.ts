import type { Condition, Named } from '../custody/cylinderView'
import type { EventKind } from '../custody/kinds'
import type { MovementCause } from '../custody/movement'
import type { NamedCylinder } from './jobs'

/** A cylinder that holds refrigerant of a customer. */
export interface BankedCylinder extends NamedCylinder {
  /** Theirs by share; null where it is not weighed. */
  grams: number | null
  /** Of that, by the weight it rests on; null where it rests on none. */
  uncertaintyGrams: number | null
  /** Another's refrigerant is in it too: it may go to a reclaimer only. */
  isShared: boolean
  /** Since when something of theirs has been in it without a break, ISO 8601; null where no weight told it. */
  since: string | null
}

/** What is banked of one refrigerant in one condition. */
export interface BankedIn {
  refrigerant: string | null
  condition: Condition
  /** Of the cylinders that are weighed; null where none is. */
  grams: number | null
  uncertaintyGrams: number | null
  /** Cylinders that are not weighed. */
  notKnown: number
  cylinders: BankedCylinder[]
}

/** A change of what is a customer's. */
export interface BankedMovement {
  eventId: string
  ordinal: number
  cylinder: NamedCylinder
  at: string
  kind: EventKind
  cause: MovementCause
  refrigerant: string | null
  grams: number
  /** Practice, or not countersigned. */
  apart: boolean
}

/** What of a customer's left for a reclaimer in one cylinder, and what was credited for it. */
export interface BankedShipped {
  eventId: string
  shipment: { id: string, number: number }
  to: Named
  cylinder: NamedCylinder
  refrigerant: string | null
  at: string
  grams: number
  /** Of all owners' in that cylinder. */
  wholeGrams: number
  isSettled: boolean
  /** Hundredths of the currency, theirs by their share of the weight that left; null while it is not settled, or nobody said. */
  creditCents: number | null
}

/** GET /api/firms/{id}/banked: the refrigerant that is a customer's, in the contractor's hands. */
export interface BankedAnswer {
  held: BankedIn[]
  /** The newest first, at most 200 of them. */
  movements: BankedMovement[]
  movementsInAll: number
  shipped: BankedShipped[]
}
