/** Why refrigerant came into or went out of a cylinder: the closed list behind every balance. */
export const MOVEMENT_CAUSES = [
  'opening', 'recovered', 'received-with', 'returned-with',
  'drawn-same-system', 'drawn-same-owner', 'drawn-other', 'sampled', 'renamed',
  'transferred-in', 'transferred-out', 'shipped', 'lost', 'emptied-loss', 'missing', 'found', 'tare-change', 'weighing',
] as const

export type MovementCause = (typeof MOVEMENT_CAUSES)[number]

/** Causes that say only that a weight or a tare differed: nobody knows why. */
const UNEXPLAINED_CAUSES = ['tare-change', 'weighing'] as const satisfies readonly MovementCause[]

/** Whether a cause explains nothing. */
export function isUnexplained(cause: MovementCause): boolean {
  return (UNEXPLAINED_CAUSES as readonly MovementCause[]).includes(cause)
}

/** One signed change of net caused by one event, booked under one refrigerant and one owner. */
export interface Movement {
  eventId: string
  /** Position among the movements of the same event, from 0. */
  ordinal: number
  cause: MovementCause
  /** null = not known which. */
  refrigerant: string | null
  /** Firm whose refrigerant it is; null = the contractor's own. */
  ownerId: string | null
  /** Signed: in is positive. */
  grams: number
  /** effectiveAt of the event, UTC milliseconds; a registration counts from the cylinder's first event. */
  at: number
  /** The event was practice, or a trainee's without a countersignature: apart in reports. */
  apart: boolean
}
