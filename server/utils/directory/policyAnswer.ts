import { DEFAULT_FILL_POLICY } from '~~/utils/capacity/types'
import type { PolicyAnswer } from '~~/utils/contract/policy'
import { DEFAULT_RETEST_SETTINGS } from '~~/utils/requalification/retestSettings'
import { fillPolicyAt, retestAt } from './datedRules'
import type { Directory } from './directory'
import { firmRules } from './firmRules'

/** The firm's dated rules and its scales, as a screen needs them to judge by the same rules. */
export function policyAnswer(from: Directory, nowMs: number, rowsBehind: number): PolicyAnswer {
  return {
    asOf: nowMs,
    timeZone: from.timeZone,
    fillPolicies: [{ fromAt: 0, policy: DEFAULT_FILL_POLICY }, ...from.fillPolicies.map(({ fromAt, policy }) => ({ fromAt, policy }))],
    retests: [{ fromAt: 0, retest: DEFAULT_RETEST_SETTINGS }, ...from.retests.map(({ fromAt, retest }) => ({ fromAt, retest }))],
    fillPolicy: fillPolicyAt(from.fillPolicies, nowMs),
    retest: retestAt(from.retests, nowMs),
    rules: firmRules(from),
    rowsBehind,
    scales: [...from.scales.values()],
  }
}
