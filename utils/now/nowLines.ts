import type { Permission } from '../access/permissions'
import type { NowLine } from '../contract/now'
import type { Reader } from '../fleet/fleetText'
import { cylinderLines } from './cylinderLines'
import { deskLines } from './deskLines'
import type { NowFacts } from './nowFacts'
import { topicOrder, type NowTopic } from './nowTopics'
import { logLines } from './logLines'
import { recordLines } from './recordLines'

/** Who reads what waits, and what that person may do about it. */
export interface NowReader extends Reader { mayI: (permission: Permission) => boolean }

/** A line before it is put among the others; what follows the topic in its key tells two of one topic apart. */
export interface DraftLine extends Omit<NowLine, 'key' | 'topic'> { topic: NowTopic, which?: string }

/**
 * What waits for a person, each in a sentence with one verb; the most urgent first, and nothing that is not so.
 *
 * Rounding: an excess up, what is in cylinders to the nearest division.
 */
export function nowLines(facts: NowFacts, topics: ReadonlySet<NowTopic>, reader: NowReader): NowLine[] {
  return [...cylinderLines(facts, reader), ...deskLines(facts, reader), ...logLines(facts, reader), ...recordLines(facts, reader)]
    .filter(({ topic, number }) => topics.has(topic) && number > 0)
    .sort((a, b) => topicOrder(a.topic, b.topic))
    .map(({ which, ...line }) => ({ ...line, key: which === undefined ? line.topic : `${line.topic} ${which}` }))
}
