import type { Row } from '@libsql/client'
import type { TestLot, TestLotsAnswer, TestLotsQuery } from '~~/utils/contract/testLots'
import { instantText, pageByNumber, pageFilter } from '../cylinder-lists/paging'
import type { Database } from '../database/database'
import { problem } from '../http/problem'

const SELECT_LOTS = `SELECT test_lots.id, test_lots.number, test_lots.requalifier_id, firms.name AS firm_name, firms.rin, test_lots.state,
    test_lots.note, test_lots.created_at, test_lots.sent_at, test_lots.back_at, count(line.cylinder_id) AS line_count
  FROM test_lots
  JOIN firms ON firms.id = test_lots.requalifier_id
  LEFT JOIN test_lot_lines AS line ON line.lot_id = test_lots.id`

/** The test lots, the newest first. Errors: 400 for a cursor that is none of ours. */
export async function listTestLots(db: Database, query: TestLotsQuery): Promise<TestLotsAnswer> {
  const filter = pageFilter('test-lot', query)
  const { rows } = await db.readClient.execute({
    sql: `${SELECT_LOTS} WHERE ${filter.sql} GROUP BY test_lots.id ORDER BY test_lots.number DESC LIMIT ?`,
    args: [...filter.args, query.limit + 1],
  })
  return pageByNumber(rows.map(testLotOf), query.limit)
}

/** One test lot. Errors: 404. */
export async function theTestLot(db: Database, id: string): Promise<TestLot> {
  const { rows } = await db.readClient.execute({ sql: `${SELECT_LOTS} WHERE test_lots.id = ? GROUP BY test_lots.id`, args: [id] })
  if (!rows[0]) throw problem(404, 'No such test lot', 'It may have been written wrongly.')
  return testLotOf(rows[0])
}

function testLotOf(row: Row): TestLot {
  return {
    id: row['id'] as string,
    number: row['number'] as number,
    requalifier: { id: row['requalifier_id'] as string, name: row['firm_name'] as string, rin: row['rin'] as string | null },
    state: row['state'] as TestLot['state'],
    note: row['note'] as string | null,
    createdAt: instantText(row['created_at'])!,
    sentAt: instantText(row['sent_at']),
    backAt: instantText(row['back_at']),
    cylinders: row['line_count'] as number,
  }
}
