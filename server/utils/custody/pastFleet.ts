import type { PastProgress } from '../../../utils/contract/past'
import type { Past } from '../../../utils/custody/asItStood'
import type { Database } from '../database/database'
import { directory, type Directory } from '../directory/directory'
import { fillPastFleet, openPastDatabase, type PastDatabase } from './pastDatabase'
import { sha256 } from './sha256'

/** Past fleets that are kept at once, and for how long without a reader. */
const MOST_KEPT = 2
const KEPT_MS = 10 * 60_000
/** Who turns the page goes on with the fleet of the page before, whatever was recorded meanwhile. */
const PAGES_MS = 5 * 60_000

interface Kept {
  key: string
  /** The last line of the log that it was made of. */
  head: number
  /** What it was made by beside the log. */
  outside: string
  madeAt: number
  usedAt: number
  readers: number
  progress: PastProgress
  made: Promise<PastDatabase>
}

/** A past fleet in use: whoever borrows it gives it back. */
export interface BorrowedPast extends PastDatabase { giveBack: () => void }

const kept = new WeakMap<Database, Kept[]>()
const lasts = new WeakMap<Database, Promise<unknown>>()

/**
 * The fleet as it stood at a past instant, made from the log in a file of its own unless one like it is kept. One is made
 * at a time, some cylinders at a time: memory does not grow with the fleet.
 *
 * @param isNextPage goes on with the one of the page before, though events were recorded since.
 */
export async function pastFleet(db: Database, past: Past, isNextPage: boolean, clock: () => number = Date.now): Promise<BorrowedPast> {
  // What was recorded after the instant of knowing makes no difference to it.
  const { rows } = await db.readClient.execute({
    sql: `SELECT coalesce(max(seq), 0), count(*) FROM custody_events ${past.knownAt === null ? '' : 'WHERE recorded_at <= ?'}`,
    args: past.knownAt === null ? [] : [past.knownAt],
  })
  const [head, events, outside] = [rows[0]![0] as number, rows[0]![1] as number, outsideOf(await directory(db))]
  const all = kept.get(db) ?? []
  kept.set(db, all)
  const key = keyOf(past)
  const isGood = (one: Kept) => one.key === key && ((one.head === head && one.outside === outside) || (isNextPage && clock() - one.madeAt < PAGES_MS))
  const one = all.find(isGood) ?? begin(db, past, { key, head, outside, events, now: clock() })
  if (!all.includes(one)) all.push(one)
  one.usedAt = clock()
  one.readers++
  tidy(all, clock())
  try {
    const own = await one.made
    return { ...own, giveBack: () => void one.readers-- }
  }
  catch (error) {
    one.readers--
    // Of several who waited for it the first takes it off the list.
    if (all.includes(one)) all.splice(all.indexOf(one), 1)
    throw error
  }
}

/** How far a past fleet is made; one that nobody has asked for has not begun. */
export function pastProgress(db: Database, past: Past): PastProgress {
  return kept.get(db)?.findLast(({ key }) => key === keyOf(past))?.progress ?? { done: 0, of: 0, isReady: false }
}

function begin(db: Database, past: Past, { events, now, ...of }: Pick<Kept, 'key' | 'head' | 'outside'> & { events: number, now: number }): Kept {
  const progress: PastProgress = { done: 0, of: events, isReady: false }
  const made = (lasts.get(db) ?? Promise.resolve()).catch(() => undefined).then(() => make(db, past, progress))
  lasts.set(db, made)
  return { ...of, madeAt: now, usedAt: now, readers: 0, progress, made }
}

async function make(db: Database, past: Past, progress: PastProgress): Promise<PastDatabase> {
  const own = await openPastDatabase(db, past)
  try {
    await fillPastFleet(db, own, past, (events) => {
      progress.done += events
    })
    progress.isReady = true
    return own
  }
  catch (error) {
    own.remove()
    throw error
  }
}

/** Takes away what nobody reads: beyond the number kept the one used longest ago, and whatever was not used for long. */
function tidy(all: Kept[], now: number): void {
  const idle = all.filter(({ readers, progress }) => readers === 0 && progress.isReady).sort((a, b) => a.usedAt - b.usedAt)
  const most = Math.max(0, all.length - MOST_KEPT)
  for (const [index, one] of idle.entries()) {
    if (index >= most && now - one.usedAt < KEPT_MS) continue
    all.splice(all.indexOf(one), 1)
    void one.made.then(({ remove }) => remove())
  }
}

/** The firm's rules and names as a past is made by them: a fleet that was made by others is made anew. */
function outsideOf({ timeZone, settings, places, firms, people, scales }: Directory): string {
  const named = [...places.values(), ...firms.values(), ...people.values()].map(row => [row.id, row.name, 'parentId' in row ? row.parentId : null])
  return sha256(JSON.stringify([timeZone, settings, [...scales.values()], named]))
}

function keyOf({ asOf, knownAt }: Past): string {
  return `${asOf} ${knownAt}`
}
