import type { Access } from '../../../utils/access/roles'
import type { AnyCustodyEvent, AnyRecordedEvent } from '../../../utils/custody/event'
import { pairIdOf } from '../../../utils/custody/half'
import { maySupervise } from '../people/maySupervise'
import type { Group } from './group'
import { refuse, refusalOf, type ParsedPost, type Refusal } from './judge'
import { recordedEvent, type LogRow } from './logRow'
import type { EventResult, Posting } from './posting'
import { sealedRow } from './sealedRow'

/** A posting as it was read. */
export interface ReadPosting {
  posting: Posting
  parsed: (ParsedPost | Refusal)[]
  /** Which of its events are stored or refused together, by position. */
  units: number[][]
}

/** What becomes of each event, and the lines that are to be written. */
export interface Judged { results: EventResult[], rows: LogRow[] }

/**
 * Judges the events of one posting in their order, each on what the ones before it have made of the cylinder. Where half
 * of a pair is refused, or the correction of a half, all are judged again without the other's, and so on.
 */
export function judgePosting(one: ReadPosting, now: Group): Judged {
  const before = now.mark()
  const heldBack = new Set<number>()
  for (;;) {
    const judged = judgeOnce(one, now, heldBack)
    const torn = [...one.units, ...mendedPairs(one, now)].filter(unit => ['accepted', 'refused'].every(outcome => unit.some(at => judged.results[at]?.outcome === outcome)))
    if (torn.length === 0) return judged
    torn.flat().forEach(at => heldBack.add(at))
    now.backTo(before)
  }
}

/** The corrections of both halves of a pair, by position: the log names the pair, they need not. */
function mendedPairs({ parsed }: ReadPosting, now: Group): number[][] {
  const byPair = new Map<string, { at: number, cylinderId: string }[]>()
  parsed.forEach((post, at) => {
    if (!('event' in post) || post.event.kind !== 'corrected') return
    const { cylinderId, details: { eventId } } = post.event
    const mended = now.eventsOf(cylinderId).find(({ id }) => id === eventId)
    const pairId = mended ? pairIdOf(mended.kind, mended.details) : null
    if (pairId !== null) byPair.set(pairId, [...byPair.get(pairId) ?? [], { at, cylinderId }])
  })
  return [...byPair.values()].filter(all => new Set(all.map(({ cylinderId }) => cylinderId)).size > 1).map(all => all.map(({ at }) => at))
}

/** @param heldBack positions of events that are not to be stored, for the other half of their pair is refused. */
function judgeOnce(one: ReadPosting, now: Group, heldBack: ReadonlySet<number>): Judged {
  const results: EventResult[] = []
  const rows: LogRow[] = []
  const before = now.mark()
  for (const [index, post] of one.parsed.entries()) {
    const raw = one.posting.events[index]
    if ('refused' in post) {
      results.push(resultOf(raw, post))
      continue
    }
    const { event } = post
    const stored = now.stored(event.id)
    if (stored) {
      results.push(stored.contentHash === post.contentHash
        ? { id: event.id, outcome: 'duplicate', seq: stored.seq, version: stored.version }
        : resultOf(raw, refuse(409, 'Another event has this id', 'The log keeps what was recorded first. Record this as a new event.')))
      continue
    }
    const refusal = refusalOf(event, one.posting.access, () => now.eventsOf(event.cylinderId), now.known, one.posting.now, one.posting.dispatch !== undefined)
    if (refusal ?? heldBack.has(index)) {
      results.push(resultOf(raw, refusal ?? OTHER_HALF_REFUSED))
      continue
    }
    const row = sealedRow(post, one.posting, now.headOf(event.cylinderId), now.nextSeq(), supervisorOf(event, one.posting.access, now))
    now.add(row, recordedEvent(row) as AnyRecordedEvent)
    rows.push(row)
    results.push({ id: event.id, outcome: 'accepted', seq: row.seq, version: row.version })
  }
  // A dispatch leaves whole or not at all.
  if (one.posting.dispatch && results.some(result => result.outcome === 'refused')) {
    now.backTo(before)
    return { results: results.map(result => result.outcome === 'accepted' ? { id: result.id, outcome: 'refused', problem: HELD_BACK } : result), rows: [] }
  }
  return { results, rows }
}

/** Whom the line names as supervisor: of a trainee's entry only one who may be it. What was done is kept either way. */
function supervisorOf({ supervisorId }: AnyCustodyEvent, { personId, trainee }: Access, { directory }: Group): string | null {
  if (supervisorId === undefined) return null
  return !trainee || maySupervise(directory, supervisorId, personId) ? supervisorId : null
}

const OTHER_HALF_REFUSED: Refusal = {
  refused: {
    ...refuse(409, 'Its other half was refused', 'Half of what happened between two cylinders is not recorded alone. Mend the other half and send both again.').refused,
    type: 'other-half-refused',
  },
}
const HELD_BACK = refuse(409, 'Held back', 'Another line of the same dispatch was refused, so none was recorded.').refused

/** The answer to a refused event. */
export function resultOf(raw: unknown, refusal: Refusal): EventResult {
  return { id: idOf(raw), outcome: 'refused', problem: refusal.refused }
}

/** The id of an event as it was sent; '' where it has none. */
export function idOf(raw: unknown): string {
  const id = (raw as { id?: unknown } | null)?.id
  return typeof id === 'string' ? id.slice(0, 100) : ''
}
