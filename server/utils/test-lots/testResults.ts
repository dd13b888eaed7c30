import type { TestLotLine } from '~~/utils/contract/testLots'
import { lineEvents } from '../cylinder-lists/lineEvents'
import type { Database } from '../database/database'

/** What the test found on each line that is back from a lot, by cylinder: the first test after it left with the lot. */
export async function testResultsOf(db: Database, lotId: string): Promise<Map<string, TestLotLine['result']>> {
  const events = await lineEvents(db, { kind: 'test-lot', id: lotId }, ['sent-for-test', 'retested'])
  return new Map([...events].flatMap(([cylinderId, ofCylinder]) => {
    const left = ofCylinder.findIndex(event => event.kind === 'sent-for-test' && event.details.lotId === lotId)
    const test = left < 0 ? undefined : ofCylinder.slice(left).find(event => event.kind === 'retested')
    return test ? [[cylinderId, { result: test.details.result, month: test.details.month }] as const] : []
  }))
}
