import type { Access } from '~~/utils/access/roles'
import type { TestLotReturn } from '~~/utils/contract/testLots'
import { areRecorded, effectOf, refuseRefused } from '../cylinder-lists/lineCommands'
import { append } from '../custody/append'
import type { Guard } from '../custody/posting'
import type { Database } from '../database/database'
import { directory } from '../directory/directory'
import { problem } from '../http/problem'
import { theTestLot } from './testLots'
import { testLotLines } from './testLotLines'

const EVENTS_A_LINE = 2

/**
 * Lines of a lot come back with what the test found, in one commit; the lot is back when all of them are. The same
 * request sent again changes nothing.
 *
 * Errors: 404; 409 where the lot has not left, or a line is not on it or back already; 422 for a place of a firm.
 */
export async function returnTestLot(db: Database, id: string, body: TestLotReturn, access: Access, now: number): Promise<void> {
  const lot = await theTestLot(db, id)
  const eventIds = body.lines.flatMap(line => [line.retestedEventId, line.returnedEventId])
  const isRepeated = await areRecorded(db, eventIds)
  if (!isRepeated) await refuseUnlessOut(db, id, body)
  await refuseOtherPlace(db, body.toPlaceId)

  const events = body.lines.flatMap(line => eventsOf(line, body, lot.requalifier.id))
  const ids = body.lines.map(line => line.cylinderId)
  const deviceNow = body.deviceNow === undefined ? null : Date.parse(body.deviceNow)
  try {
    const results = await append(db, { events, access, now, deviceNow, dispatch: { alongside: guard => arrival(id, ids, effectOf(eventIds), guard) } })
    refuseRefused(results, event => Math.floor(event / EVENTS_A_LINE))
  }
  catch (error) {
    // The commit fails where somebody else took a line back meanwhile; then that is told, else the error itself.
    if (!isRepeated) await refuseUnlessOut(db, id, body)
    throw error
  }
}

/**
 * The test and the return of one line, in this order: what a new tare makes of the gross counts from the test on. A
 * condemned cylinder comes back first, for nothing may follow its end.
 */
function eventsOf(line: TestLotReturn['lines'][number], { occurredAt, toPlaceId }: TestLotReturn, requalifierId: string): object[] {
  const { cylinderId, month, method, result, rin, suffix, newTare, gross } = line
  const retested = {
    id: line.retestedEventId, cylinderId, kind: 'retested', occurredAt,
    details: { month, method, result, requalifierId, ...(rin && { rin }), ...(suffix && { suffix }), ...(newTare && { newTare }) },
  }
  const returned = {
    id: line.returnedEventId, cylinderId, kind: 'returned', occurredAt, placeId: toPlaceId,
    details: { fromFirmId: requalifierId, ...(gross && { gross }) },
  }
  const inOrder = result === 'condemned' ? [returned, retested] : [retested, returned]
  return inOrder.map((event, index) => ({ ...event, deviceSeq: index + 1 }))
}

function arrival(id: string, cylinderIds: readonly string[], effect: Guard, guard: Guard) {
  const ids = JSON.stringify(cylinderIds)
  const remaining = `(SELECT count(*) FROM open_lines WHERE list_id = ?)`
  const theseAreOut = `(SELECT count(*) FROM open_lines WHERE list_id = ? AND cylinder_id IN (SELECT value FROM json_each(?))) = ?`
  return [
    {
      // A lot that is not out with these lines any more gets no state, which its column refuses: all is undone.
      sql: `UPDATE test_lots SET
          state = CASE WHEN state <> 'sent' OR NOT ${theseAreOut} THEN NULL WHEN ${remaining} = ? THEN 'back' ELSE 'sent' END,
          back_at = CASE WHEN ${remaining} = ? THEN ${effect.sql} END
        WHERE id = ? AND ${guard.sql}`,
      args: [id, ids, cylinderIds.length, id, cylinderIds.length, id, cylinderIds.length, ...effect.args, id, ...guard.args],
    },
    {
      sql: `DELETE FROM open_lines WHERE list_id = ? AND cylinder_id IN (SELECT value FROM json_each(?)) AND ${guard.sql}`,
      args: [id, ids, ...guard.args],
    },
  ]
}

async function refuseUnlessOut(db: Database, id: string, body: TestLotReturn): Promise<void> {
  const { state } = await theTestLot(db, id)
  if (state !== 'sent') throw problem(409, 'This lot is not at the test station', `It is ${state}.`)
  const out = new Set((await testLotLines(db, id)).filter(line => line.open).map(line => line.cylinderId))
  const errors = body.lines.flatMap(({ cylinderId }, index) => out.has(cylinderId)
    ? []
    : [{ path: `lines.${index}.cylinderId`, message: 'does not stand on it, or is back already' }])
  if (errors.length > 0) throw problem(409, 'The lines have changed', 'Look at the lot again, then decide.', errors)
}

async function refuseOtherPlace(db: Database, placeId: string): Promise<void> {
  const place = (await directory(db)).places.get(placeId) ?? (await directory(db, true)).places.get(placeId)
  if (place && place.firmId === null) return
  throw problem(422, 'Not a place of ours', 'Choose where the cylinders came back to.', [{ path: 'toPlaceId', message: 'must be a place of ours' }])
}
