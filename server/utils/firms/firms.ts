import { and, asc, eq, sql } from 'drizzle-orm'
import { cylinders, firms, places } from '~~/drizzle/schema'
import type { Firm } from '~~/utils/contract/places'
import type { Database } from '../database/database'

/** The firms that cylinders go to and come from, by name, each with its place and how many cylinders stand there now. */
export function listFirms(db: Database, only: { active?: boolean, kind?: Firm['kind'], id?: string } = {}): Promise<Firm[]> {
  return db.read.select({
    id: firms.id,
    name: firms.name,
    kind: firms.kind,
    telephone: firms.telephone,
    email: firms.email,
    address: firms.address,
    rin: firms.rin,
    placeId: places.id,
    active: firms.active,
    cylinders: sql<number>`(SELECT count(*) FROM ${cylinders} WHERE ${cylinders.placeId} = ${places.id})`,
  }).from(firms)
    .innerJoin(places, eq(places.firmId, firms.id))
    .where(and(
      only.active === undefined ? undefined : eq(firms.active, only.active),
      only.kind === undefined ? undefined : eq(firms.kind, only.kind),
      only.id === undefined ? undefined : eq(firms.id, only.id),
    ))
    .orderBy(asc(sql`lower(${firms.name})`), asc(firms.id))
}

/** One firm; null where there is none of this id. */
export async function firmById(db: Database, id: string): Promise<Firm | null> {
  return (await listFirms(db, { id }))[0] ?? null
}
