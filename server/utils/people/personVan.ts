import type { InStatement } from '@libsql/client'
import { and, eq, exists, ne, type SQLWrapper } from 'drizzle-orm'
import { places } from '../../../drizzle/schema'
import { statement, type Database } from '../database/database'

/**
 * Gives a person a van, or none; the vans that were theirs then stand without a technician. Whose a van is, is kept with
 * the van alone.
 *
 * @param holds a query: nothing happens where it finds nothing.
 */
export function giveVan({ read }: Database, personId: string, vanId: string | null, holds: SQLWrapper): InStatement[] {
  const isVan = and(eq(places.kind, 'van'), exists(holds))
  const others = and(isVan, eq(places.technicianId, personId), vanId === null ? undefined : ne(places.id, vanId))
  return [
    statement(read.update(places).set({ technicianId: null }).where(others)),
    ...(vanId === null ? [] : [statement(read.update(places).set({ technicianId: personId }).where(and(isVan, eq(places.id, vanId), eq(places.active, true))))]),
  ]
}
