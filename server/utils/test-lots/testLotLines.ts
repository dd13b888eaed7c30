import type { Database } from '../database/database'

/** The lines as stored, in their order; one that is back is no longer open. */
export async function testLotLines(db: Database, lotId: string): Promise<{ cylinderId: string, open: boolean }[]> {
  const { rows } = await db.readClient.execute({
    sql: `SELECT line.cylinder_id, open_lines.list_id IS NOT NULL FROM test_lot_lines AS line
      LEFT JOIN open_lines ON open_lines.cylinder_id = line.cylinder_id AND open_lines.list_id = line.lot_id
      WHERE line.lot_id = ? ORDER BY line.position`,
    args: [lotId],
  })
  return rows.map(row => ({ cylinderId: row[0] as string, open: row[1] === 1 }))
}
