import { cylinderPath } from '../fleet/cylinderPath'
import { formatMass } from '../quantity/mass'
import { formatMonth } from '../quantity/month'
import { cylinderName } from '../shipment/changedLines'
import type { FleetQuestion, FleetTopic } from './fleetQuestions'
import type { CylinderFacts, NowFacts } from './nowFacts'
import type { DraftLine, NowReader } from './nowLines'
import { counted, listed } from './phrase'

/** What a topic about cylinders says. An act that is named is one form of the one cylinder; without it its page is opened. */
interface Words {
  kind: DraftLine['kind']
  sentence: (found: CylinderFacts, all: NowFacts, reader: NowReader) => string
  reason: (found: CylinderFacts, all: NowFacts, reader: NowReader) => string
  verb: string
  act?: 'drawn' | 'weighed' | 'moved' | 'emptied'
}

const cylinders = (count: number, one: string, many: string) => counted(count, `cylinder ${one}`, `cylinders ${many}`)
const held = (count: number, one: string, many: string) => counted(count, `that you hold ${one}`, `that you hold ${many}`)

const LATE_REASON = 'An empty one goes to its test before it is filled again; one with something in it is emptied or shipped first.'
const UNWEIGHED_REASON = 'Not weighed: no room can be given.'

const WORDS: Record<FleetTopic, Words> = {
  'overfilled': {
    kind: 'stop', verb: 'Draw it down', act: 'drawn', sentence: (found, _, reader) => `${cylinders(found.count, 'is', 'are')} overfilled${excess(found, reader)}.`,
    reason: found => `${whatAndWhere(found)}. Keep ${it(found)} cool and off the road until drawn down.`,
  },
  'held-overfilled': {
    kind: 'stop', verb: 'Draw it down', act: 'drawn', sentence: (found, _, reader) => `${held(found.count, 'is', 'are')} overfilled${excess(found, reader)}.`,
    reason: found => `${whatAndWhere(found)}. Keep ${it(found)} cool and do not drive with ${it(found)}.`,
  },
  'held-stop': {
    kind: 'stop', verb: 'See why', sentence: found => `${held(found.count, 'is', 'are')} under a stop.`,
    reason: found => `${whatAndWhere(found)}. Put nothing into ${it(found)}.`,
  },
  'two-refrigerants': {
    kind: 'stop', verb: 'See what to do', sentence: found => `${cylinders(found.count, 'holds', 'hold')} two refrigerants.`,
    reason: found => `${whatAndWhere(found)}. No fill limit can be given: set ${it(found)} apart and ask the reclaimer.`,
  },
  'unknown-mixed': {
    kind: 'stop', verb: 'See what to do', sentence: found => `${cylinders(found.count, 'had', 'had')} something unknown put in.`,
    reason: found => `${whatAndWhere(found)}. Put nothing more into ${it(found)} until it is analysed.`,
  },
  'code-on-two': {
    kind: 'stop', verb: 'See which', sentence: found => `${cylinders(found.count, 'shares its label', 'share their labels')} with another.`,
    reason: found => `${whatAndWhere(found)}. Compare the serials, and put a new label on the one of each two that had it later.`,
  },
  'late': {
    kind: 'stop', verb: 'Open it', sentence: found => `${counted(found.count, 'retest is', 'retests are')} late.`, reason: lateReason,
  },
  'held-late': {
    kind: 'stop', verb: 'Bring it back', act: 'moved', sentence: found => `${held(found.count, 'is late for its retest', 'are late for their retest')}.`,
    reason: found => `${whatAndWhere(found)}. ${LATE_REASON}`,
  },
  'no-test-date': {
    kind: 'stop', verb: 'See why', sentence: found => `${cylinders(found.count, 'has', 'have')} no known test date.`,
    reason: found => `${whatAndWhere(found)}. Not to be filled until the mark on the steel is read.`,
  },
  'rejected': {
    kind: 'stop', verb: 'Decide about it', sentence: found => `${cylinders(found.count, 'was', 'were')} rejected at the test.`,
    reason: found => `${whatAndWhere(found)}. Not to be filled: have ${it(found)} repaired and tested again, or take ${it(found)} out of use.`,
  },
  'condemned': {
    kind: 'stop', verb: 'Take it out of use', sentence: found => `${cylinders(found.count, 'is', 'are')} condemned.`,
    reason: found => `${whatAndWhere(found)}. Never to be filled again; record what becomes of ${it(found)}.`,
  },
  'not-seen': {
    kind: 'unk', verb: 'Look for it', sentence: ({ count }, { unseen }) => `${cylinders(count, 'was', 'were')} not seen for ${unseen ? `${unseen.days} days` : 'long'}.`,
    reason: unseenReason,
  },
  'unweighed': {
    kind: 'unk', verb: 'Weigh it', act: 'weighed', sentence: found => `${cylinders(found.count, 'is', 'are')} without a known weight.`,
    reason: found => `${whatAndWhere(found)}. ${UNWEIGHED_REASON}`,
  },
  'held-unweighed': {
    kind: 'unk', verb: 'Weigh it', act: 'weighed', sentence: found => `${held(found.count, 'has', 'have')} no known weight.`,
    reason: found => `${whatAndWhere(found)}. ${UNWEIGHED_REASON}`,
  },
  'held-full': {
    kind: 'att', verb: 'Bring it back', act: 'moved', sentence: found => `${held(found.count, 'is', 'are')} full or nearly full.`,
    reason: (found, _, { unit }) => `${whatAndWhere(found)}, ${formatMass(found.netGrams, unit, 'nearest')} net${found.count === 1 ? '' : ' in all'}. Take an empty one along instead.`,
  },
  'wet': {
    kind: 'att', verb: 'Evacuate it', act: 'emptied', sentence: found => `${cylinders(found.count, 'is', 'are')} wet inside.`,
    reason: found => `${whatAndWhere(found)}. Evacuate before the next fill.`,
  },
  'soon': {
    kind: 'att', verb: 'Plan its test', sentence: (found, { lastSoonMonth }) => `${counted(found.count, 'retest falls', 'retests fall')} due by the end of ${formatMonth(lastSoonMonth)}.`,
    reason: found => `${found.count - found.withContents} with nothing in ${found.count === 1 ? 'it' : 'them'} could go to the test station now.`,
  },
  'held-soon': {
    kind: 'att', verb: 'Open it', sentence: (found, { lastSoonMonth }) => `${held(found.count, 'is', 'are')} due for the retest by the end of ${formatMonth(lastSoonMonth)}.`,
    reason: found => `${whatAndWhere(found)}. Bring ${it(found)} back in time.`,
  },
  'old-tare': {
    kind: 'att', verb: 'Print a new label', sentence: found => `${cylinders(found.count, 'wears', 'wear')} an old tare on the label.`,
    reason: found => `${whatAndWhere(found)}. Whoever fills by the label stops at a wrong weight.`,
  },
}

