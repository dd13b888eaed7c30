import type { TransferProblem } from '~~/utils/plan/transferProblem'

/** The best that any plan can do. */
export interface Best { freed: number, transfers: number }

/**
 * The best plan for up to a dozen cylinders by trying them all: every way to divide the cylinders into groups that have
 * nothing to do with each other, and in every group every choice of those that are emptied.
 *
 * What is connected by transfers is a group, and a group of so many cylinders takes one transfer less than it has
 * cylinders: fewer do not connect it, and more are never needed. It works where each set of lots finds room in the lots
 * that take it.
 */
export function bestOfEveryWay(problem: TransferProblem): Best {
  const empties = [...new Set(problem.takes.filter(({ isEmpty }) => isEmpty).map(({ id }) => id))]
  const servedBy = empties.reduce<Map<string, string>[]>(
    (all, id) => all.flatMap(served => problem.takes.filter(take => take.id === id).map(take => new Map([...served, [id, take.lot]]))), [new Map()],
  )
  return servedBy.map(served => bestWith(problem, served)).reduce((a, b) => isBetter(b, a) ? b : a)
}

function bestWith(problem: TransferProblem, served: ReadonlyMap<string, string>): Best {
  const ids = [...new Set([...problem.gives, ...problem.takes].map(({ id }) => id))]
  const all = 1 << ids.length
  const best: Best[] = Array.from({ length: all }, () => ({ freed: 0, transfers: 0 }))
  const lots = [...new Set([...problem.gives, ...problem.takes].map(({ lot }) => lot))]
  const nets = lots.map(lot => sumsOf(ids.map(id => problem.gives.find(give => give.id === id && give.lot === lot)?.netGrams ?? 0)))
  const rooms = lots.map(lot => sumsOf(ids.map(id => problem.takes.find(take => take.id === id && take.lot === lot && (!take.isEmpty || served.get(id) === lot))?.roomGrams ?? 0)))
  const givers = maskOf(ids, id => problem.gives.some(give => give.id === id))
  const empty = maskOf(ids, id => served.has(id))
  const reach = lots.map(from => lots.flatMap((to, index) => from === to || problem.onto.some(way => way.from === from && way.to === to) ? [index] : []))
  const sets = Array.from({ length: (1 << lots.length) - 1 }, (_, index) => {
    const from = lots.flatMap((_, lot) => (index + 1) >> lot & 1 ? [lot] : [])
    return { from, to: [...new Set(from.flatMap(lot => reach[lot]!))] }
  })
  const groups = Array.from({ length: all }, (_, group): number | null => {
    let most: number | null = null
    for (let out = group; out > 0; out = (out - 1) & group) {
      if ((out & givers) !== out) continue
      const stay = group & ~out
      const freed = bits(out) - bits(stay & empty)
      if (freed <= 0 || (most !== null && freed <= most)) continue
      if (sets.every(({ from, to }) => sum(from, nets, out) <= sum(to, rooms, stay))) most = freed
    }
    return most
  })
  for (let group = 1; group < all; group++) {
    const lowest = group & -group
    // The lowest stays as it is, or belongs to one of the groups that have it in them.
    let found = best[group & ~lowest]!
    for (let part = group; part > 0; part = (part - 1) & group) {
      const freed = groups[part]
      if ((part & lowest) === 0 || freed === null || freed === undefined) continue
      const rest = best[group & ~part]!
      const together = { freed: freed + rest.freed, transfers: bits(part) - 1 + rest.transfers }
      if (isBetter(together, found)) found = together
    }
    best[group] = found
  }
  return best[all - 1]!
}

function isBetter(a: Best, b: Best): boolean {
  return a.freed > b.freed || (a.freed === b.freed && a.transfers < b.transfers)
}

function sumsOf(figures: readonly number[]): number[] {
  const sums = [0]
  for (let mask = 1; mask < 1 << figures.length; mask++) sums.push(sums[mask & (mask - 1)]! + figures[31 - Math.clz32(mask & -mask)]!)
  return sums
}

function maskOf(ids: readonly string[], is: (id: string) => boolean): number {
  return ids.reduce((mask, id, index) => is(id) ? mask | 1 << index : mask, 0)
}

function sum(lots: readonly number[], sums: readonly (readonly number[])[], mask: number): number {
  let total = 0
  for (const lot of lots) total += sums[lot]![mask]!
  return total
}

function bits(mask: number): number {
  let count = 0
  for (let left = mask; left > 0; left &= left - 1) count++
  return count
}
