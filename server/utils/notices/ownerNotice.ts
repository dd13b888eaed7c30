import { applyCorrections } from '~~/utils/custody/corrections'
import type { AnyRecordedEvent, RecordedEvent } from '~~/utils/custody/event'
import type { Access } from '~~/utils/access/roles'
import { failedResultOf, type FailedResult } from '~~/utils/document/failedResult'
import { ownerNotice } from '~~/utils/document/ownerNotice'
import { formatDay, wallClock } from '~~/utils/quantity/instant'
import { recordedEvents } from '../custody/custodyLog'
import { cylinderView } from '../custody/cylinderViews'
import type { Database } from '../database/database'
import { directory } from '../directory/directory'
import { ownFirm } from '../firm'
import { firmById } from '../firms/firms'
import { problem } from '../http/problem'
import { paperPdf } from '../pdf/paperPdf'

/**
 * The notice to the owner of a rejected or condemned cylinder, as a PDF on letter paper.
 *
 * Errors: 404 where there is no such cylinder; 409 in words where it is neither.
 */
export async function printedOwnerNotice(db: Database, id: string, { access, nowMs }: { access: Access, nowMs: number }): Promise<Buffer> {
  const [view, events, { timeZone }, sender] = await Promise.all([cylinderView(db, id, { access, nowMs }), recordedEvents(db, id), directory(db), ownFirm()])
  if (!view) throw problem(404, 'No such cylinder', 'No cylinder has this code, serial or id.')
  const result = failedResultOf(view)
  const test = result && testOf(events, result)
  if (!result || !test) throw problem(409, 'No notice', 'It is neither rejected nor condemned, so there is nothing to tell its owner.')
  const [owner, requalifier] = await Promise.all([view.owner ? firmById(db, view.owner.id) : null, firmById(db, test.requalifierId)])
  const paper = ownerNotice(view, {
    result, sender,
    owner: owner ?? { name: sender.name, address: null },
    test: { month: test.month, method: test.method, requalifier: requalifier?.name ?? 'not known', rin: test.rin ?? requalifier?.rin ?? null },
    day: `${formatDay(nowMs, timeZone)} ${wallClock(nowMs, timeZone).year}`,
  })
  return paperPdf(paper, 'Notice to the owner')
}

/** The test that a cylinder stands rejected or condemned by, as it now counts: the first that condemned it, the last that rejected it. */
function testOf(events: readonly AnyRecordedEvent[], result: FailedResult): RecordedEvent<'retested'>['details'] | undefined {
  const tests = applyCorrections(events).flatMap(({ event, isOut }) => event.kind === 'retested' && !isOut && event.details.result === result ? [event.details] : [])
  return result === 'condemned' ? tests[0] : tests.at(-1)
}
