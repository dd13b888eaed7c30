/**
 * A cylinder that could be emptied into others.
 *
 * Units: grams. `lot` names what may be brought together: place, refrigerant, condition and owner.
 */
export interface Give { id: string, netGrams: number, lot: string }

/** A cylinder that could take more. One that is empty stands here once for each lot that it could serve. */
export interface Take { id: string, roomGrams: number, isEmpty: boolean, lot: string }

/** What could be brought together, without a word of the trade: it is all that the search works on. */
export interface TransferProblem {
  gives: readonly Give[]
  takes: readonly Take[]
  /** Lots whose contents may also go onto another lot, beside their own. */
  onto: readonly { from: string, to: string }[]
}

/** So much out of one cylinder into another. */
export interface Transfer { fromId: string, toId: string, grams: number }

/** Whether contents of one lot may go into a cylinder of another. */
export function mayGoOnto({ onto }: TransferProblem, from: string, to: string): boolean {
  return from === to || onto.some(way => way.from === from && way.to === to)
}

/** How many cylinders more are empty after these transfers than before. */
export function freedBy(problem: TransferProblem, transfers: readonly Transfer[]): number {
  const opened = new Set(transfers.map(({ toId }) => toId)).values()
  return new Set(transfers.map(({ fromId }) => fromId)).size - [...opened].filter(id => problem.takes.some(take => take.id === id && take.isEmpty)).length
}

/**
 * What is wrong with transfers as an answer to a problem, null where nothing is: each source is emptied whole and takes
 * nothing, each target keeps its room, serves one lot, and takes only what may go onto it.
 */
export function faultOf(problem: TransferProblem, transfers: readonly Transfer[]): string | null {
  const out = sums(transfers, ({ fromId }) => fromId)
  const into = sums(transfers, ({ toId }) => toId)
  for (const { fromId, toId, grams } of transfers) {
    if (!Number.isInteger(grams) || grams <= 0) return `${grams} g is no amount to transfer`
    if (out.has(toId)) return `${toId} gives and takes`
    if (transfers.filter(other => other.fromId === fromId && other.toId === toId).length > 1) return `${fromId} goes into ${toId} twice`
  }
  for (const [id, grams] of out) {
    if (problem.gives.find(give => give.id === id)?.netGrams !== grams) return `${id} is not emptied whole`
  }
  for (const [id, grams] of into) {
    const lots = new Set(transfers.filter(({ toId }) => toId === id).map(({ fromId }) => problem.gives.find(give => give.id === fromId)!.lot))
    const serves = problem.takes.some(take => take.id === id && take.roomGrams >= grams && [...lots].every(lot => mayGoOnto(problem, lot, take.lot)))
    if (!serves) return `${id} may not take what goes into it`
  }
  return null
}

function sums(transfers: readonly Transfer[], of: (transfer: Transfer) => string): Map<string, number> {
  const found = new Map<string, number>()
  for (const transfer of transfers) found.set(of(transfer), (found.get(of(transfer)) ?? 0) + transfer.grams)
  return found
}
