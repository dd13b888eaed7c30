import { isEmptyByScale } from '../custody/plan'
import { scaleAccuracyGrams } from '../quantity/scale'
import { whyNotFilled, type PlanCylinder } from './bars'
import { limitGramsFor, type LimitContext } from './limitFor'
import { lotKey, type Lot } from './lot'

/** What a cylinder would be brought together with; null where its contents have no one name and owner, or it has no place. */
export function lotOf({ view: { contents }, siteId }: PlanCylinder): Lot | null {
  const { refrigerant, condition, burnt, owners } = contents
  if (siteId === null || refrigerant === null || owners.length > 1) return null
  return { placeId: siteId, refrigerant, condition, burnt, ownerId: owners[0]?.ownerId ?? null }
}

/**
 * How much of a lot a cylinder takes, less what its scale may be off at the stop weight; or why it takes none.
 *
 * Rounding: down.
 */
export function roomFor(cylinder: PlanCylinder, lot: Lot, context: LimitContext): { grams: number } | { because: string } {
  const view = cylinder.view.contents.nothingInIt ? cylinder.asked.get(lot.refrigerant) ?? cylinder.view : cylinder.view
  if (isEmptyByScale(view) && !view.contents.nothingInIt && !isOwnLot(cylinder, lot)) return { because: `What is left in it is ${view.contents.refrigerant ?? 'not known'}. Draw a deep vacuum first.` }
  const because = whyNotFilled({ ...cylinder, view }, lot)
  if (because !== null) return { because }
  const { roomGrams, stopWeightGrams } = view.capacity
  if (roomGrams === null || stopWeightGrams === null) return { because: 'How much it holds is not known. Weigh it first.' }
  const limitGrams = limitGramsFor(view, lot, context)
  if (limitGrams === null) return { because: 'No rule has a figure for this refrigerant in this cylinder.' }
  const grams = Math.min(roomGrams, limitGrams - (view.contents.netGrams ?? 0)) - scaleAccuracyGrams(stopWeightGrams)
  return grams > 0 ? { grams } : { because: 'It has no room beyond what a scale may be off.' }
}

function isOwnLot(cylinder: PlanCylinder, lot: Lot): boolean {
  const own = lotOf(cylinder)
  return own !== null && lotKey(own) === lotKey(lot)
}
