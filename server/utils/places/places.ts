import { and, asc, eq, sql } from 'drizzle-orm'
import { cylinders, people, places } from '~~/drizzle/schema'
import type { Place } from '~~/utils/contract/places'
import type { Database } from '../database/database'

/** The places where cylinders stand, by name, each with how many stand there now. */
export function listPlaces(db: Database, only: { active?: boolean, id?: string } = {}): Promise<Place[]> {
  return db.read.select({
    id: places.id,
    name: places.name,
    kind: places.kind,
    parentId: places.parentId,
    firmId: places.firmId,
    technicianId: places.technicianId,
    technicianName: people.name,
    active: places.active,
    cylinders: sql<number>`(SELECT count(*) FROM ${cylinders} WHERE ${cylinders.placeId} = ${places.id})`,
  }).from(places)
    .leftJoin(people, eq(people.id, places.technicianId))
    .where(and(
      only.active === undefined ? undefined : eq(places.active, only.active),
      only.id === undefined ? undefined : eq(places.id, only.id),
    ))
    .orderBy(asc(sql`lower(${places.name})`), asc(places.id))
}

/** One place; null where there is none of this id. */
export async function placeById(db: Database, id: string): Promise<Place | null> {
  return (await listPlaces(db, { id }))[0] ?? null
}
