import { setImmediate as nextTurn } from 'node:timers/promises'
import type { InStatement } from '@libsql/client'
import type { AnyRecordedEvent } from '../../../utils/custody/event'
import type { Database } from '../database/database'
import { StorageUnavailable } from '../database/storageFailure'
import { directory } from '../directory/directory'
import { CYLINDER_CACHES, rebuiltCache } from './caches'
import { logRow, recordedEvent, SELECT_LOG } from './logRow'
import type { Guard } from './posting'
import { refreshedRows } from './refreshedRows'
import { saidByOthers } from './saidByOthers'

/** What one turn of the writer's queue makes again at most: what is posted meanwhile waits for no more than these. */
const CYLINDERS_AT_ONCE = 200
const EVENTS_AT_ONCE = 1_000
/** How often a turn is taken again after another process wrote first. */
const RACE_RETRIES = 20

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
  await db.write(['label_claims', 'halves'].map(table => `DELETE FROM ${table} WHERE NOT EXISTS
    (SELECT 1 FROM custody_events e WHERE e.id = ${table}.event_id AND e.cylinder_id = ${table}.cylinder_id)`))
  const done: RebuildProgress = { cylinders: 0, events: 0 }
  for (let after: string | null = ''; after !== null;) {
    const before: string = after
    after = await db.exclusive(async (commit) => {
      const page = await pageAfter(db, before)
      await commit(CYLINDER_CACHES.map(table => strangers(table, before, page.last)))
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

/** The next cylinders of the log in the order of their ids; `last` is null where none follow. */
async function pageAfter(db: Database, after: string): Promise<{ ids: string[], last: string | null }> {
  const { rows } = await db.readClient.execute({
    sql: 'SELECT cylinder_id, count(*) FROM custody_events WHERE cylinder_id > ? GROUP BY cylinder_id ORDER BY cylinder_id LIMIT ?',
    args: [after, CYLINDERS_AT_ONCE],
  })
  let events = 0
  const some = rows.findIndex(row => (events += row[1] as number) > EVENTS_AT_ONCE)
  const ids = rows.slice(0, some === -1 ? rows.length : Math.max(1, some)).map(row => row[0] as string)
  return { ids, last: ids.length < rows.length || rows.length === CYLINDERS_AT_ONCE ? ids.at(-1)! : null }
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
      { sql: `SELECT cylinder_id, max(version) FROM custody_events WHERE cylinder_id IN (${marks(left)}) GROUP BY cylinder_id`, args: [...left] },
      ...statements,
    ])
    // Another process has recorded meanwhile: what it wrote rests on caches that were not made again yet.
    const behind = versions!.rows.filter(row => row[1] !== logs.get(row[0] as string)?.at(-1)?.version).map(row => row[0] as string)
    for (const [id, log] of logs) if (!behind.includes(id)) events += log.length
    left = behind
  }
  return events
}

async function logsOf(db: Database, ids: readonly string[]): Promise<Map<string, AnyRecordedEvent[]>> {
  const { rows } = await db.readClient.execute({ sql: `${SELECT_LOG} WHERE cylinder_id IN (${marks(ids)}) ORDER BY cylinder_id, version`, args: [...ids] })
  const logs = new Map<string, AnyRecordedEvent[]>()
  for (const event of rows.map(row => recordedEvent(logRow(row)))) {
    const log = logs.get(event.cylinderId)
    if (log) log.push(event)
    else logs.set(event.cylinderId, [event])
  }
  return logs
}

/** Once every log was read, the rows that rest on what other cylinders' logs say: one code on two, and halves of a pair. */
async function refreshBothSides(db: Database, nowMs: number): Promise<void> {
  const both = await db.readClient.execute(`SELECT a.cylinder_id FROM label_claims a JOIN label_claims b ON a.code = b.code AND a.cylinder_id <> b.cylinder_id
    UNION SELECT cylinder_id FROM halves UNION SELECT id FROM cylinders WHERE finding_codes LIKE '% code-on-two %'`)
  const ids = both.rows.map(row => row[0] as string)
  for (let at = 0; at < ids.length; at += CYLINDERS_AT_ONCE) {
    await db.exclusive(commit => refreshSome(db, ids.slice(at, at + CYLINDERS_AT_ONCE), nowMs, commit))
    await nextTurn()
  }
}

async function refreshSome(db: Database, ids: readonly string[], nowMs: number, commit: Database['write']): Promise<void> {
  for (let attempt = 0; attempt <= RACE_RETRIES; attempt++) {
    const newest = (await db.readClient.execute(NEWEST)).rows[0]?.[0] as string
    const isNewest: Guard = { sql: `(${NEWEST}) IS ?`, args: [newest] }
    const [now] = await commit([NEWEST, ...await refreshedRows(db, ids, nowMs, isNewest)])
    if (now!.rows[0]?.[0] === newest) return
  }
  throw new StorageUnavailable('The custody log is written by others faster than its caches can follow')
}

function marks(values: readonly unknown[]): string {
  return values.map(() => '?').join(', ')
}
