import type { FleetQuery } from '../contract/custody'
import type { NowTopic } from './nowTopics'

/** The filters of the fleet that a topic counts by: its line opens the list of just these cylinders. */
export type FleetQuestion = Pick<Partial<FleetQuery>, 'finding' | 'lifecycle' | 'holder'>

const WHOLE_FLEET = {
  'overfilled': { finding: 'overfill' },
  'two-refrigerants': { finding: 'second-refrigerant' },
  'unknown-mixed': { finding: 'unknown-onto-known' },
  'code-on-two': { finding: 'code-on-two' },
  'late': { finding: 'retest-overdue', lifecycle: 'in-service' },
  'no-test-date': { finding: 'retest-unknown', lifecycle: 'in-service' },
  'rejected': { lifecycle: 'rejected' },
  'condemned': { lifecycle: 'condemned' },
  'not-seen': { finding: 'not-seen' },
  'unweighed': { finding: 'weight-not-known', lifecycle: 'in-service' },
  'wet': { finding: 'wet', lifecycle: 'in-service' },
  'soon': { finding: 'retest-soon', lifecycle: 'in-service' },
  'old-tare': { finding: 'old-tare-on-label', lifecycle: 'in-service' },
} as const satisfies Partial<Record<NowTopic, FleetQuestion>>

const HELD = {
  'held-overfilled': { finding: 'overfill' },
  'held-stop': { finding: 'stop' },
  'held-late': { finding: 'retest-overdue' },
  'held-unweighed': { finding: 'weight-not-known' },
  'held-full': { finding: 'nearly-full', lifecycle: 'in-service' },
  'held-soon': { finding: 'retest-soon' },
} as const satisfies Partial<Record<NowTopic, FleetQuestion>>

/** A topic about cylinders that a filter of the fleet finds. */
export type FleetTopic = keyof typeof WHOLE_FLEET | keyof typeof HELD

/** The questions behind a person's topics: of the whole fleet, and of what that person holds. */
export function fleetQuestions(topics: ReadonlySet<NowTopic>, personId: string): [FleetTopic, FleetQuestion][] {
  const all: [FleetTopic, FleetQuestion][] = [
    ...Object.entries(HELD).map(([topic, question]): [FleetTopic, FleetQuestion] => [topic as FleetTopic, { ...question, holder: personId }]),
    ...Object.entries(WHOLE_FLEET).map(([topic, question]): [FleetTopic, FleetQuestion] => [topic as FleetTopic, question]),
  ]
  return all.filter(([topic]) => topics.has(topic))
}
