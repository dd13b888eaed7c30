import loadHighs from 'highs'
import type { Solve } from '~~/utils/plan/linearProgram'

const highs = await loadHighs()

/** The solver that the server uses, in the thread of the test. */
export const solveHere: Solve = async (program, { seconds }) => {
  const { Status, Columns } = highs.solve(program, { time_limit: seconds, output_flag: false, mip_rel_gap: 0, mip_abs_gap: 0.5 })
  const values = Object.fromEntries(Object.entries(Columns).map(([name, column]) => [name, 'Primal' in column ? column.Primal : 0]))
  return { status: Status === 'Optimal' ? 'optimal' : Status === 'Infeasible' ? 'infeasible' : 'stopped', values }
}
