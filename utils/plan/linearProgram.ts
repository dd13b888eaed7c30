/** What a solver made of a program. `stopped`: its time was over; what it had found by then stands in the values, if anything. */
export interface Solution {
  status: 'optimal' | 'infeasible' | 'stopped'
  values: Readonly<Record<string, number>>
}

/** Solves a mixed-integer program in the LP format, within so many seconds. */
export type Solve = (program: string, limits: { seconds: number }) => Promise<Solution>

/** A sum of variables, each with its factor. */
export type Terms = readonly (readonly [factor: number, variable: string])[]

/** One condition of a program: its sum against a figure. */
export interface Row { terms: Terms, is: '<=' | '=' | '>=', figure: number }

/** A program before it is written out; variables that are no `binaries` are at least 0. Relaxed, a binary may lie between 0 and 1. */
export interface Program { goal: 'Minimize' | 'Maximize', aim: Terms, rows: readonly Row[], binaries: readonly string[], isRelaxed?: boolean }

/** The program as text in the LP format that solvers read. A sum without a term is left out of the rows, as it says nothing. */
export function programText({ goal, aim, rows, binaries, isRelaxed = false }: Program): string {
  return [
    goal, ` aim: ${sumText(aim)}`, 'Subject To',
    ...rows.filter(({ terms }) => terms.length > 0).map(({ terms, is, figure }, index) => ` r${index}: ${sumText(terms)} ${is} ${figure}`),
    ...(binaries.length > 0 ? [isRelaxed ? 'Bounds' : 'Binary', ...binaries.map(name => isRelaxed ? ` 0 <= ${name} <= 1` : ` ${name}`)] : []),
    'End', '',
  ].join('\n')
}

// A line of the format may only be so long.
const TERMS_ON_A_LINE = 12

function sumText(terms: Terms): string {
  const words = terms.map(([factor, variable]) => `${factor < 0 ? '-' : '+'} ${Math.abs(factor)} ${variable}`)
  return words.map((word, index) => index > 0 && index % TERMS_ON_A_LINE === 0 ? `\n  ${word}` : word).join(' ')
}

/** What a program's aim comes to by an answer. */
export function reached({ aim }: Program, { values }: Solution): number {
  return aim.reduce((sum, [factor, variable]) => sum + factor * (values[variable] ?? 0), 0)
}

/** Whether a variable of yes and no was chosen. */
export function isChosen({ values }: Solution, variable: string): boolean {
  return (values[variable] ?? 0) > 0.5
}
