import { getTableColumns } from 'drizzle-orm'
import { cylinders, halves, labelClaims, meta, movements, stockChanges } from '../../../drizzle/schema'
import { FOLD_MEANING } from '../../../utils/custody/foldMeaning'
import { initialState } from '../../../utils/custody/state'
import { statement, type Database } from '../database/database'
import { NEXT_CACHE_TURN } from './cacheTurn'
import { rebuildCaches } from './rebuild'
import { sha256 } from './sha256'

const KEY = 'cache-shape'
const TELL_EVERY_MS = 5_000

/**
 * Names what the caches of the custody log are made like: what the fold means by its number, and the keys of a cached
 * state and the columns of the tables by themselves. Caches that another version made have another name.
 */
export function cacheShape(): string {
  const tables = [cylinders, movements, stockChanges, halves, labelClaims].map(table => Object.values(getTableColumns(table)).map(({ name }) => name))
  return `${FOLD_MEANING} ${sha256(JSON.stringify([keysOf(initialState('')), tables])).slice(0, 16)}`
}

/** What the caches that are there were made like; null where nobody said. */
export async function storedShape({ readClient }: Database): Promise<string | null> {
  const { rows } = await readClient.execute({ sql: 'SELECT value FROM meta WHERE key = ?', args: [KEY] })
  return (rows[0]?.[0] as string | undefined) ?? null
}

/**
 * Before anything is served: where the caches were made by another version, all of them are made again from the log.
 *
 * The new shape is written last: a process that ends halfway leaves the old one, and the next start begins again.
 *
 * @returns whether anything was made again.
 */
export async function bringCachesToShape(db: Database, clock: () => number = Date.now): Promise<boolean> {
  const shape = cacheShape()
  if (await storedShape(db) === shape) return false
  const { rows } = await db.readClient.execute('SELECT count(*), count(DISTINCT cylinder_id) FROM custody_events')
  const [events, all] = [rows[0]![0] as number, rows[0]![1] as number]
  if (events > 0) {
    console.log(`What is kept beside the custody log was made by another version. It is made again: ${all} cylinders from ${events} events.`)
    // What an older version wrote of pairs and labels may not be readable: nobody asks before it is there again.
    await db.write([NEXT_CACHE_TURN, 'DELETE FROM halves', 'DELETE FROM label_claims'])
    let toldAt = clock()
    const done = await rebuildCaches(db, clock(), ({ cylinders: so }) => {
      if (clock() - toldAt < TELL_EVERY_MS) return
      toldAt = clock()
      console.log(`  ${so} of ${all} cylinders`)
    })
    console.log(`Made again: ${done.cylinders} cylinders from ${done.events} events.`)
  }
  await keepShape(db, shape)
  return events > 0
}

/** Says that the caches are of this shape now. */
export async function keepShape(db: Database, shape: string): Promise<void> {
  await db.write([statement(db.read.insert(meta).values({ key: KEY, value: shape }).onConflictDoUpdate({ target: meta.key, set: { value: shape } }))])
}

/** Every key within a value, each after the one it stands in. */
function keysOf(value: unknown, within = ''): string[] {
  if (value === null || typeof value !== 'object' || Array.isArray(value)) return [within]
  return Object.entries(value).flatMap(([key, inner]) => keysOf(inner, `${within}.${key}`))
}
