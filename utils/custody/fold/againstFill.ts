import { fitFindings } from '../../capacity/fit'
import type { Finding } from '../finding'
import { holdFinding } from '../findings/holds'
import { retestOverdue, retestUnknown } from '../findings/retest'
import { retestOf } from '../retestOf'
import type { Turn } from './turn'

/** What spoke against putting a refrigerant in at the time of a fill: the plan would have been refused, the fact is kept. */
export function againstFill(turn: Turn, refrigerant: string | null): Finding[] {
  const { state, context, event } = turn
  if (state.stamp === null) return []
  const fit = fitFindings({ stamp: state.stamp, refrigerant, catalogue: context.catalogue })
  return [
    ...fit.map(finding => ({ ...finding, since: null })),
    ...state.holds.map(holdFinding),
    ...againstDate(turn, event.effectiveAt),
  ]
}

function againstDate({ state, context }: Turn, at: number): Finding[] {
  const retest = retestOf(state, { nowMs: at, timeZone: context.timeZone, rules: context.retestAt(at) })
  if (retest.state === 'unknown') return [retestUnknown()]
  return retest.state === 'overdue' && retest.dueMonth !== null ? [retestOverdue(retest.dueMonth, { severity: 'stop', nothingInIt: false })] : []
}
