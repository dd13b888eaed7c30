import type { Access } from '~~/utils/access/roles'
import type { TestLotLine, TestLotWithLines } from '~~/utils/contract/testLots'
import { mayTest } from '~~/utils/custody/plan'
import { cylinderViews } from '../custody/cylinderViews'
import { cylinderRows } from '../custody/fleet'
import type { Database } from '../database/database'
import { testLotLines } from './testLotLines'
import { testResultsOf } from './testResults'
import { theTestLot } from './testLots'

/** A test lot with its lines: while a draft each with why it may not go, afterwards each with what the test found. Errors: 404. */
export async function testLotWithLines(db: Database, id: string, access: Access, nowMs: number): Promise<TestLotWithLines> {
  const [lot, stored] = await Promise.all([theTestLot(db, id), testLotLines(db, id)])
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
