import { setImmediate as nextTurn } from 'node:timers/promises'
import type { InStatement } from '@libsql/client'
import type { AnyRecordedEvent } from '../../../utils/custody/event'
import type { EventResult } from '../../../utils/contract/custody'
import type { Database } from '../database/database'
import { StorageUnavailable, storageFailure } from '../database/storageFailure'
import { cacheStatements } from './caches'
import { group, type Group } from './group'
import { parsePost, refuse, refusalOf, type ParsedPost, type Refusal } from './judge'
import { insertLogRow, recordedEvent, type LogRow } from './logRow'
import type { Guard, Posting } from './posting'
import { sealedRow } from './sealedRow'
import { sharedCodeRows } from './sharedCodeRows'

/** Most events in one commit. */
const GROUP_EVENTS = 200
/** How often a group is computed again after another process wrote first. */
const RACE_RETRIES = 20

interface Waiting {
  posting: Posting
  parsed: (ParsedPost | Refusal)[]
  done: (results: EventResult[]) => void
  failed: (error: unknown) => void
}

const queues = new WeakMap<Database, Waiting[]>()

/**
 * The only writer of the custody log.
 *
 * Requests wait in one queue; what is waiting is committed together, with every cache that follows from it. The answer
 * comes when it is durable. An event that is sent again is answered `duplicate` and nothing happens twice.
 *
 * Errors: rejects with {@link StorageUnavailable} where the database takes nothing (full, read-only, gone); then
 * nothing of the posting is stored, or it was stored and sending it again answers `duplicate`.
 */
export function append(db: Database, posting: Posting): Promise<EventResult[]> {
  const waiting = queues.get(db) ?? []
  queues.set(db, waiting)
  return new Promise((done, failed) => {
    waiting.push({ posting, parsed: posting.events.map(parsePost), done, failed })
    if (waiting.length === 1) void db.exclusive(commit => drain(db, waiting, commit))
  })
}

/** Takes what is waiting now; what comes meanwhile asks for a turn of its own. */
async function drain(db: Database, waiting: Waiting[], commit: Database['write']): Promise<void> {
  // Requests that are being read in this turn of the event loop share the commit.
  await nextTurn()
  const taken = waiting.splice(0)
  for (const part of groupsOf(taken)) await commitOrSplit(db, part, commit)
}

function groupsOf(taken: Waiting[]): Waiting[][] {
  const groups: Waiting[][] = []
  let size = 0
  for (const one of taken) {
    const alone = one.posting.dispatch !== undefined
    const last = groups.at(-1)
    if (!last || alone || size + one.parsed.length > GROUP_EVENTS) {
      groups.push([one])
      size = alone ? GROUP_EVENTS : one.parsed.length
    }
    else {
      last.push(one)
      size += one.parsed.length
    }
  }
  return groups
}

/** Commits a group; where it fails, each request alone; where that fails, each event alone: a bad one refuses only itself. */
async function commitOrSplit(db: Database, part: Waiting[], commit: Database['write']): Promise<void> {
  try {
    const answers = await commitGroup(db, part, commit)
    part.forEach((one, index) => one.done(answers[index] ?? []))
  }
  catch (error) {
    const failure = storageFailure(error)
    if (failure) part.forEach(one => one.failed(failure))
    else if (part.length > 1) for (const one of part) await commitOrSplit(db, [one], commit)
    else if (part[0]) await commitEachAlone(db, part[0], commit, error)
  }
}

async function commitEachAlone(db: Database, one: Waiting, commit: Database['write'], error: unknown): Promise<void> {
  if (one.posting.dispatch) return one.failed(error)
  const results: EventResult[] = []
  for (const [index, parsed] of one.parsed.entries()) {
    const alone = { ...one, posting: { ...one.posting, events: [one.posting.events[index]] }, parsed: [parsed] }
    try {
      const [answers] = await commitGroup(db, [alone], commit)
      results.push(...(answers ?? []))
    }
    catch (ownError) {
      const failure = storageFailure(ownError)
      if (failure) return one.failed(failure)
      console.error('event refused by an unexpected error', { id: idOf(one.posting.events[index]), error: String(ownError) })
      results.push(resultOf(one.posting.events[index], refuse(500, 'This event could not be stored', 'Keep it; the fault is ours.')))
    }
  }
  one.done(results)
}

async function commitGroup(db: Database, part: Waiting[], commit: Database['write']): Promise<EventResult[][]> {
  for (let attempt = 0; attempt < RACE_RETRIES; attempt++) {
    const now = await group(db, part.flatMap(one => one.parsed.flatMap(post => 'event' in post ? [post.event] : [])))
    const newestBefore = now.newest
    const judged = part.map(one => judgeAll(one, now))
    const written = judged.flatMap(one => one.rows)
    if (written.length === 0) return judged.map(one => one.results)

    const statements = logStatements(written, newestBefore?.id ?? null)
    statements.push(...await cacheStatements(db, now))
    const dispatch = part[0]?.posting.dispatch
    if (dispatch) statements.push(...dispatch.alongside(everyOf(written)))
    const answers = await commit(statements)
    // The driver answers one row for each line that was written; another process that was first leaves none.
    if (!written.every((_, index) => (answers[index]?.rows.length ?? 0) === 1)) continue
    const relabelled = written.filter(row => row.kind === 'labelled' || row.kind === 'corrected')
    if (relabelled.length > 0) await commit(await sharedCodeRows(db, [...new Set(relabelled.map(row => row.cylinder_id))], Math.max(...written.map(row => row.recorded_at))))
    return judged.map(one => one.results)
  }
  throw new StorageUnavailable('The custody log is written by others faster than this process can follow')
}

function logStatements(rows: LogRow[], newestId: string | null): InStatement[] {
  return rows.map((row, index) => insertLogRow(row, index === 0 ? newestId : rows[index - 1]!.id))
}

/** Judges the events of one posting in their order, each on what the ones before it have made of the cylinder. */
function judgeAll(one: Waiting, now: Group): { results: EventResult[], rows: LogRow[] } {
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
    const events = now.eventsOf(event.cylinderId)
    const refusal = refusalOf(event, one.posting.access, events, now.known, one.posting.now, one.posting.dispatch !== undefined)
    if (refusal) {
      results.push(resultOf(raw, refusal))
      continue
    }
    const row = sealedRow(post, one.posting, now.headOf(event.cylinderId), now.nextSeq())
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

const HELD_BACK = refuse(409, 'Held back', 'Another line of the same dispatch was refused, so none was recorded.').refused

function everyOf(rows: LogRow[]): Guard {
  const last = rows.at(-1)!
  // Each line is written only after the one before it, so the last stands for all.
  return { sql: 'EXISTS (SELECT 1 FROM custody_events WHERE id = ? AND cylinder_id = ? AND version = ? AND hash = ?)', args: [last.id, last.cylinder_id, last.version, last.hash] }
}

function resultOf(raw: unknown, refusal: Refusal): EventResult {
  return { id: idOf(raw), outcome: 'refused', problem: refusal.refused }
}

function idOf(raw: unknown): string {
  const id = (raw as { id?: unknown } | null)?.id
  return typeof id === 'string' ? id.slice(0, 100) : ''
}
