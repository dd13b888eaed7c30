import type { Guard } from '../custody/posting'
import type { Database } from '../database/database'
import { problem } from '../http/problem'
import { LISTS, type ListKind, type ListRef } from './lists'

/** Holds where none of the cylinders stands on another open list. */
export function freeFor(list: ListRef, cylinderIds: readonly string[]): Guard {
  return {
    sql: 'NOT EXISTS (SELECT 1 FROM open_lines WHERE cylinder_id IN (SELECT value FROM json_each(?)) AND list_id <> ?)',
    args: [JSON.stringify(cylinderIds), list.id],
  }
}

/** Errors: 422 for cylinders that nobody has registered; 409 naming the other list on which one stands already. */
export async function refuseUnfree(db: Database, list: ListRef, cylinderIds: readonly string[]): Promise<void> {
  const ids = JSON.stringify(cylinderIds)
  const [known, taken] = await db.readClient.batch([
    { sql: 'SELECT id FROM cylinders WHERE id IN (SELECT value FROM json_each(?))', args: [ids] },
    {
      sql: `SELECT line.cylinder_id, line.list_kind, coalesce(shipments.number, test_lots.number), cylinders.label_code
        FROM open_lines AS line
        LEFT JOIN shipments ON line.list_kind = 'shipment' AND shipments.id = line.list_id
        LEFT JOIN test_lots ON line.list_kind = 'test-lot' AND test_lots.id = line.list_id
        LEFT JOIN cylinders ON cylinders.id = line.cylinder_id
        WHERE line.cylinder_id IN (SELECT value FROM json_each(?)) AND line.list_id <> ?`,
      args: [ids, list.id],
    },
  ], 'read')

  const isKnown = new Set(known?.rows.map(row => row[0]))
  const unknown = cylinderIds.flatMap((id, index) => isKnown.has(id) ? [] : [{ path: `cylinderIds.${index}`, message: 'no such cylinder' }])
  if (unknown.length > 0) throw problem(422, 'It names what nobody knows', 'Choose the cylinders again.', unknown)

  const errors = (taken?.rows ?? []).map(row => ({
    path: `cylinderIds.${cylinderIds.indexOf(row[0] as string)}`,
    message: `${row[3] ?? 'this cylinder'} stands on ${LISTS[row[1] as ListKind].word} ${row[2]}`,
  }))
  if (errors.length > 0) {
    throw problem(409, 'Already on another list', 'A cylinder stands on one open shipment or test lot at a time. Take it off there first.', errors)
  }
}
