import type { CylinderRow, OpenList } from '~~/utils/custody/cylinderView'
import { openListName } from '~~/utils/shipment/openListName'
import type { Database } from '../database/database'

/** The open shipment or test lot that each of these cylinders stands on; those on none are left out. */
export async function openListsOf(db: Database, cylinderIds: readonly string[]): Promise<Map<string, OpenList>> {
  const { rows } = await db.readClient.execute({
    sql: `SELECT line.cylinder_id, line.list_kind, line.list_id, coalesce(shipments.number, test_lots.number)
      FROM open_lines AS line
      LEFT JOIN shipments ON line.list_kind = 'shipment' AND shipments.id = line.list_id
      LEFT JOIN test_lots ON line.list_kind = 'test-lot' AND test_lots.id = line.list_id
      WHERE line.cylinder_id IN (SELECT value FROM json_each(?))`,
    args: [JSON.stringify(cylinderIds)],
  })
  return new Map(rows.map(row => [row[0] as string, { kind: row[1] as OpenList['kind'], id: row[2] as string, number: row[3] as number }]))
}

/** Rows of the fleet, each with the open list that it stands on. */
export async function onTheirLists(db: Database, rows: readonly CylinderRow[]): Promise<CylinderRow[]> {
  const lists = await openListsOf(db, rows.map(({ id }) => id))
  return rows.map(row => lists.has(row.id) ? { ...row, openList: lists.get(row.id) } : row)
}

/** What shipments and test lots are called, by their ids. */
export async function listNames(db: Database, ids: readonly string[]): Promise<Map<string, string>> {
  const { rows } = await db.readClient.execute({
    sql: `SELECT id, 'shipment', number FROM shipments WHERE id IN (SELECT value FROM json_each(?))
      UNION ALL SELECT id, 'test-lot', number FROM test_lots WHERE id IN (SELECT value FROM json_each(?))`,
    args: [JSON.stringify(ids), JSON.stringify(ids)],
  })
  return new Map(rows.map(row => [row[0] as string, openListName({ kind: row[1] as OpenList['kind'], id: row[0] as string, number: row[2] as number })]))
}
