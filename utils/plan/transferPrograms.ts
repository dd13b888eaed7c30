import type { Program, Row, Terms } from './linearProgram'
import { mayGoOnto, type TransferProblem } from './transferProblem'

/** The variable by which a give is emptied, by its place among the gives. */
export const emptied = (give: number) => `e${give}`

/** The variable by which an empty cylinder is used for a lot, by its place among the takes. */
export const opened = (take: number) => `u${take}`

/** The variable by which something goes from a give into a take. */
export const goes = (give: number, take: number) => `y${give}_${take}`

const amount = (give: number, take: number) => `x${give}_${take}`

/**
 * The program by which the most cylinders come free. Only sums of lots count here: since contents may be parted, a choice
 * of cylinders can be emptied exactly where their sum finds room in those that stay.
 *
 * Shape: `freed` of the answer is the sum of the emptied less that of the empty ones used.
 */
export function mostFreed(problem: TransferProblem): Program {
  return { goal: 'Maximize', aim: freed(problem), rows: [...bySums(problem), ...once(problem)], binaries: choices(problem) }
}

/** The program by which so many come free with the fewest transfers that each by itself needs: no plan has fewer. */
export function fewestNeeded(problem: TransferProblem, count: number): Program {
  const parts = leastParts(problem)
  return {
    goal: 'Minimize',
    aim: parts.map((least, give) => [least, emptied(give)] as const),
    rows: [...bySums(problem), ...once(problem), { terms: freed(problem), is: '>=', figure: count }],
    binaries: choices(problem),
  }
}

/** The program that brings each emptied cylinder whole into one other, with exactly so many emptied and the fewest grams moved. */
export function eachWhole(problem: TransferProblem, count: number, emptiedCount: number): Program {
  const { gives, takes } = problem
  const ways = waysOf(problem)
  return {
    goal: 'Minimize',
    aim: gives.map(({ netGrams }, give) => [netGrams, emptied(give)] as const),
    rows: [
      ...gives.map((_, give): Row => ({ terms: [...ways.filter(way => way.give === give).map(way => [1, goes(give, way.take)] as const), [-1, emptied(give)]], is: '=', figure: 0 })),
      ...takes.map((_, take) => withinRoom(problem, take, ways.filter(way => way.take === take).map(({ give }) => [gives[give]!.netGrams, goes(give, take)] as const))),
      ...ways.map(({ give, take }) => onlyIntoKept(problem, give, take)),
      ...bySums(problem), ...once(problem),
      { terms: freed(problem), is: '>=', figure: count },
      { terms: gives.map((_, give) => [1, emptied(give)] as const), is: '=', figure: emptiedCount },
    ],
    binaries: [...choices(problem), ...ways.map(({ give, take }) => goes(give, take))],
  }
}

/** The program with the fewest transfers, at least so many, where contents may be parted. */
export function fewestTransfers(problem: TransferProblem, count: number, atLeast: number): Program {
  const transfers = waysOf(problem).map(({ give, take }) => [1, goes(give, take)] as const)
  return { goal: 'Minimize', aim: transfers, ...parted(problem, count, [{ terms: transfers, is: '>=', figure: atLeast }]) }
}

/** The program with the fewest grams moved by at most so many transfers, where contents may be parted. */
export function fewestGrams(problem: TransferProblem, count: number, atMost: number): Program {
  const transfers = waysOf(problem).map(({ give, take }) => [1, goes(give, take)] as const)
  return {
    goal: 'Minimize',
    aim: problem.gives.map(({ netGrams }, give) => [netGrams, emptied(give)] as const),
    ...parted(problem, count, [{ terms: transfers, is: '<=', figure: atMost }]),
  }
}

function parted(problem: TransferProblem, count: number, more: readonly Row[]): Pick<Program, 'rows' | 'binaries'> {
  const { gives, takes } = problem
  const ways = waysOf(problem)
  const most = (give: number, take: number) => Math.min(gives[give]!.netGrams, takes[take]!.roomGrams)
  return {
    rows: [
      ...gives.map(({ netGrams }, give): Row => ({ terms: [...ways.filter(way => way.give === give).map(way => [1, amount(give, way.take)] as const), [-netGrams, emptied(give)]], is: '=', figure: 0 })),
      ...takes.map((_, take) => withinRoom(problem, take, ways.filter(way => way.take === take).map(({ give }) => [1, amount(give, take)] as const))),
      ...ways.map(({ give, take }): Row => ({ terms: [[1, amount(give, take)], [-most(give, take), goes(give, take)]], is: '<=', figure: 0 })),
      ...leastParts(problem).map((least, give): Row => ({ terms: [...ways.filter(way => way.give === give).map(way => [1, goes(give, way.take)] as const), [-least, emptied(give)]], is: '>=', figure: 0 })),
      ...ways.flatMap(({ give, take }): Row[] => [
        onlyIntoKept(problem, give, take),
        { terms: [[1, goes(give, take)], [-1, emptied(give)]], is: '<=', figure: 0 },
      ]),
      ...bySums(problem), ...once(problem),
      { terms: freed(problem), is: '>=', figure: count },
      ...more,
    ],
    binaries: [...choices(problem), ...ways.map(({ give, take }) => goes(give, take))],
  }
}

