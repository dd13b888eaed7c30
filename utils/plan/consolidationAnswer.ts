import type { PlanAnswer, PlannedCylinder, PlannedTransfer } from '../contract/plans'
import { massWords } from '../custody/findings/words'
import type { Planned } from '../custody/plan'
import { CONDITION_WORDS } from '../custody/words'
import { counted } from '../now/phrase'
import type { PlanCylinder } from './bars'
import type { Consolidation } from './consolidate'
import type { Lot } from './lot'
import { limitGramsFor, type LimitContext } from './limitFor'
import { plannedCylinder } from './plannedCylinder'
import type { SortedOut } from './sortOut'
import { mayGoOnto } from './transferProblem'

/** What a consolidation is told with: the cylinders as they stand, how they were sorted out, and what was found. */
export interface ConsolidationFound { cylinders: readonly PlanCylinder[], sorted: SortedOut, found: Consolidation, limits: LimitContext, nameOfFirm: (id: string) => string }

/** A consolidation as it is kept and shown: before and after, each transfer with why, and why the others stay as they are. */
export function consolidationAnswer(input: ConsolidationFound): PlanAnswer {
  const { found } = input
  return {
    summary: summary(found),
    freed: found.freed,
    mostFreed: found.mostFreed,
    fewestTransfers: found.fewestTransfers,
    transfers: found.transfers.map(({ fromId, toId, grams }): PlannedTransfer => ({
      fromId, toId, grams, isAll: found.transfers.filter(one => one.fromId === fromId).length === 1, why: whyThere(input, fromId, toId),
    })),
    shipments: [],
    cylinders: input.cylinders.map(cylinder => afterwards(input, cylinder)),
  }
}

function summary({ freed, mostFreed, transfers, fewestTransfers }: Consolidation): string[] {
  if (transfers.length === 0) {
    return [mostFreed === 0 ? 'No cylinder can come free: what may be brought together has no room.' : `No plan was found in the time given. At most ${mostFreed} could come free.`]
  }
  const moved = transfers.reduce((sum, { grams }) => sum + grams, 0)
  const isBest = freed === mostFreed && transfers.length === fewestTransfers
  return [
    `${counted(freed, 'cylinder comes', 'cylinders come')} free by ${counted(transfers.length, 'transfer', 'transfers')}, which ${transfers.length === 1 ? 'moves' : 'move'} ${massWords(moved, 'nearest')}.`,
    ...(isBest ? ['No plan frees more, and none that frees as many has fewer transfers.'] : []),
    ...(freed < mostFreed ? [`It is the best found in the time given: at most ${mostFreed} could come free.`] : []),
    ...(freed === mostFreed && transfers.length > fewestTransfers ? [`No plan frees more. It is the one with the fewest transfers found in the time given: fewer than ${fewestTransfers} it cannot be.`] : []),
    'Each cylinder that takes keeps free what its scale may be off at the stop weight.',
  ]
}

function whyThere({ sorted, found }: ConsolidationFound, fromId: string, toId: string): string {
  const { problem, lots } = sorted
  const from = problem.gives.find(({ id }) => id === fromId)!
  const into = problem.takes.find(take => take.id === toId && mayGoOnto(problem, from.lot, take.lot))!
  const lot = lots.get(from.lot)!
  const parts = found.transfers.filter(one => one.fromId === fromId)
  const left = into.roomGrams - found.transfers.filter(one => one.toId === toId).reduce((sum, { grams }) => sum + grams, 0)
  const same = from.lot === into.lot ? `Both ${lot.refrigerant}, ${CONDITION_WORDS[lot.condition]}, of one owner, at one place.` : `${lot.refrigerant}, ${CONDITION_WORDS[lot.condition]} onto ${CONDITION_WORDS[lots.get(into.lot)!.condition]}, as was allowed.`
  const how = parts.length > 1 ? `No one cylinder left has room for all of it, so it goes into ${parts.length}.` : 'All of it fits.'
  return `${into.isEmpty ? 'Into an empty cylinder that may take it.' : same} ${how} ${left === 0 ? 'The other is then full to its reserve.' : `Room for ${massWords(left, 'down')} is left after the plan.`}`
}

