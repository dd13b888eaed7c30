import { mayGoOnto, type Give, type Take, type Transfer, type TransferProblem } from './transferProblem'

/** Which cylinders are emptied, and which empty ones are used and for which lot. */
export interface Choice { emptied: readonly Give[], opened: readonly Take[] }

/**
 * A way to bring what a choice empties into what stays: each whole into the tightest room that takes it, parted only
 * where no room does. Null where it does not all fit; a choice by the sums of the lots always does.
 */
export function poured(problem: TransferProblem, { emptied, opened }: Choice): Transfer[] | null {
  const rooms = [...problem.takes.filter(({ id, isEmpty }) => !isEmpty && !emptied.some(give => give.id === id)), ...opened].map(take => ({ ...take }))
  const transfers: Transfer[] = []
  // First what has the fewest lots to go to, so that others do not take its room.
  const choosiest = [...emptied].sort((a, b) => lotsFor(problem, a) - lotsFor(problem, b) || b.netGrams - a.netGrams)
  for (const { id, lot, netGrams } of choosiest) {
    let left = netGrams
    while (left > 0) {
      const open = rooms.filter(room => room.roomGrams > 0 && mayGoOnto(problem, lot, room.lot)).sort((a, b) => Number(b.lot === lot) - Number(a.lot === lot))
      const whole = open.filter(room => room.roomGrams >= left && room.lot === open[0]?.lot).sort((a, b) => a.roomGrams - b.roomGrams)[0]
      const into = whole ?? open.filter(room => room.lot === open[0]?.lot).sort((a, b) => b.roomGrams - a.roomGrams)[0]
      if (into === undefined) return null
      const grams = Math.min(left, into.roomGrams)
      transfers.push({ fromId: id, toId: into.id, grams })
      into.roomGrams -= grams
      left -= grams
    }
  }
  return transfers
}

function lotsFor(problem: TransferProblem, { lot }: Give): number {
  return new Set(problem.takes.map(take => take.lot).filter(other => mayGoOnto(problem, lot, other))).size
}

/**
 * Whole grams along ways that are settled, so that each source is emptied and each room is kept; null where they do not fit.
 *
 * By augmenting paths: the nets and rooms are whole numbers, and so is what goes.
 */
export function alongWays(sources: readonly { id: string, netGrams: number }[], rooms: ReadonlyMap<string, number>, ways: readonly { fromId: string, toId: string }[]): Transfer[] | null {
  const flow = new Map(ways.map(way => [way, 0]))
  const left = new Map(rooms)
  for (const { id, netGrams } of sources) {
    let open = netGrams
    while (open > 0) {
      const path = pathToRoom(id, ways, flow, left)
      if (path === null) return null
      const end = path.at(-1)!.way.toId
      const grams = Math.min(open, left.get(end)!, ...path.flatMap(({ way, isBack }) => isBack ? [flow.get(way)!] : []))
      for (const { way, isBack } of path) flow.set(way, flow.get(way)! + (isBack ? -grams : grams))
      left.set(end, left.get(end)! - grams)
      open -= grams
    }
  }
  return [...flow].flatMap(([{ fromId, toId }, grams]) => grams > 0 ? [{ fromId, toId, grams }] : [])
}

interface Step { way: { fromId: string, toId: string }, isBack: boolean }

// Forward along a way into a target; back along one that carries something, to its source, which then goes elsewhere.
function pathToRoom(sourceId: string, ways: readonly Step['way'][], flow: ReadonlyMap<Step['way'], number>, left: ReadonlyMap<string, number>): Step[] | null {
  const seen = new Set([sourceId])
  let reached: { at: string, path: Step[] }[] = [{ at: sourceId, path: [] }]
  while (reached.length > 0) {
    const next: typeof reached = []
    for (const { at, path } of reached) {
      for (const way of ways.filter(({ fromId, toId }) => fromId === at && !seen.has(toId))) {
        seen.add(way.toId)
        const there = [...path, { way, isBack: false }]
        if ((left.get(way.toId) ?? 0) > 0) return there
        for (const back of ways.filter(one => one.toId === way.toId && (flow.get(one) ?? 0) > 0 && !seen.has(one.fromId))) {
          seen.add(back.fromId)
          next.push({ at: back.fromId, path: [...there, { way: back, isBack: true }] })
        }
      }
    }
    reached = next
  }
  return null
}
