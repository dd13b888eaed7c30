import type { Finding, FindingCode } from '../finding'

// What can hurt somebody first, then what keeps a cylinder from use, then what wants doing.
const URGENCY: readonly FindingCode[] = [
  'overfill', 'condemned', 'after-end', 'pressure-class', 'not-refillable', 'spec-not-for-gas', 'not-marked-flammable',
  'second-refrigerant', 'unknown-onto-known', 'tested-full', 'early-test', 'rejected', 'quarantined', 'wet',
  'retest-overdue', 'retest-unknown', 'code-on-two', 'unsupervised', 'away', 'owner-change', 'not-shippable',
  'not-registered', 'registered-twice', 'half-transfer', 'transfer-unbalanced', 'weigh-again', 'gas-excess', 'nearly-full', 'weight-not-known', 'toxic', 'two-owners', 'owner-consent', 'retest-soon',
  'old-tare-on-label', 'not-seen', 'unsigned', 'late-change', 'clock-doubtful', 'look-before-fill', 'system-dependent-limit', 'found-by-use',
]

/** Which of two findings a person reads first: a stop before a caution, then what can hurt. */
export function urgencyOrder(a: Pick<Finding, 'code' | 'severity'>, b: Pick<Finding, 'code' | 'severity'>): number {
  if (a.severity !== b.severity) return a.severity === 'stop' ? -1 : 1
  return URGENCY.indexOf(a.code) - URGENCY.indexOf(b.code)
}
