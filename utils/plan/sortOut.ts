import { fillLimit } from '../capacity/fillLimit'
import type { FillPolicy } from '../capacity/types'
import { isEmptyByScale, type Planned } from '../custody/plan'
import { scaleAccuracyGrams } from '../quantity/scale'
import type { Catalogue } from '../refrigerant/types'
import { whyNotEmptied, whyNotFilled, type PlanCylinder } from './bars'
import { isWorseOntoWorse, lotKey, type Lot } from './lot'
import type { Give, Take, TransferProblem } from './transferProblem'

/** What whoever asks allows. */
export interface ConsolidationRules {
  /** Empty cylinders may take contents too; each that does counts against those that come free. */
  useEmpty: boolean
  /** Suspect contents may go onto burnt ones. */
  worseTogether: boolean
}

/** What a limit rests on beside the cylinder. */
export interface LimitContext { policy: FillPolicy, catalogue: Catalogue }

/** The cylinders sorted for the search, and for each why it gives or takes nothing; null where it may. */
export interface SortedOut {
  problem: TransferProblem
  lots: ReadonlyMap<string, Lot>
  bars: ReadonlyMap<string, { isEmpty: boolean, gives: string | null, takes: string | null, lot: string | null }>
}

/** Sorts cylinders into those that may be emptied and those that may take more, by what may be brought together. */
export function sortOut(cylinders: readonly PlanCylinder[], rules: ConsolidationRules, context: LimitContext): SortedOut {
  const holding = cylinders.filter(({ view }) => !isEmptyByScale(view))
  const lots = new Map<string, Lot>()
  const gives: Give[] = []
  const takes: Take[] = []
  const bars = new Map<string, { isEmpty: boolean, gives: string | null, takes: string | null, lot: string | null }>()
  for (const cylinder of holding) {
    const { view } = cylinder
    const lot = lotOf(view)
    const why = whyNotEmptied(cylinder)
    const room = lot === null ? { because: why ?? '' } : roomFor(cylinder, lot, context)
    if (lot !== null && why === null) {
      lots.set(lotKey(lot), lot)
      gives.push({ id: view.id, netGrams: view.contents.netGrams!, lot: lotKey(lot) })
    }
    if (lot !== null && 'grams' in room) {
      lots.set(lotKey(lot), lot)
      takes.push({ id: view.id, roomGrams: room.grams, isEmpty: false, lot: lotKey(lot) })
    }
    bars.set(view.id, { isEmpty: false, gives: why, takes: 'because' in room ? room.because : null, lot: lot && lotKey(lot) })
  }
  const given = [...new Set(gives.map(({ lot }) => lot))].map(key => lots.get(key)!)
  for (const cylinder of cylinders.filter(({ view }) => isEmptyByScale(view))) {
    const { view } = cylinder
    const here = given.filter(lot => view.place === null || lot.placeId === view.place.id)
    const rooms = rules.useEmpty ? here.map(lot => ({ lot, room: roomFor(cylinder, lot, context) })) : []
    for (const { lot, room } of rooms) {
      if ('grams' in room) takes.push({ id: view.id, roomGrams: room.grams, isEmpty: true, lot: lotKey(lot) })
    }
    const refused = rooms.find(({ room }) => 'because' in room)
    const mayTake = rooms.some(({ room }) => 'grams' in room)
    const nothingHere = rules.useEmpty ? 'Nothing at its place could go into it.' : 'Empty ones are left alone.'
    bars.set(view.id, { isEmpty: true, gives: 'Nothing is in it.', takes: mayTake ? null : refused && 'because' in refused.room ? refused.room.because : nothingHere, lot: null })
  }
  const all = [...lots.values()]
  const onto = rules.worseTogether ? all.flatMap(from => all.flatMap(to => isWorseOntoWorse(from, to) ? [{ from: lotKey(from), to: lotKey(to) }] : [])) : []
  return { problem: { gives, takes, onto }, lots, bars }
}

/** What a cylinder would be brought together with; null where its contents have no one name and owner, or it has no place. */
function lotOf({ contents, place }: Planned): Lot | null {
  const { refrigerant, condition, burnt, owners } = contents
  if (place === null || refrigerant === null || owners.length > 1) return null
  return { placeId: place.id, refrigerant, condition, burnt, ownerId: owners[0]?.ownerId ?? null }
}

/**
 * How much of a lot a cylinder takes, less what its scale may be off at the stop weight; or why it takes none.
 *
 * Rounding: down.
 */
function roomFor(cylinder: PlanCylinder, lot: Lot, { policy, catalogue }: LimitContext): { grams: number } | { because: string } {
  const view = cylinder.view.contents.nothingInIt ? cylinder.asked.get(lot.refrigerant) ?? cylinder.view : cylinder.view
  if (isEmptyByScale(view) && !view.contents.nothingInIt && !isOwnLot(view, lot)) return { because: `What is left in it is ${view.contents.refrigerant ?? 'not known'}. Draw a deep vacuum first.` }
  const because = whyNotFilled({ ...cylinder, view }, lot)
  if (because !== null) return { because }
  const { roomGrams, stopWeightGrams } = view.capacity
  const { stamp } = view
  if (roomGrams === null || stopWeightGrams === null || stamp === null) return { because: 'How much it holds is not known. Weigh it first.' }
  // What goes in decides the limit too: burnt refrigerant has a lower one.
  const limit = fillLimit({ stamp, refrigerant: lot.refrigerant, condition: lot.condition, burnt: lot.burnt, policy, catalogue, tareGrams: stamp.tareWeightGrams })
  if (limit.fillLimitGrams === null) return { because: 'No rule has a figure for this refrigerant in this cylinder.' }
  const grams = Math.min(roomGrams, limit.fillLimitGrams - (view.contents.netGrams ?? 0)) - scaleAccuracyGrams(stopWeightGrams)
  return grams > 0 ? { grams } : { because: 'It has no room beyond what a scale may be off.' }
}

function isOwnLot(view: Planned, lot: Lot): boolean {
  const own = lotOf(view)
  return own !== null && lotKey(own) === lotKey(lot)
}
