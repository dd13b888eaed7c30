import { asc } from 'drizzle-orm'
import { firm, firms, people, places, scales, settings } from '../../../drizzle/schema'
import type { Named } from '../../../utils/custody/cylinderView'
import type { Scale } from '../../../utils/quantity/scale'
import type { Database } from '../database/database'
import { datedRules, type DatedRules, type SettingRow } from './datedRules'

/** The small tables that every custody event and view needs by id, read as one. */
export interface Directory extends DatedRules {
  timeZone: string
  places: ReadonlyMap<string, typeof places.$inferSelect>
  firms: ReadonlyMap<string, typeof firms.$inferSelect>
  people: ReadonlyMap<string, typeof people.$inferSelect>
  /** By the id of its firm. */
  placeOfFirm: ReadonlyMap<string, string>
  /** Those turned off too: the log names them. */
  scales: ReadonlyMap<string, Scale & { active: boolean }>
  /** Every rule that was ever set or withdrawn, in order of its beginning. */
  settings: readonly SettingRow[]
  readAt: number
}

/** Another process on the same database server may have changed a name: how long ours may lag. */
const LONGEST_AGE_MS = 2_000

const known = new WeakMap<Database, Promise<Directory>>()

/**
 * The directory as it stands. Kept for two seconds at most.
 *
 * @param fresh reads it again now: for an id that is not in the kept one, and after a change.
 */
export async function directory(db: Database, fresh = false): Promise<Directory> {
  const kept = known.get(db)
  if (kept && !fresh) {
    const value = await kept
    if (Date.now() - value.readAt < LONGEST_AGE_MS) return value
  }
  const reading = readDirectory(db)
  known.set(db, reading)
  reading.catch(() => known.delete(db))
  return reading
}

/** Has a database that holds only part of another's go by that other's directory, for good. */
export function lendDirectory(db: Database, from: Directory): void {
  known.set(db, Promise.resolve({ ...from, readAt: Infinity }))
}

async function readDirectory(db: Database): Promise<Directory> {
  const [firmRows, placeRows, firmsRows, peopleRows, scaleRows, settingRows] = await Promise.all([
    db.read.select().from(firm).limit(1),
    db.read.select().from(places),
    db.read.select().from(firms),
    db.read.select().from(people),
    db.read.select().from(scales),
    db.read.select().from(settings).orderBy(asc(settings.fromAt), asc(settings.setAt), asc(settings.id)),
  ])
  return {
    ...datedRules(settingRows),
    timeZone: firmRows[0]?.timeZone ?? 'UTC',
    places: byId(placeRows),
    firms: byId(firmsRows),
    people: byId(peopleRows),
    placeOfFirm: new Map(placeRows.flatMap(row => row.firmId ? [[row.firmId, row.id]] : [])),
    scales: new Map(scaleRows.map(row => [row.id, {
      id: row.id,
      name: row.name,
      accuracyGrams: row.accuracyGrams,
      accuracyPercent: row.accuracyBasisPoints / 100,
      lastCheck: row.lastCheckOn,
      active: row.active,
    }])),
    settings: settingRows,
    readAt: Date.now(),
  }
}

/** Names by id, for people to read; an id that nobody knows any more reads as itself. */
export function namesOf(from: Directory) {
  return {
    place: (id: string): Named => named(from.places.get(id), id),
    person: (id: string): Named => ({ id, name: from.people.get(id)?.name ?? id }),
    firm: (id: string): Named => named(from.firms.get(id), id),
  }
}

function named(row: { name: string, kind: string } | undefined, id: string): Named {
  return row ? { id, name: row.name, kind: row.kind } : { id, name: id }
}

function byId<T extends { id: string }>(rows: T[]): Map<string, T> {
  return new Map(rows.map(row => [row.id, row]))
}
