import { isChosen, programText, reached, type Program, type Solution, type Solve } from './linearProgram'
import { alongWays, poured, type Choice } from './poured'
import { faultOf, freedBy, type Transfer, type TransferProblem } from './transferProblem'
import { eachWhole, emptied, fewestGrams, fewestNeeded, fewestTransfers, goes, leastParts, mostFreed, opened, waysOf } from './transferPrograms'

/**
 * The transfers by which the most cylinders come free, of those the fewest, of those the ones that move the fewest grams.
 *
 * Shape: `mostFreed` and `fewestTransfers` are what no plan can pass. Where the plan reaches both it is the best there is.
 */
export interface Consolidation {
  transfers: Transfer[]
  freed: number
  mostFreed: number
  fewestTransfers: number
}

const NOTHING_TO_FREE: Consolidation = { transfers: [], freed: 0, mostFreed: 0, fewestTransfers: 0 }

/** With more ways than these (70 cylinders of one lot) a solver is still reading its program when its time is over. */
const MOST_WAYS = 5_000

/** So few are worked out to the end: each step may take all of the time, of which it takes a fraction of a second. */
const EXACT_UP_TO = 12

/** How the seconds for a larger plan are shared among its steps. */
const SHARES = { freed: 0.2, emptied: 0.15, whole: 0.3, parted: 0.25, grams: 0.1 }

/**
 * Searches the best transfers within a time. Each source is emptied whole, into several cylinders where that frees more;
 * what is only moved between two that stay frees nothing.
 *
 * Rounding: whole grams throughout.
 */
export async function consolidate(problem: TransferProblem, solve: Solve, seconds: number): Promise<Consolidation> {
  const ways = waysOf(problem).length
  if (ways === 0) return NOTHING_TO_FREE
  const isSmall = new Set([...problem.gives, ...problem.takes].map(({ id }) => id)).size <= EXACT_UP_TO
  const ask = (program: Program, step: keyof typeof SHARES) => solve(programText(program), { seconds: isSmall ? seconds : seconds * SHARES[step] })

  const most = await ask(mostFreed(problem), 'freed')
  const first = bestOf(problem, [pouredBy(problem, choiceOf(problem, most))])
  const bound = most.status === 'optimal' ? first.freed : await boundOf(mostFreed(problem), problem.gives.length, program => ask(program, 'grams'))
  if (first.freed === 0) return { ...NOTHING_TO_FREE, mostFreed: bound }

  const parts = leastParts(problem)
  const fewest = await ask(fewestNeeded(problem, first.freed), 'emptied')
  const atLeast = fewest.status === 'optimal' ? problem.gives.reduce((sum, _, give) => isChosen(fewest, emptied(give)) ? sum + parts[give]! : sum, 0) : first.freed
  const found = [first.transfers, pouredBy(problem, choiceOf(problem, fewest))]
  const answer = (): Consolidation => ({ ...bestOf(problem, found), mostFreed: bound, fewestTransfers: atLeast })

  if (ways > MOST_WAYS) return answer()

  const whole = await ask(eachWhole(problem, first.freed, atLeast), 'whole')
  found.push(byWays(problem, whole))
  if (answer().transfers.length === atLeast) return answer()

  // Where each has room for all of it somewhere and yet no plan brings each whole into another, it takes one transfer more.
  const needed = whole.status === 'infeasible' && parts.every(least => least === 1) ? atLeast + 1 : atLeast
  const parted = await ask(fewestTransfers(problem, first.freed, needed), 'parted')
  found.push(byWays(problem, parted))
  const few = answer().transfers.length
  const proven = parted.status === 'optimal' ? few : needed
  if (parted.status === 'optimal') found.push(byWays(problem, await ask(fewestGrams(problem, first.freed, few), 'grams')))
  return { ...answer(), fewestTransfers: proven }
}

/** What no plan can pass, by the program with parts of cylinders allowed; else the most there are. */
async function boundOf(program: Program, most: number, ask: (program: Program) => Promise<Solution>): Promise<number> {
  const relaxed = { ...program, isRelaxed: true }
  const solution = await ask(relaxed)
  return solution.status === 'optimal' ? Math.min(most, Math.floor(reached(relaxed, solution) + NOISE)) : most
}

// Keeps 26.9999999 from becoming 26.
const NOISE = 1e-6

function choiceOf({ gives, takes }: TransferProblem, solution: Solution): Choice {
  return {
    emptied: gives.filter((_, give) => isChosen(solution, emptied(give))),
    opened: takes.filter((take, index) => take.isEmpty && isChosen(solution, opened(index))),
  }
}

function pouredBy(problem: TransferProblem, choice: Choice): Transfer[] {
  return poured(problem, choice) ?? []
}

// The solver reckons with fractions; of its answer only the choices are taken, and the grams are reckoned anew.
function byWays(problem: TransferProblem, solution: Solution): Transfer[] {
  const choice = choiceOf(problem, solution)
  const ways = waysOf(problem).filter(({ give, take }) => isChosen(solution, goes(give, take)))
    .map(({ give, take }) => ({ fromId: problem.gives[give]!.id, toId: problem.takes[take]!.id }))
  const staying = problem.takes.filter(({ id, isEmpty }) => !isEmpty && !choice.emptied.some(give => give.id === id))
  const rooms = new Map([...staying, ...choice.opened].map(({ id, roomGrams }) => [id, roomGrams]))
  return alongWays(choice.emptied, rooms, ways) ?? []
}

/** The best of several, leaving out what does not hold against the problem. */
function bestOf(problem: TransferProblem, found: readonly Transfer[][]): { transfers: Transfer[], freed: number } {
  const grams = (transfers: readonly Transfer[]) => transfers.reduce((sum, one) => sum + one.grams, 0)
  const [best] = found
    .filter(transfers => faultOf(problem, transfers) === null)
    .map(transfers => ({ transfers, freed: freedBy(problem, transfers) }))
    .sort((a, b) => b.freed - a.freed || a.transfers.length - b.transfers.length || grams(a.transfers) - grams(b.transfers))
  return best ?? { transfers: [], freed: 0 }
}
