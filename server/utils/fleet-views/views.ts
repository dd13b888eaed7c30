import { and, asc, count, eq, sql } from 'drizzle-orm'
import { v7 as uuid } from 'uuid'
import { fleetViews } from '~~/drizzle/schema'
import { MOST_VIEWS, type FleetView } from '~~/utils/contract/fleetViews'
import { changeFleetAddress } from '~~/utils/fleet/fleetAddress'
import { statement, type Database } from '../database/database'
import { problem } from '../http/problem'

/** The views of the fleet that a person gave a name, by name. */
export function fleetViewsOf(db: Database, personId: string): Promise<FleetView[]> {
  return db.read.select({ id: fleetViews.id, name: fleetViews.name, query: fleetViews.query }).from(fleetViews)
    .where(eq(fleetViews.personId, personId)).orderBy(asc(sql`lower(${fleetViews.name})`), asc(fleetViews.id))
}

/**
 * Gives a view a name. What of it is no filter and no order is left out, the page among it.
 *
 * Errors: 409 where the person has a view of this name; 422 where they have as many as are kept.
 */
export async function nameFleetView(db: Database, personId: string, view: Pick<FleetView, 'name' | 'query'>, now: number): Promise<FleetView> {
  const row = { id: uuid(), name: view.name, query: changeFleetAddress(view.query, {}) }
  await db.exclusive(async (commit) => {
    await refuseTakenName(db, personId, row.id, row.name)
    const [kept] = await db.read.select({ views: count() }).from(fleetViews).where(eq(fleetViews.personId, personId))
    if (kept!.views >= MOST_VIEWS) throw problem(422, 'Too many views', `You keep ${MOST_VIEWS} views. Remove one first.`)
    await commit([statement(db.read.insert(fleetViews).values({ ...row, personId, createdAt: now }))])
  })
  return row
}

/** Gives a view another name. Errors: 404 where the person has no such view; 409 where another of theirs has this name. */
export async function renameFleetView(db: Database, personId: string, id: string, name: string): Promise<FleetView> {
  return db.exclusive(async (commit) => {
    const view = await ownView(db, personId, id)
    await refuseTakenName(db, personId, id, name)
    await commit([statement(db.read.update(fleetViews).set({ name }).where(eq(fleetViews.id, id)))])
    return { ...view, name }
  })
}

/** Forgets a view. Errors: 404 where the person has no such view. */
export async function removeFleetView(db: Database, personId: string, id: string): Promise<void> {
  await ownView(db, personId, id)
  await db.write([statement(db.read.delete(fleetViews).where(and(eq(fleetViews.id, id), eq(fleetViews.personId, personId))))])
}

async function ownView(db: Database, personId: string, id: string): Promise<FleetView> {
  const view = (await fleetViewsOf(db, personId)).find(one => one.id === id)
  if (!view) throw problem(404, 'No such view', 'It may have been removed.')
  return view
}

async function refuseTakenName(db: Database, personId: string, id: string, name: string): Promise<void> {
  const taken = (await fleetViewsOf(db, personId)).some(view => view.id !== id && view.name.toLowerCase() === name.toLowerCase())
  if (taken) throw problem(409, 'This name is taken', 'You have a view of this name.', [{ path: 'name', message: 'You have a view of this name.' }], { type: 'name-taken' })
}
