import type { PlanDetails, PlannedCylinder } from '../contract/plans'
import { massWords } from '../custody/findings/words'
import { isEmptyByScale } from '../custody/plan'
import { scaleAccuracyGrams } from '../quantity/scale'
import { whyNotEmptied, type PlanCylinder } from './bars'
import type { LimitContext } from './limitFor'
import { isWorseOntoWorse, lotKey, type Lot } from './lot'
import { lotOf, roomFor } from './roomFor'
import type { Transfer } from './transferProblem'

/** What is left of a consolidation, the cylinders as they stand now, and as they stood when it was made. */
export interface LeftToDo {
  transfers: readonly Transfer[]
  now: ReadonlyMap<string, PlanCylinder>
  then: readonly PlannedCylinder[]
  worseTogether: boolean
  limits: LimitContext
}

/** Why what is left of a plan cannot be done as planned, one sentence for each cylinder; none while it fits. */
export function whyNoLonger(left: LeftToDo): PlanDetails['noLongerFits'] {
  const sources = [...new Set(left.transfers.map(({ fromId }) => fromId))]
  const targets = [...new Set(left.transfers.map(({ toId }) => toId))]
  return [
    ...sources.map(cylinderId => ({ cylinderId, why: sourceChanged(left, cylinderId) })),
    ...targets.map(cylinderId => ({ cylinderId, why: targetChanged(left, cylinderId) })),
  ].flatMap(({ cylinderId, why }) => why === null ? [] : [{ cylinderId, why }])
}

function sourceChanged(left: LeftToDo, id: string): string | null {
  const cylinder = left.now.get(id)
  if (cylinder === undefined) return 'Nobody knows it any more.'
  const { view } = cylinder
  if (isEmptyByScale(view)) return 'Nothing is in it any more.'
  const bar = whyNotEmptied(cylinder)
  if (bar !== null) return bar
  const then = left.then.find(one => one.id === id)
  const { refrigerant, condition, netGrams } = view.contents
  if (then && (then.refrigerant !== refrigerant || then.condition !== condition)) return 'It holds something else than when the plan was made.'
  const planned = left.transfers.filter(({ fromId }) => fromId === id).reduce((sum, { grams }) => sum + grams, 0)
  const mayBeOff = scaleAccuracyGrams((view.stamp?.tareWeightGrams ?? 0) + netGrams!)
  return Math.abs(netGrams! - planned) <= mayBeOff ? null : `It holds ${massWords(netGrams!, 'nearest')} now; ${massWords(planned, 'nearest')} of it was left to move.`
}

function targetChanged(left: LeftToDo, id: string): string | null {
  const cylinder = left.now.get(id)
  if (cylinder === undefined) return 'Nobody knows it any more.'
  const mine = left.transfers.filter(({ toId }) => toId === id)
  const lots = mine.flatMap(({ fromId }) => {
    const source = left.now.get(fromId)
    return (source && lotOf(source)) ?? []
  })
  const into = isEmptyByScale(cylinder.view) ? worst(lots) : lotOf(cylinder)
  // Without a source that holds something there is nothing to judge: that is said of the source.
  if (lots.length === 0) return null
  if (into !== null && [...lots, { placeId: cylinder.siteId }].some(({ placeId }) => placeId !== into.placeId)) return 'It no longer stands at one place with what was to come into it.'
  if (into === null || lots.some(lot => !mayJoin(lot, into, left.worseTogether))) return 'What was to come into it may not be brought together with what is in it now.'
  const room = roomFor(cylinder, into, left.limits)
  if ('because' in room) return room.because
  const planned = mine.reduce((sum, { grams }) => sum + grams, 0)
  // What was kept free for the scale may be used up by what the scale is off.
  const reserve = scaleAccuracyGrams(cylinder.view.capacity.stopWeightGrams ?? 0)
  return planned <= room.grams + reserve ? null : `It has room for ${massWords(room.grams, 'down')} only; ${massWords(planned, 'nearest')} was to come into it.`
}

function mayJoin(from: Lot, into: Lot, worseTogether: boolean): boolean {
  return lotKey(from) === lotKey(into) || (worseTogether && isWorseOntoWorse(from, into))
}

function worst(lots: readonly Lot[]): Lot | null {
  return lots.find(({ condition }) => condition === 'burnt') ?? lots[0] ?? null
}
