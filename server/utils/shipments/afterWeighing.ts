import type { Access } from '~~/utils/access/roles'
import type { ShipmentDispatch, ShipmentLine } from '~~/utils/contract/shipments'
import type { CustodyEvent } from '~~/utils/custody/event'
import type { Finding } from '~~/utils/custody/finding'
import { fold } from '~~/utils/custody/fold'
import { mayShip } from '~~/utils/custody/plan'
import { preview } from '~~/utils/custody/preview'
import { view } from '~~/utils/custody/view'
import { readingGrams } from '~~/utils/quantity/mass'
import { recordedEvents } from '../custody/custodyLog'
import { viewContext } from '../custody/foldContext'
import { saidByOthers } from '../custody/saidByOthers'
import type { Database } from '../database/database'
import { directory } from '../directory/directory'

/** A line as it would leave: why it may not, and the figures that its papers keep. */
export interface WeighedLine { cylinderId: string, because: Finding[], sent: NonNullable<ShipmentLine['sent']> }

type Line = ShipmentDispatch['lines'][number]

/** Each line judged as its cylinder stands once the weight just read is known. */
export async function afterWeighing(db: Database, lines: readonly Line[], access: Access, nowMs: number): Promise<WeighedLine[]> {
  const [from, said] = await Promise.all([directory(db), saidByOthers(db, lines.map(line => line.cylinderId))])
  return Promise.all(lines.map(async (line) => {
    const { cylinderId, gross } = line
    const context = viewContext(from, { access, nowMs, saidByOthers: said(cylinderId) })
    const events = await recordedEvents(db, cylinderId)
    const before = view(fold(events, context).state, context)
    const { view: weighed } = preview(events, weighing(line, nowMs), context)
    const { refrigerant, condition, netGrams } = weighed.contents
    return {
      cylinderId,
      // A weighing brings a cylinder back that is recorded as away; that must be recorded first, not guessed.
      because: [...mayShip(before).because.filter(({ code }) => code === 'away'), ...mayShip(weighed).because],
      sent: { gross, grossGrams: readingGrams(gross), refrigerant, condition, netGrams },
    }
  }))
}

function weighing({ eventId, cylinderId, gross }: Line, nowMs: number): CustodyEvent<'weighed'> {
  return { id: eventId, cylinderId, kind: 'weighed', occurredAt: new Date(nowMs).toISOString(), deviceId: '', deviceSeq: 0, details: { gross } }
}
