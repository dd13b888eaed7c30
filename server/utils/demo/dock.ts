import type { InStatement } from '@libsql/client'
import { dockLinks } from '../../../drizzle/schema'
import type { DockKind } from '../../../utils/dock/entry'
import { nearestToDivision } from '../../../utils/quantity/mass'
import { statement, type Database } from '../database/database'
import { actStatement } from '../shipments/acts'
import { shipmentLines } from '../shipments/shipmentLines'
import { DAY, MINUTE } from './calendar'
import type { Cast } from './cast'
import { seededRandom } from './random'

const SEED = 20_261_223
const NAME = 'Rosa Lindqvist'

/** What was said at the dock of the shipment that has arrived: one weighed as it left, one short and damaged, the rest ticked. Asked once it has. */
export async function dockStatements(db: Database, { people, firms }: Cast, now: number): Promise<InStatement[]> {
  const { rows } = await db.readClient.execute('SELECT id, dispatched_at, arrived_at FROM shipments WHERE state = \'arrived\' ORDER BY number LIMIT 1')
  const arrived = rows[0]
  if (!arrived) return []
  const { uuid } = seededRandom(SEED)
  const [shipmentId, leftAt] = [arrived['id'] as string, arrived['dispatched_at'] as number]
  const link = {
    id: uuid(leftAt), shipmentId, forWhom: `${firms.reclaimer.name}, dock`, createdBy: people.manager.id, createdAt: leftAt,
    expiresAt: Math.floor((Math.max(now, leftAt) + 30 * DAY) / 1000) * 1000, firstUsedAt: arrived['arrived_at'] as number,
  }
  let at = link.firstUsedAt
  function said(kind: DockKind, cylinderId: string, details: Record<string, unknown> = {}): InStatement {
    at = Math.min(at + 2 * MINUTE, now)
    return actStatement({ id: uuid(at), shipmentId, kind: `dock-${kind}`, cylinderId, details, by: { linkId: link.id, linkName: NAME }, occurredAt: at, recordedAt: at })
  }
  const lines = (await shipmentLines(db, shipmentId)).flatMap(({ cylinderId, sent }) => sent ? [{ cylinderId, grams: sent.grossGrams }] : [])
  return [
    statement(db.read.insert(dockLinks).values(link)),
    actStatement({
      id: uuid(leftAt), shipmentId, kind: 'link-made', details: { linkId: link.id, forWhom: link.forWhom }, by: { personId: people.manager.id },
      occurredAt: leftAt, recordedAt: leftAt,
    }),
    ...lines.flatMap(({ cylinderId, grams }, index): InStatement[] => {
      if (index === 0) return [said('here', cylinderId), said('gross', cylinderId, { gross: nearestToDivision(grams - 40, 'lb') })]
      if (index !== 1) return [said('here', cylinderId)]
      return [
        said('gross', cylinderId, { gross: nearestToDivision(grams * 0.96, 'lb') }),
        said('damaged', cylinderId, { what: 'Collar bent, valve hard to turn', photoIds: [] }),
      ]
    }),
  ]
}