/** Into how many others each give must go at least: as many of the largest rooms that it could have as hold all of it. */
export function leastParts(problem: TransferProblem): number[] {
  const ways = waysOf(problem)
  return problem.gives.map(({ netGrams }, give) => {
    const rooms = ways.filter(way => way.give === give).map(({ take }) => problem.takes[take]!.roomGrams).sort((a, b) => b - a)
    let parts = 0
    for (let left = netGrams; left > 0 && parts <= rooms.length; parts++) left -= rooms[parts] ?? 0
    return parts
  })
}

/** Which cylinder could be emptied into which, by their places in the lists. */
export function waysOf(problem: TransferProblem): { give: number, take: number }[] {
  const { gives, takes } = problem
  return gives.flatMap(({ id, lot }, give) => takes.flatMap((take, index) => take.id !== id && take.roomGrams > 0 && mayGoOnto(problem, lot, take.lot) ? [{ give, take: index }] : []))
}

function freed({ gives, takes }: TransferProblem): Terms {
  return [...gives.map((_, give) => [1, emptied(give)] as const), ...takes.flatMap(({ isEmpty }, take) => isEmpty ? [[-1, opened(take)] as const] : [])]
}

function choices({ gives, takes }: TransferProblem): string[] {
  return [...gives.map((_, give) => emptied(give)), ...takes.flatMap(({ isEmpty }, take) => isEmpty ? [opened(take)] : [])]
}

// What all emptied cylinders of a lot hold goes to lots that take it, and all of that finds room in the cylinders that stay.
function bySums(problem: TransferProblem): Row[] {
  const { gives, takes, onto } = problem
  const from = [...new Set(gives.map(({ lot }) => lot))]
  const to = [...new Set([...takes.map(({ lot }) => lot), ...from])]
  const sums = from.flatMap((lot, a) => to.flatMap((other, b) => mayGoOnto({ gives, takes, onto }, lot, other) ? [{ lot, other, variable: `s${a}_${b}` }] : []))
  return [
    ...from.map((lot): Row => ({
      terms: [...sums.filter(sum => sum.lot === lot).map(({ variable }) => [1, variable] as const), ...gives.flatMap((give, index) => give.lot === lot ? [[-give.netGrams, emptied(index)] as const] : [])],
      is: '=', figure: 0,
    })),
    ...to.map((lot): Row => {
      const rooms = takes.flatMap((take, index) => take.lot === lot ? [roomTerm(problem, index)] : [])
      return {
        terms: [...sums.filter(sum => sum.other === lot).map(({ variable }) => [1, variable] as const), ...rooms.flatMap(({ terms }) => terms)],
        is: '<=', figure: rooms.reduce((sum, { figure }) => sum + figure, 0),
      }
    }),
  ]
}

/** The room of a take as it stands on the left of a condition: none in one that is emptied or not opened. */
function roomTerm({ gives, takes }: TransferProblem, take: number): { terms: Terms, figure: number } {
  const { id, roomGrams, isEmpty } = takes[take]!
  if (isEmpty) return { terms: [[-roomGrams, opened(take)]], figure: 0 }
  const give = gives.findIndex(one => one.id === id)
  return { terms: give < 0 ? [] : [[roomGrams, emptied(give)]], figure: roomGrams }
}

function withinRoom(problem: TransferProblem, take: number, into: Terms): Row {
  const { terms, figure } = roomTerm(problem, take)
  return { terms: into.length > 0 ? [...into, ...terms] : [], is: '<=', figure }
}

// Said of each way by itself, it leaves the solver far less to try than the rooms alone.
function onlyIntoKept({ gives, takes }: TransferProblem, give: number, take: number): Row {
  const { id, isEmpty } = takes[take]!
  if (isEmpty) return { terms: [[1, goes(give, take)], [-1, opened(take)]], is: '<=', figure: 0 }
  const own = gives.findIndex(one => one.id === id)
  return { terms: own < 0 ? [] : [[1, goes(give, take)], [1, emptied(own)]], is: '<=', figure: 1 }
}

// An empty cylinder serves one lot.
function once({ takes }: TransferProblem): Row[] {
  const ids = [...new Set(takes.filter(({ isEmpty }) => isEmpty).map(({ id }) => id))]
  return ids.map(id => ({ terms: takes.flatMap((take, index) => take.isEmpty && take.id === id ? [[1, opened(index)] as const] : []), is: '<=', figure: 1 }))
}
