import type { TestLotLine } from '~~/utils/contract/testLots'
import type { DetailsOf } from '~~/utils/custody/schema'
import { logRow, recordedEvent, SELECT_LOG } from '../custody/logRow'
import type { Database } from '../database/database'

/** What the test found on each line that is back from a lot, by cylinder: the first test recorded after it left with the lot. */
export async function testResultsOf(db: Database, lotId: string): Promise<Map<string, TestLotLine['result']>> {
  const { rows } = await db.readClient.execute({
    sql: `WITH sent AS (
        SELECT cylinder_id, max(seq) AS seq FROM custody_events WHERE kind = 'sent-for-test'
          AND cylinder_id IN (SELECT cylinder_id FROM test_lot_lines WHERE lot_id = ?)
          AND lower(json_extract(body, '$.details.lotId')) = ? GROUP BY cylinder_id)
      ${SELECT_LOG} AS test WHERE kind = 'retested' AND seq = (
        SELECT min(later.seq) FROM custody_events AS later JOIN sent ON sent.cylinder_id = later.cylinder_id
        WHERE later.cylinder_id = test.cylinder_id AND later.kind = 'retested' AND later.seq > sent.seq)`,
    args: [lotId, lotId],
  })
  return new Map(rows.map((row) => {
    const { cylinderId, details } = recordedEvent(logRow(row))
    const { result, month } = details as DetailsOf<'retested'>
    return [cylinderId, { result, month }]
  }))
}
