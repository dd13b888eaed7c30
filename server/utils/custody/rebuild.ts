import { setImmediate as nextTurn } from 'node:timers/promises'
import type { InStatement } from '@libsql/client'
import type { Database } from '../database/database'
import { StorageUnavailable } from '../database/storageFailure'
import { directory } from '../directory/directory'
import { NEXT_CACHE_TURN } from './cacheTurn'
import { CYLINDER_CACHES, rebuiltCache } from './caches'
import { cylindersAfter, logsOf } from './logPages'
import type { Guard } from './posting'
import { refreshedRows } from './refreshedRows'
import { saidByOthers } from './saidByOthers'

/** Rows refreshed in one turn of the writer's queue: what is posted meanwhile waits for no more than these. */
const ROWS_AT_ONCE = 200
/** How often a turn is taken again after another process wrote first. */
const RACE_RETRIES = 20

/** Cylinders of which another one's log says something, or has said it. */
export const SAID_OF = `SELECT a.cylinder_id FROM label_claims a JOIN label_claims b ON a.code = b.code AND a.cylinder_id <> b.cylinder_id
  UNION SELECT cylinder_id FROM halves UNION SELECT other_id FROM halves UNION SELECT id FROM cylinders WHERE finding_codes LIKE '% code-on-two %'`

const NEWEST = 'SELECT id FROM custody_events ORDER BY seq DESC LIMIT 1'

/** How far making the caches again has come. */
export interface RebuildProgress { cylinders: number, events: number }

/**
 * Makes every cache of the custody log again from the log alone, cylinder by cylinder, each in the place of what was
 * there: the fleet is read and events are posted meanwhile. What the log does not know is taken out.
 *
 * @param tell is called after each turn.
 * @returns how many cylinders and events it went through.
 */
export async function rebuildCaches(db: Database, nowMs: number, tell: (progress: RebuildProgress) => void = () => undefined): Promise<RebuildProgress> {
  await directory(db, true)
  // A claim or a half goes by its event: one that stands under another cylinder would be in the way of the right one.
  await db.write([NEXT_CACHE_TURN, ...['label_claims', 'halves'].map(table => `DELETE FROM ${table} WHERE NOT EXISTS
    (SELECT 1 FROM custody_events e WHERE e.id = ${table}.event_id AND e.cylinder_id = ${table}.cylinder_id)`)])
  const done: RebuildProgress = { cylinders: 0, events: 0 }
  for (let after: string | null = ''; after !== null;) {
    const before: string = after
    after = await db.exclusive(async (commit) => {
      const page = await cylindersAfter(db, before)
      await commit([NEXT_CACHE_TURN, ...CYLINDER_CACHES.map(table => strangers(table, before, page.last))])
      done.events += await rebuildSome(db, page.ids, nowMs, commit)
      done.cylinders += page.ids.length
      return page.last
    })
    tell(done)
    await nextTurn()
  }
  await refreshBothSides(db, nowMs)
  return done
}

/** What a cache holds, within a stretch of cylinders, of those that the log does not know. */
function strangers({ table, key }: (typeof CYLINDER_CACHES)[number], after: string, last: string | null): InStatement {
  return {
    sql: `DELETE FROM ${table} WHERE ${key} > ? ${last === null ? '' : `AND ${key} <= ?`}
      AND NOT EXISTS (SELECT 1 FROM custody_events e WHERE e.cylinder_id = ${table}.${key})`,
    args: last === null ? [after] : [after, last],
  }
}

/** @returns how many events these cylinders have. */
async function rebuildSome(db: Database, ids: readonly string[], nowMs: number, commit: Database['write']): Promise<number> {
  let events = 0
  let left = ids
  for (let attempt = 0; left.length > 0; attempt++) {
    if (attempt > RACE_RETRIES) throw new StorageUnavailable('The custody log is written by others faster than its caches can follow')
    const [from, said, logs] = await Promise.all([directory(db), saidByOthers(db, left), logsOf(db, left)])
    const statements = [...logs].flatMap(([id, log]) => rebuiltCache(id, log, from, nowMs, said(id)))
    const [versions] = await commit([
      { sql: `SELECT cylinder_id, max(version) FROM custody_events WHERE cylinder_id IN (${left.map(() => '?').join(', ')}) GROUP BY cylinder_id`, args: [...left] },
      NEXT_CACHE_TURN,
      ...statements,
    ])
    // Another process has recorded meanwhile: what it wrote rests on caches that were not made again yet.
    const behind = versions!.rows.filter(row => row[1] !== logs.get(row[0] as string)?.at(-1)?.version).map(row => row[0] as string)
    for (const [id, log] of logs) if (!behind.includes(id)) events += log.length
    left = behind
  }
  return events
}

/** Once every log was read, the rows that rest on what other cylinders' logs say: one code on two, and halves of a pair. */
async function refreshBothSides(db: Database, nowMs: number): Promise<void> {
  const ids = (await db.readClient.execute(SAID_OF)).rows.map(row => row[0] as string)
  for (let at = 0; at < ids.length; at += ROWS_AT_ONCE) {
    await db.exclusive(commit => refreshSome(db, ids.slice(at, at + ROWS_AT_ONCE), nowMs, commit))
    await nextTurn()
  }
}

async function refreshSome(db: Database, ids: readonly string[], nowMs: number, commit: Database['write']): Promise<void> {
  for (let attempt = 0; attempt <= RACE_RETRIES; attempt++) {
    const newest = (await db.readClient.execute(NEWEST)).rows[0]?.[0] as string
    const isNewest: Guard = { sql: `(${NEWEST}) IS ?`, args: [newest] }
    const [now] = await commit([NEWEST, NEXT_CACHE_TURN, ...await refreshedRows(db, ids, nowMs, isNewest)])
    if (now!.rows[0]?.[0] === newest) return
  }
  throw new StorageUnavailable('The custody log is written by others faster than its caches can follow')
}
