import type { Access } from '~~/utils/access/roles'
import type { ShipmentDispatch, ShipmentLine } from '~~/utils/contract/shipments'
import type { AnyRecordedEvent, RecordedEvent } from '~~/utils/custody/event'
import type { Finding } from '~~/utils/custody/finding'
import { fold } from '~~/utils/custody/fold'
import { mayShip } from '~~/utils/custody/plan'
import { view } from '~~/utils/custody/view'
import { readingGrams, type MassReading } from '~~/utils/quantity/mass'
import { recordedEvents } from '../custody/custodyLog'
import { codesOnTwo } from '../custody/findCylinder'
import { foldContext, viewContext } from '../custody/foldContext'
import type { Database } from '../database/database'
import { directory } from '../directory/directory'

/** A line as it would leave: why it may not, and the figures that its papers keep. */
export interface WeighedLine { cylinderId: string, because: Finding[], sent: NonNullable<ShipmentLine['sent']> }

/** Each line judged as its cylinder stands once the weight just read is known. */
export async function afterWeighing(db: Database, lines: ShipmentDispatch['lines'], access: Access, nowMs: number): Promise<WeighedLine[]> {
  const [from, shared] = await Promise.all([directory(db), codesOnTwo(db, lines.map(line => line.cylinderId))])
  return Promise.all(lines.map(async ({ cylinderId, eventId, gross }) => {
    const events = await recordedEvents(db, cylinderId)
    const weighing = weighingNow({ id: eventId, cylinderId, gross, version: events.length + 1, access, nowMs })
    const { state } = fold([...events, weighing] as AnyRecordedEvent[], foldContext(from))
    const weighed = view(state, viewContext(from, { access, nowMs, codesOnTwo: shared.get(cylinderId) }))
    const { refrigerant, condition, netGrams } = weighed.contents
    return { cylinderId, because: mayShip(weighed).because, sent: { gross, grossGrams: readingGrams(gross), refrigerant, condition, netGrams } }
  }))
}

interface Weighing { id: string, cylinderId: string, gross: MassReading, version: number, access: Access, nowMs: number }

/** A weighing as the log would hold it, had it been recorded now. */
function weighingNow({ id, cylinderId, gross, version, access, nowMs }: Weighing): RecordedEvent<'weighed'> {
  return {
    seq: Number.MAX_SAFE_INTEGER, id, cylinderId, version, kind: 'weighed',
    occurredAt: nowMs, occurredOffsetMinutes: 0, clockSkewSeconds: 0, effectiveAt: nowMs, recordedAt: nowMs,
    deviceId: '', deviceSeq: 0, actorId: access.personId, postedBy: access.personId, supervisorId: null, trainee: access.trainee,
    placeId: null, note: null, practice: false, confirmed: [], details: { gross },
  }
}
