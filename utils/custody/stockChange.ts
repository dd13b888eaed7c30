/**
 * What one event changed in what a cylinder holds in stock, of one refrigerant and one owner, and in how surely that is
 * known.
 *
 * Read from what the cylinder holds before and after, not from the movements: the two must agree. Summed up to an
 * instant, these are the contents as they stood at it.
 */
export interface StockChange {
  eventId: string
  /** Position among the changes of the same event, from 0. */
  ordinal: number
  /** null = not known which, or mixed. */
  refrigerant: string | null
  /** Firm whose refrigerant it is; null = the contractor's own. */
  ownerId: string | null
  /** Of the known contents, signed. */
  grams: number
  /** In the number of cylinders whose contents are not known. A cylinder of two owners counts once, by the larger share. */
  notKnown: number
  /** In the sum of the squared uncertainties of the weights that the known contents rest on. Units: grams squared. */
  weighedVariance: number
  /** Squared uncertainty of the differences from the log that this event's weights found. Units: grams squared. */
  foundVariance: number
  /**
   * The same two as they count for all owners together: the parts of one weight err alike, so that they are added before
   * they are squared. An owner's is the part times the whole. Units: grams squared.
   */
  weighedTogether: number
  foundTogether: number
  /** When it counts, UTC milliseconds: as the movements of the same event. */
  at: number
  /** The event was practice, or a trainee's without a countersignature: apart in reports. */
  apart: boolean
}
