import { setImmediate as nextTurn, setTimeout as sleep } from 'node:timers/promises'
import { requestUnits } from '../../../utils/custody/requestUnits'
import type { EventResult } from '../../../utils/contract/custody'
import type { Database } from '../database/database'
import { StorageUnavailable, storageFailure } from '../database/storageFailure'
import { groupCaches, wereWritten, type Standing } from './caches'
import { group } from './group'
import { parsePost, refuse } from './judge'
import { idOf, judgePosting, resultOf, type ReadPosting } from './judgePosting'
import { insertLogRows } from './logRow'
import type { Posting } from './posting'
import { sharedCodeRows } from './sharedCodeRows'

/** Most events in one commit. */
const GROUP_EVENTS = 200
/** How long is waited for as many requests as usually come together. Units: ms. */
const LONGEST_GATHER_MS = 4
/** How often a group is computed again after another process wrote first. */
const RACE_RETRIES = 20

/** What became of a posting. */
export interface Appended {
  /** In the order sent. */
  results: EventResult[]
  /** Cylinders as its events have made them, as far as that is known without reading them again. */
  standing: ReadonlyMap<string, Standing>
}

interface Waiting extends ReadPosting {
  done: (appended: Appended) => void
  failed: (error: unknown) => void
}

const NOBODY: Appended['standing'] = new Map()

interface Queue {
  waiting: Waiting[]
  /** How many requests came together of late. */
  usual: number
}

const queues = new WeakMap<Database, Queue>()

/**
 * The only writer of the custody log.
 *
 * Requests wait in one queue; what is waiting is committed together, with every cache that follows from it. The answer
 * comes when it is durable. An event that is sent again is answered `duplicate` and nothing happens twice.
 *
 * Errors: rejects with {@link StorageUnavailable} where the database takes nothing (full, read-only, gone); then
 * nothing of the posting is stored, or it was stored and sending it again answers `duplicate`.
 */
export function appendTelling(db: Database, posting: Posting): Promise<Appended> {
  const queue = queues.get(db) ?? { waiting: [], usual: 1 }
  queues.set(db, queue)
  const { waiting } = queue
  return new Promise((done, failed) => {
    waiting.push({ posting, parsed: posting.events.map(parsePost), units: requestUnits(posting.events), done, failed })
    if (waiting.length === 1) void db.exclusive(commit => drain(db, queue, commit))
  })
}

/** The same for whoever wants no more than what became of each event. */
export async function append(db: Database, posting: Posting): Promise<EventResult[]> {
  return (await appendTelling(db, posting)).results
}

/** Takes what is waiting now; what comes meanwhile asks for a turn of its own. */
async function drain(db: Database, queue: Queue, commit: Database['write']): Promise<void> {
  await gather(queue)
  const taken = queue.waiting.splice(0)
  for (const part of groupsOf(taken)) await commitOrSplit(db, part, commit)
}

/**
 * Requests that come together share the commit. Those that are being read do: it waits for as long as a turn of the
 * event loop brings another. So do those of everybody who was answered by the last commit and posts again at once.
 */
async function gather(queue: Queue): Promise<void> {
  const { waiting } = queue
  for (let known = 0; known < waiting.length && known < GROUP_EVENTS;) {
    known = waiting.length
    await nextTurn()
  }
  for (let waited = 0; waited < LONGEST_GATHER_MS && waiting.length < queue.usual; waited++) await sleep(1)
  // Where fewer come by and by, a lone one soon waits for nobody.
  queue.usual = Math.max(waiting.length, Math.floor(queue.usual * 0.9))
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

/**
 * Commits a group; where it fails, each request alone; where that fails, each event alone: a bad one refuses only itself,
 * and the other half of its pair.
 */
async function commitOrSplit(db: Database, part: Waiting[], commit: Database['write']): Promise<void> {
  try {
    const answers = await commitGroup(db, part, commit)
    part.forEach((one, index) => one.done(answers[index]!))
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
  const results = new Map<number, EventResult>()
  for (const unit of one.units) {
    const events = unit.map(at => one.posting.events[at])
    const alone = { ...one, posting: { ...one.posting, events }, parsed: unit.map(at => one.parsed[at]!), units: [events.map((_, at) => at)] }
    try {
      const [answers] = await commitGroup(db, [alone], commit)
      answers?.results.forEach((answer, index) => results.set(unit[index]!, answer))
    }
    catch (ownError) {
      const failure = storageFailure(ownError)
      if (failure) return one.failed(failure)
      console.error('event refused by an unexpected error', { ids: events.map(idOf), error: String(ownError) })
      unit.forEach((at, index) => results.set(at, resultOf(events[index], refuse(500, 'This event could not be stored', 'Keep it; the fault is ours.'))))
    }
  }
  one.done({ results: one.parsed.flatMap((_, at) => results.get(at) ?? []), standing: NOBODY })
}

async function commitGroup(db: Database, part: Waiting[], commit: Database['write']): Promise<Appended[]> {
  for (let attempt = 0; attempt < RACE_RETRIES; attempt++) {
    const now = await group(db, part.flatMap(one => one.parsed.flatMap(post => 'event' in post ? [post.event] : [])))
    const judged = part.map(one => judgePosting(one, now))
    const written = judged.flatMap(one => one.rows)
    const relabelled = relabelledBy(part)
    if (written.length === 0) {
      // What was sent again may have been cut short after it was stored, before the cylinders beside it were told.
      if (relabelled.length > 0) await commit(await sharedCodeRows(db, relabelled, newestOf(part)))
      return judged.map(({ results }) => ({ results, standing: NOBODY }))
    }

    const lines = insertLogRows(written, now)
    const caches = await groupCaches(db, now)
    const along = part[0]?.posting.dispatch?.alongside(wereWritten(written)) ?? []
    const answers = await commit([...lines, ...caches.statements, ...along])
    // The driver answers one row for each line that was written; another process that was first leaves none.
    const answered = answers.slice(0, lines.length).reduce((sum, { rows }) => sum + rows.length, 0)
    if (answered !== written.length) continue
    if (relabelled.length === 0) return judged.map(({ results }) => ({ results, standing: caches.standing }))
    await commit(await sharedCodeRows(db, relabelled, newestOf(part)))
    // What others say of these cylinders may be another now.
    return judged.map(({ results }) => ({ results, standing: NOBODY }))
  }
  throw new StorageUnavailable('The custody log is written by others faster than this process can follow')
}

/** Cylinders whose codes these events may have changed, now or when they were sent before. */
function relabelledBy(part: readonly Waiting[]): string[] {
  const events = part.flatMap(one => one.parsed.flatMap(post => 'event' in post ? [post.event] : []))
  return [...new Set(events.filter(({ kind }) => kind === 'labelled' || kind === 'corrected').map(({ cylinderId }) => cylinderId))]
}

function newestOf(part: readonly Waiting[]): number {
  return Math.max(...part.map(({ posting }) => posting.now))
}
