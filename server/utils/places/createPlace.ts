import { v7 as uuid } from 'uuid'
import { places } from '~~/drizzle/schema'
import type { NewPlace, Place } from '~~/utils/contract/places'
import { statement, type Database } from '../database/database'
import { directory } from '../directory/directory'
import { problem } from '../http/problem'
import { placeErrors } from './placeErrors'
import { placeById } from './places'

/**
 * A new place of ours.
 *
 * Errors: 422 for a parent or technician that nobody knows; 409 where another place has this id. The same place sent
 * again is answered as it stands.
 */
export async function createPlace(db: Database, body: NewPlace, now: number): Promise<Place> {
  const row = {
    id: body.id ?? uuid(),
    name: body.name,
    kind: body.kind,
    parentId: body.parentId ?? null,
    technicianId: body.technicianId ?? null,
  }
  const errors = placeErrors(await directory(db, true), row)
  if (errors.length > 0) throw problem(422, 'This place cannot be', 'Mend what is named.', errors)

  await db.write([statement(db.read.insert(places).values({ ...row, createdAt: now }).onConflictDoNothing())])
  await directory(db, true)
  const place = await placeById(db, row.id)
  const isTheSame = place !== null && (Object.keys(row) as (keyof typeof row)[]).every(key => place[key] === row[key])
  if (!isTheSame) throw problem(409, 'Another place has this id', 'Send it again under a new id.')
  return place
}
