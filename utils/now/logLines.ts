import { cylinderPath } from '../fleet/cylinderPath'
import { daysBetween, formatNear } from '../quantity/instant'
import { cylinderName } from '../shipment/changedLines'
import { fleetPath } from './cylinderLines'
import type { EntryFacts, LateFacts, LogCheckFacts, NowFacts, PaperFacts, UnsignedFacts } from './nowFacts'
import type { DraftLine, NowReader } from './nowLines'
import { counted, listed } from './phrase'

/** The log is checked again after so many days: common practice, no source. */
const CHECKED_FOR_DAYS = 7

/** The lines about the custody log itself: what waits for a signature, whether it was checked, and what of this week wants a second look. */
export function logLines({ toCountersign, unsigned = [], cameLate, papersDiffer = [], logCheck, entries }: NowFacts, reader: NowReader): DraftLine[] {
  return [
    toCountersign && toCountersignLine(toCountersign),
    unsignedLine(unsigned),
    cameLate && cameLateLine(cameLate),
    ...papersDiffer.map(papersLine),
    logCheck && checkLine(logCheck, reader),
    entries && entryLine('doubtful-times', entries.doubtful, ['entry came from a clock that was off', 'entries came from clocks that were off'], 'Both times are kept; compare them with the paper.'),
    entries && entryLine('late-entries', entries.late, ['entry was recorded', 'entries were recorded'], 'Compare with the paper of that day.', ' more than a day late'),
    entries && entryLine('corrections', entries.corrected, ['entry was corrected', 'entries were corrected'], 'Each says its reason, and the first reading is kept.'),
  ].filter(line => !!line)
}

function toCountersignLine({ count, cylinders }: UnsignedFacts): DraftLine {
  return {
    topic: 'to-countersign', kind: 'att', number: count,
    sentence: `${counted(count, 'entry of a trainee waits', 'entries of trainees wait')} for your signature.`,
    reason: `${listed(cylinders.map(cylinderName))}. Until you sign, no total that the law asks for counts ${count === 1 ? 'it' : 'them'}.`,
    verb: count === 1 ? 'Read and sign it' : 'Read and sign them', to: '/countersign',
  }
}

function unsignedLine(all: readonly UnsignedFacts[]): DraftLine | null {
  const number = all.reduce((sum, { count }) => sum + count, 0)
  const cylinders = all.flatMap(one => one.cylinders)
  const [first] = cylinders
  const many = new Set(cylinders.map(({ id }) => id)).size
  if (number === 0) return null
  return {
    topic: 'unsigned', kind: 'att', number,
    sentence: `${counted(number, 'entry of a trainee is', 'entries of trainees are')} not countersigned${many > 1 ? `, on ${many} cylinders` : ''}.`,
    reason: `${listed(all.map(({ supervisor, count }) => supervisor === null ? `${count} without a supervisor` : `${count} with ${supervisor}`))}. No total that the law asks for counts ${number === 1 ? 'it' : 'them'}.`,
    ...first && many === 1
      ? { verb: 'Read it', to: `${cylinderPath(first)}/log` }
      : { verb: `Show the ${many} cylinders`, to: fleetPath({ finding: 'unsigned' }) },
  }
}

function cameLateLine({ count, lines, cylinders }: LateFacts): DraftLine | null {
  const [first] = cylinders
  if (!first) return null
  return {
    topic: 'came-late', kind: 'att', number: count,
    sentence: `${counted(count, 'entry', 'entries')} came late or ${count === 1 ? 'was' : 'were'} corrected, and ${counted(lines, 'line says', 'lines say')} something else since.`,
    reason: `${listed(cylinders.map(cylinderName))}, this week. Look whether what was done by the older figures was right.`,
    verb: cylinders.length === 1 ? 'See what changed' : 'See the newest', to: `${cylinderPath(first)}/log`,
  }
}

function papersLine({ id, number, lines }: PaperFacts): DraftLine {
  return {
    topic: 'papers-differ', which: id, kind: 'att', number: lines,
    sentence: `The papers of shipment ${String(number).padStart(4, '0')} differ from the log.`,
    reason: `${counted(lines, 'line was', 'lines were')} changed by what was recorded after it left. The papers stay as they were sent; tell the reclaimer.`,
    verb: 'Compare them', to: `/shipments/${id}`,
  }
}

function checkLine({ last, newEvents }: LogCheckFacts, { now, timeZone }: NowReader): DraftLine | null {
  const shared = { number: 1, to: '/log' }
  const since = newEvents === 0 ? 'Nothing was recorded since.' : `${counted(newEvents, 'line was', 'lines were')} recorded since.`
  if (last === null) {
    return newEvents === 0 ? null : { ...shared, topic: 'log-unchecked', kind: 'att', sentence: 'The custody log was never checked.', reason: `${counted(newEvents, 'line stands', 'lines stand')} in it.`, verb: 'Check the log' }
  }
  if (!last.isOk) {
    return { ...shared, topic: 'log-broken', kind: 'stop', sentence: 'The custody log does not add up.', reason: `Found ${formatNear(last.at, timeZone, now)}: a line was changed or taken out after it was recorded.`, verb: 'See where' }
  }
  const days = daysBetween(last.at, now, timeZone)
  return days < CHECKED_FOR_DAYS ? null : { ...shared, topic: 'log-unchecked', kind: 'att', sentence: `The custody log was last checked ${days} days ago.`, reason: `It added up then. ${since}`, verb: 'Check the log' }
}

function entryLine(
  topic: 'doubtful-times' | 'late-entries' | 'corrections', { count, cylinders, newest }: EntryFacts, [one, many]: [string, string], why: string, how = '',
): DraftLine | null {
  if (count === 0 || newest === null) return null
  return {
    topic, kind: 'att', number: count,
    sentence: `${counted(count, one, many)}${how} this week.`,
    reason: `${cylinders === 1 ? `On ${cylinderName(newest)}` : `On ${cylinders} cylinders, the newest on ${cylinderName(newest)}`}. ${why}`,
    verb: count === 1 ? 'Read it' : 'Read the newest', to: `${cylinderPath(newest)}/log`,
  }
}
