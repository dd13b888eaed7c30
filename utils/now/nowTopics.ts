import type { Role } from '../access/roles'

/** Every sort of thing that may wait for somebody, the most urgent first: what can hurt, what keeps from use, what wants doing. */
export const NOW_TOPICS = [
  'held-overfilled', 'overfilled', 'van-load', 'held-stop', 'two-refrigerants', 'unknown-mixed', 'code-on-two', 'log-broken',
  'held-late', 'late', 'no-test-date', 'rejected', 'condemned', 'vans-short', 'not-seen', 'held-unweighed', 'unweighed', 'held-full', 'full', 'worth-pick-up', 'few-empty',
  'shipments-ready', 'shipments-away', 'lots-away', 'papers-differ', 'came-late', 'to-countersign', 'unsigned', 'plan-steps', 'shipment-drafts', 'lot-drafts', 'wet', 'soon', 'held-soon', 'unlabelled', 'old-tare',
  'scale-checks', 'rule-begins', 'log-unchecked', 'doubtful-times', 'late-entries', 'corrections', 'mail-failed', 'uncertified', 'not-taken-up',
  'no-shop', 'no-reclaimer', 'no-test-station', 'vans-without-technician',
] as const

/** A sort of thing that may wait for somebody. */
export type NowTopic = (typeof NOW_TOPICS)[number]

const TOPICS_OF: Record<Role, readonly NowTopic[]> = {
  technician: ['held-overfilled', 'van-load', 'held-stop', 'held-late', 'held-unweighed', 'held-full', 'to-countersign', 'plan-steps', 'held-soon'],
  warehouse: [
    'overfilled', 'two-refrigerants', 'unknown-mixed', 'code-on-two', 'late', 'no-test-date', 'vans-short', 'unweighed', 'full', 'worth-pick-up', 'few-empty',
    'shipments-away', 'lots-away', 'plan-steps', 'shipment-drafts', 'lot-drafts', 'wet', 'soon', 'unlabelled', 'old-tare',
  ],
  manager: [
    'overfilled', 'two-refrigerants', 'unknown-mixed', 'code-on-two', 'log-broken', 'late', 'no-test-date', 'rejected', 'condemned',
    'vans-short', 'not-seen', 'unweighed', 'full', 'worth-pick-up', 'few-empty', 'shipments-ready', 'shipments-away', 'lots-away', 'papers-differ', 'came-late', 'unsigned', 'plan-steps', 'shipment-drafts', 'lot-drafts',
    'scale-checks', 'rule-begins', 'not-taken-up',
  ],
  auditor: ['log-broken', 'log-unchecked', 'doubtful-times', 'late-entries', 'corrections'],
  admin: ['scale-checks', 'mail-failed', 'uncertified', 'not-taken-up', 'no-shop', 'no-reclaimer', 'no-test-station', 'vans-without-technician'],
}

/** What may wait for a person of these roles. */
export function topicsFor(roles: readonly Role[]): ReadonlySet<NowTopic> {
  return new Set(roles.flatMap(role => TOPICS_OF[role]))
}

/** Which of two topics a person reads first. */
export function topicOrder(a: NowTopic, b: NowTopic): number {
  return NOW_TOPICS.indexOf(a) - NOW_TOPICS.indexOf(b)
}
