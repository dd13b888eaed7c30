import type { Access } from '~~/utils/access/roles'
import type { TestLotDispatch } from '~~/utils/contract/testLots'
import type { Finding } from '~~/utils/custody/finding'
import { mayTest } from '~~/utils/custody/plan'
import { areRecorded, effectOf, hasLines, refuseHeldBack, refuseOtherLines, refuseRefused } from '../cylinder-lists/lineCommands'
import { refuseUnlessDraft } from '../cylinder-lists/drafts'
import { append } from '../custody/append'
import { cylinderViews } from '../custody/cylinderViews'
import type { Guard, Posting } from '../custody/posting'
import type { Database } from '../database/database'
import { directory } from '../directory/directory'
import { theTestLot } from './testLots'
import { testLotLines } from './testLotLines'

/**
 * Sends a draft off to the test station: every line in one commit, or nothing. The same request sent again changes nothing.
 *
 * Errors: 404; 409 where it has left already, where its lines are others, where a cylinder has changed since it was
 * looked at, and with the reasons of each line that may not go.
 */
export async function dispatchTestLot(db: Database, id: string, body: TestLotDispatch, access: Access, now: number): Promise<void> {
  const lot = await theTestLot(db, id)
  const isRepeated = lot.state !== 'draft' && await areRecorded(db, body.lines.map(line => line.eventId))
  if (!isRepeated) await refuseUnlessDraft(db, { kind: 'test-lot', id })

  const placeId = (await directory(db)).placeOfFirm.get(lot.requalifier.id)
  const events = body.lines.map(({ cylinderId, eventId, expects }) => ({
    id: eventId, cylinderId, kind: 'sent-for-test', occurredAt: body.occurredAt, placeId, expects, details: { lotId: id },
  }))
  const posting: Posting = { events, access, now, deviceNow: body.deviceNow === undefined ? null : Date.parse(body.deviceNow) }
  if (isRepeated) return refuseRefused(await append(db, { ...posting, dispatch: { alongside: () => [] } }))

  const ids = body.lines.map(line => line.cylinderId)
  refuseOtherLines(ids, (await testLotLines(db, id)).map(line => line.cylinderId))
  refuseHeldBack(await reasonsOf(db, ids, access, now))
  const eventIds = body.lines.map(line => line.eventId)
  try {
    refuseRefused(await append(db, { ...posting, dispatch: { alongside: guard => departure(id, ids, { eventIds, sentBy: access.personId }, guard) } }))
  }
  catch (error) {
    // The commit fails where the draft or its lines changed under us; then the reason is told, else the error itself.
    await refuseUnlessDraft(db, { kind: 'test-lot', id })
    refuseOtherLines(ids, (await testLotLines(db, id)).map(line => line.cylinderId))
    throw error
  }
}

async function reasonsOf(db: Database, ids: readonly string[], access: Access, nowMs: number): Promise<Finding[][]> {
  const because = new Map((await cylinderViews(db, ids, { access, nowMs })).map(view => [view.id, mayTest(view).because]))
  return ids.map(cylinderId => because.get(cylinderId) ?? [])
}

function departure(id: string, cylinderIds: readonly string[], by: { eventIds: readonly string[], sentBy: string }, guard: Guard) {
  const same = hasLines({ kind: 'test-lot', id }, cylinderIds)
  const effect = effectOf(by.eventIds)
  return [{
    // A lot that is no draft with these lines any more gets no state, which its column refuses: all is undone.
    sql: `UPDATE test_lots SET state = CASE WHEN state = 'draft' AND ${same.sql} THEN 'sent' END, sent_at = ${effect.sql}, sent_by = ?
      WHERE id = ? AND ${guard.sql}`,
    args: [...same.args, ...effect.args, by.sentBy, id, ...guard.args],
  }]
}
