import { desc, eq } from 'drizzle-orm'
import { vanCheckIns } from '../../../drizzle/schema'
import type { NewVanCheckIn, ToLookFor } from '../../../utils/contract/vans'
import { cylinderRowsWhere } from '../custody/fleet'
import { IN_FLEET } from '../custody/fleetFilter'
import { statement, type Database } from '../database/database'
import { namesOf, type Directory } from '../directory/directory'
import { refuseOther } from './refuseOther'

type CheckIn = typeof vanCheckIns.$inferSelect

/** The last check-in of a van; null where there was none. */
export async function lastCheckIn(db: Database, vanId: string): Promise<CheckIn | null> {
  const [row] = await db.read.select().from(vanCheckIns).where(eq(vanCheckIns.vanId, vanId))
    .orderBy(desc(vanCheckIns.checkedAt), desc(vanCheckIns.id)).limit(1)
  return row ?? null
}

/** Keeps what a van came back with; the same sent again is kept once. Errors: 409 where another check-in has the id. */
export async function keepCheckIn(db: Database, vanId: string, body: NewVanCheckIn, personId: string, now: number): Promise<void> {
  const said = { vanId, found: body.found, missing: body.missing }
  const row = { id: body.id, ...said, checkedBy: personId, checkedAt: now }
  await db.write([statement(db.read.insert(vanCheckIns).values(row).onConflictDoNothing())])
  const [kept] = await db.read.select({ vanId: vanCheckIns.vanId, found: vanCheckIns.found, missing: vanCheckIns.missing })
    .from(vanCheckIns).where(eq(vanCheckIns.id, body.id))
  refuseOther('A check-in', kept, said)
}

/** The cylinders that a check-in missed and that nobody has seen since. */
export async function toLookFor(db: Database, checkIn: CheckIn | null, from: Directory, now: number): Promise<ToLookFor[]> {
  if (!checkIn?.missing.length) return []
  const { missing, checkedAt, checkedBy } = checkIn
  const unseen = {
    sql: `c.id IN (${missing.map(() => '?').join(', ')}) AND (c.last_seen_at IS NULL OR c.last_seen_at <= ?) AND c.lifecycle <> 'retired' AND ${IN_FLEET}`,
    args: [...missing, checkedAt],
  }
  const rows = await cylinderRowsWhere(db, unseen, missing.length, now)
  return rows.map(cylinder => ({ cylinder, checkedBy: namesOf(from).person(checkedBy), checkedAt: new Date(checkedAt).toISOString() }))
}