function afterwards(input: ConsolidationFound, cylinder: PlanCylinder): PlannedCylinder {
  const { sorted: { problem, lots }, found: { transfers } } = input
  const { view, asked } = cylinder
  const into = transfers.filter(({ toId }) => toId === view.id).reduce((sum, { grams }) => sum + grams, 0)
  const isEmptied = transfers.some(({ fromId }) => fromId === view.id)
  const before = view.contents.netGrams
  const source = problem.gives.find(({ id }) => id === transfers.find(({ toId }) => toId === view.id)?.fromId)
  const lot = source && lots.get(problem.takes.find(take => take.id === view.id && mayGoOnto(problem, source.lot, take.lot))!.lot)
  const shown = (lot && asked.get(lot.refrigerant)) ?? view
  return {
    ...plannedCylinder(shown, input.nameOfFirm),
    ...(lot && afterLot(input, shown, lot)),
    part: isEmptied ? 'emptied' : into > 0 ? 'takes' : 'stays',
    afterGrams: isEmptied ? 0 : into > 0 ? (before ?? 0) + into : before,
    why: isEmptied || into > 0 ? [] : whyItStays(input, view.id),
  }
}

// An empty one is shown with what comes into it, and with the limit of that.
function afterLot({ limits, nameOfFirm }: ConsolidationFound, view: Planned, lot: Lot): Partial<PlannedCylinder> {
  const { fillLimitGrams, stopWeightGrams } = view.capacity
  const limitGrams = limitGramsFor(view, lot, limits)
  const lowerBy = limitGrams === null || fillLimitGrams === null ? 0 : Math.max(0, fillLimitGrams - limitGrams)
  return {
    refrigerant: lot.refrigerant, condition: lot.condition, owner: lot.ownerId === null ? null : nameOfFirm(lot.ownerId),
    limitGrams: fillLimitGrams === null ? limitGrams : fillLimitGrams - lowerBy,
    stopWeightGrams: stopWeightGrams === null ? null : stopWeightGrams - lowerBy,
  }
}

function whyItStays({ sorted: { problem, bars, lots }, found }: ConsolidationFound, id: string): string[] {
  const bar = bars.get(id)
  if (bar === undefined) return []
  if (bar.isEmpty) return [bar.takes ?? 'It stays empty: to use it frees none more.']
  if (bar.gives !== null) return bar.takes === null || bar.takes === bar.gives ? [bar.gives] : [bar.gives, `It takes nothing: ${lowered(bar.takes)}`]
  const others = problem.takes.filter(take => take.id !== id && mayGoOnto(problem, bar.lot!, take.lot) && !found.transfers.some(({ fromId }) => fromId === take.id))
  if (others.length === 0) return [alone(lots.get(bar.lot!)!)]
  const room = others.filter(({ isEmpty }) => !isEmpty).reduce((sum, take) => sum + take.roomGrams - found.transfers.filter(({ toId }) => toId === take.id).reduce((into, { grams }) => into + grams, 0), 0)
  const { netGrams } = problem.gives.find(give => give.id === id)!
  return [`To empty it frees none more: it holds ${massWords(netGrams, 'nearest')}, and the others have room left for ${massWords(Math.max(0, room), 'down')}.`]
}

function alone({ refrigerant, condition }: Lot): string {
  return `No other cylinder of this plan at its place may take it: ${refrigerant}, ${CONDITION_WORDS[condition]}, of the same owner.`
}

function lowered(sentence: string): string {
  return /^(It|What|The|No|Not|Nothing|Nobody|Refrigerant)\b/.test(sentence) ? sentence.charAt(0).toLowerCase() + sentence.slice(1) : sentence
}
