import type { PolicyAnswer } from '~~/utils/contract/custody'
import { DEFAULT_FILL_POLICY } from '~~/utils/capacity/types'
import type { Directory } from './directory'

/** The firm's dated rules and its scales, as a screen needs them to judge by the same rules. */
export function policyAnswer(from: Directory): PolicyAnswer {
  return {
    timeZone: from.timeZone,
    // The rule that holds before the firm sets one of its own.
    fillPolicies: [{ fromAt: 0, policy: DEFAULT_FILL_POLICY }, ...from.fillPolicies],
    retest: from.retest,
    scales: [...from.scales.values()],
  }
}
