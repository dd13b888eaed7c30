import { existsSync } from 'node:fs'
import { join } from 'node:path'
import { setImmediate as nextTurn } from 'node:timers/promises'
import { foldAsItStood, instantOf, type Past } from '../../../utils/custody/asItStood'
import { openDatabase, type Database } from '../database/database'
import { directory, lendDirectory, type Directory } from '../directory/directory'
import { pastCache } from './caches'
import { foldContext } from './foldContext'
import { cylindersAfter, logsOf } from './logPages'
import { pastFolder } from './pastFolder'
import { SAID_OF } from './rebuild'
import { refreshedRows } from './refreshedRows'

const TABLES = ['cylinders', 'label_claims', 'halves']
const ROWS_AT_ONCE = 200

/** A database that holds the fleet as it stood at a past instant; it is read like that of the present. */
export interface PastDatabase { db: Database, atMs: number, remove: () => void }

/**
 * Databases of a past that nobody reads any more. The driver keeps the descriptors of a closed file, and with them its
 * place on the disk: so none is closed, and the next past is made in the same file.
 */
const spare = new WeakMap<Database, Database[]>()

/** An empty database for a past instant, in a file that no other past uses until {@link PastDatabase.remove} gives it up. */
export async function openPastDatabase(db: Database, past: Past): Promise<PastDatabase> {
  const [from, { rows }] = await Promise.all([directory(db), db.readClient.execute({
    sql: `SELECT sql FROM sqlite_master WHERE type IN ('table', 'index') AND sql IS NOT NULL AND tbl_name IN (${TABLES.map(() => '?').join(', ')}) ORDER BY type DESC`,
    args: TABLES,
  })])
  const spares = spare.get(db) ?? []
  spare.set(db, spares)
  const own = takeOne(spares) ?? await openDatabase(`file:${join(pastFolder(), 'past.db')}`)
  lendDirectory(own, from)
  try {
    await own.write([
      ...[...TABLES, 'places'].map(table => `DROP TABLE IF EXISTS ${table}`),
      ...rows.map(row => row[0] as string),
      'CREATE TABLE places (id TEXT PRIMARY KEY, name TEXT NOT NULL, parent_id TEXT)',
      ...[...from.places.values()].map(({ id, name, parentId }) => ({ sql: 'INSERT INTO places VALUES (?, ?, ?)', args: [id, name, parentId] })),
    ])
  }
  catch (error) {
    spares.push(own)
    throw error
  }
  return { db: own, atMs: instantOf(past), remove: () => void spares.push(own) }
}

/** One of these; not one whose file was swept away meanwhile, as systems do with what lies long among their temporary files. */
function takeOne(spares: Database[]): Database | undefined {
  const own = spares.pop()
  if (own === undefined || (own.file !== null && existsSync(own.file))) return own
  own.close()
  return takeOne(spares)
}

/** Fills a past database with cylinders as their logs, read from the present one, had them. */
export async function fillPast(db: Database, into: PastDatabase, past: Past, ids: readonly string[]): Promise<number> {
  const from: Directory = await directory(into.db)
  const logs = await logsOf(db, ids)
  await into.db.write([...logs].flatMap(([id, events]) => {
    const folded = foldAsItStood(events, foldContext(from), past)
    return folded === null ? [] : pastCache(id, folded, from, into.atMs)
  }))
  return [...logs.values()].reduce((sum, events) => sum + events.length, 0)
}

/** Fills a past database with the whole fleet, some cylinders at a time. */
export async function fillPastFleet(db: Database, into: PastDatabase, past: Past, tell: (events: number) => void): Promise<void> {
  for (let after: string | null = ''; after !== null;) {
    const { ids, last }: Awaited<ReturnType<typeof cylindersAfter>> = await cylindersAfter(db, after)
    tell(await fillPast(db, into, past, ids))
    after = last
    await nextTurn()
  }
  await joinBothSides(into)
}

/** Once its cylinders are in it, the rows that rest on what other cylinders' logs said. */
async function joinBothSides({ db, atMs }: PastDatabase): Promise<void> {
  const ids = (await db.readClient.execute(SAID_OF)).rows.map(row => row[0] as string)
  for (let at = 0; at < ids.length; at += ROWS_AT_ONCE) {
    await db.write(await refreshedRows(db, ids.slice(at, at + ROWS_AT_ONCE), atMs))
    await nextTurn()
  }
}
