import { parentPort } from 'node:worker_threads'
import loadHighs from 'highs'

const highs = await loadHighs()

const STATUSES = { Optimal: 'optimal', Infeasible: 'infeasible' }

parentPort.on('message', ({ program, seconds }) => parentPort.postMessage(solved(program, seconds)))

/** The answer to a program in the LP format. All that is asked counts in whole steps, so half a step is near enough to the best. */
function solved(program, seconds) {
  const { Status, Columns } = highs.solve(program, { time_limit: seconds, output_flag: false, mip_rel_gap: 0, mip_abs_gap: 0.5 })
  const values = Object.fromEntries(Object.entries(Columns).map(([name, { Primal }]) => [name, Primal ?? 0]))
  return { status: STATUSES[Status] ?? 'stopped', values }
}
