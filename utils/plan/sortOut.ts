import { isEmptyByScale } from '../custody/plan'
import { whyNotEmptied, type PlanCylinder } from './bars'
import type { LimitContext } from './limitFor'
import { isWorseOntoWorse, lotKey, type Lot } from './lot'
import { lotOf, roomFor } from './roomFor'
import type { Give, Take, TransferProblem } from './transferProblem'

/** What whoever asks allows. */
export interface ConsolidationRules {
  /** Empty cylinders may take contents too; each that does counts against those that come free. */
  useEmpty: boolean
  /** Suspect contents may go onto burnt ones. */
  worseTogether: boolean
}

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
    const lot = lotOf(cylinder)
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
    const here = given.filter(lot => cylinder.siteId === null || lot.placeId === cylinder.siteId)
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