const VERBS_FOR_MANY: Partial<Record<FleetTopic, string>> = {
  'held-late': 'Show which', 'held-full': 'Show which', 'held-soon': 'Show which', 'not-seen': 'Look for them', 'soon': 'Plan their tests', 'old-tare': 'Print new labels',
}

/** The lines about cylinders that a filter of the fleet finds. */
export function cylinderLines(facts: NowFacts, reader: NowReader): DraftLine[] {
  return Object.entries(facts.cylinders).flatMap(([name, found]) => {
    const topic = name as FleetTopic
    const shown = topic === 'held-stop' ? withoutOwnLine(found, facts) : found
    const [first] = shown.first
    if (shown.count <= 0 || first === undefined) return []
    const words = WORDS[topic]
    const one = shown.count === 1 && shown.count === found.count
    return {
      topic, kind: words.kind, number: shown.count,
      sentence: words.sentence(shown, facts, reader),
      reason: words.reason(shown, facts, reader),
      verb: one ? words.verb : VERBS_FOR_MANY[topic] ?? `Show the ${found.count}`,
      to: pathOf(topic, shown, one && words.act ? `${cylinderPath(first)}/act/${words.act}` : one ? cylinderPath(first) : null),
    }
  })
}

/** The fleet's list by these filters. */
export function fleetPath(question: FleetQuestion): string {
  return `/fleet?${Object.entries(question).map(([key, value]) => `${key}=${encodeURIComponent(value)}`).join('&')}`
}

function pathOf(topic: FleetTopic, found: CylinderFacts, ofOne: string | null): string {
  if (topic === 'soon') return '/retests'
  if (topic === 'old-tare') return `/labels?cylinders=${found.first.map(({ id }) => id).join(',')}`
  return ofOne ?? fleetPath(found.question)
}

// Overfilled ones and empty ones late for their retest have lines of their own, and none is both.
function withoutOwnLine(found: CylinderFacts, { cylinders: { 'held-overfilled': overfilled, 'held-late': late } }: NowFacts): CylinderFacts {
  return { ...found, count: found.count - (overfilled?.count ?? 0) - (late ? late.count - late.withContents : 0) }
}

function excess({ count, first: [first] }: CylinderFacts, { unit }: NowReader): string {
  if (first?.netGrams == null || first.fillLimitGrams === null || first.netGrams <= first.fillLimitGrams) return ''
  return `, ${count === 1 ? '' : 'the first '}by ${formatMass(first.netGrams - first.fillLimitGrams, unit, 'up')}`
}

function whatAndWhere({ first: [first] }: CylinderFacts): string {
  return first ? [cylinderName(first), first.refrigerant, first.place?.name].filter(Boolean).join(', ') : ''
}

function it({ count }: CylinderFacts): string {
  return count === 1 ? 'it' : 'them'
}

function lateReason(found: CylinderFacts, _: NowFacts, { unit }: NowReader): string {
  if (found.withContents === 0) return `${whatAndWhere(found)}. Empty: not to be filled before the test.`
  const which = found.count === 1 ? 'It still holds' : `${found.withContents} of them still ${found.withContents === 1 ? 'holds' : 'hold'}`
  return `${which} ${found.netGrams > 0 ? formatMass(found.netGrams, unit, 'nearest') : 'something'}. ${LATE_REASON}`
}

function unseenReason(found: CylinderFacts, { unseen }: NowFacts): string {
  if (!unseen) return whatAndWhere(found)
  const holders = unseen.holders.map(({ name, count }) => `${name ?? 'nobody'} (${count})`)
  const long = unseen.longCount > 0 ? ` ${unseen.longCount} for ${unseen.longDays} days or more: missing?` : ''
  return `${found.count === 1 ? `${whatAndWhere(found)}, last ${unseen.holders[0]?.name ? `with ${unseen.holders[0].name}` : 'with nobody'}` : `Last with ${listed(holders)}`}.${long}`
}
