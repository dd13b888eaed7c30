import type { Access } from '~~/utils/access/roles'
import type { TestLotLine, TestLotWithLines } from '~~/utils/contract/testLots'
import { mayTest } from '~~/utils/custody/plan'
import { cylinderViews } from '../custody/cylinderViews'
import { cylinderRows } from '../custody/fleet'
import type { Database } from '../database/database'
import { testResultsOf } from './testResults'
import { theTestLot } from './testLots'

/** A test lot with its lines: while a draft each with why it may not go, afterwards each with what the test found. Errors: 404. */
export async function testLotWithLines(db: Database, id: string, access: Access, nowMs: number): Promise<TestLotWithLines> {
  const [lot, stored] = await Promise.all([theTestLot(db, id), storedLines(db, id)])
  const ids = stored.map(line => line.cylinderId)
  const [rows, views, results] = await Promise.all([
    cylinderRows(db, ids, nowMs),
    lot.state === 'draft' ? cylinderViews(db, ids, { access, nowMs }) : [],
    lot.sentAt === null ? new Map<string, TestLotLine['result']>() : testResultsOf(db, id),
  ])
  const because = new Map(views.map(view => [view.id, mayTest(view).because]))
  const lines = stored.flatMap(({ cylinderId, open }): TestLotLine[] => {
    const found = rows.get(cylinderId)
    if (!found) return []
    const { row, version } = found
    return [{ cylinder: row, version, because: because.get(cylinderId) ?? [], open, result: results.get(cylinderId) ?? null }]
  })
  return { ...lot, lines }
}

/** The lines as stored, in their order; one that is back is no longer open. */
export async function storedLines(db: Database, lotId: string): Promise<{ cylinderId: string, open: boolean }[]> {
  const { rows } = await db.readClient.execute({
    sql: `SELECT line.cylinder_id, open_lines.list_id IS NOT NULL FROM test_lot_lines AS line
      LEFT JOIN open_lines ON open_lines.cylinder_id = line.cylinder_id AND open_lines.list_id = line.lot_id
      WHERE line.lot_id = ? ORDER BY line.position`,
    args: [lotId],
  })
  return rows.map(row => ({ cylinderId: row[0] as string, open: row[1] === 1 }))
}
