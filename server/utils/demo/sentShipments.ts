import type { InStatement } from '@libsql/client'
import type { ActKind } from '../../../utils/shipment/acts'
import type { Access } from '../../../utils/access/roles'
import type { ShipmentState } from '../../../utils/contract/shipments'
import type { Database } from '../database/database'
import { actStatement } from '../shipments/acts'
import { makePapers } from '../shipments/papers'
import { shipmentLines } from '../shipments/shipmentLines'
import { DAY, HOUR, workingMorning } from './calendar'
import type { DemoPerson } from './cast'
import type { DemoShipment, Stage } from './lives'
import { seededRandom } from './random'

const SEED = 20_261_217
/** The newest of those that were taken over are not closed yet. */
const NOT_CLOSED = 2

/** Where a shipment that has left stands at the story's end. Units: UTC milliseconds. */
export interface SentState { state: ShipmentState, arrivedAt: number | null, settledAt: number | null, closedAt: number | null }

/** How far each shipment that has left has come, in their order; the first of those that are not taken over has arrived. */
export function sentStates(sent: readonly DemoShipment[], endAt: number): SentState[] {
  const back = sent.filter(one => one.backAt <= endAt)
  const onTheWay = sent.filter(one => one.backAt > endAt)
  return sent.map((one) => {
    const arrivedAt = workingMorning(one.at + 2 * DAY) + 2 * HOUR
    if (one.backAt > endAt) {
      const hasArrived = one === onTheWay[0] && onTheWay.length > 1
      return { state: hasArrived ? 'arrived' : 'dispatched', arrivedAt: hasArrived ? arrivedAt : null, settledAt: null, closedAt: null }
    }
    const isClosed = back.indexOf(one) < back.length - NOT_CLOSED
    return { state: isClosed ? 'closed' : 'settled', arrivedAt, settledAt: one.backAt, closedAt: isClosed ? one.backAt + 2 * HOUR : null }
  })
}

/** What was done to the shipments that have left, and who carried them. */
export function sentShipmentActs({ shipments, cast: { people, firms }, endAt }: Stage): InStatement[] {
  const { uuid } = seededRandom(SEED)
  const sent = shipments.filter(one => one.cylinders.length > 0)
  const states = sentStates(sent, endAt)
  return sent.flatMap((one, index) => {
    const { arrivedAt, settledAt, closedAt } = states[index]!
    const act = (kind: ActKind, by: DemoPerson, at: number | null, details = {}): InStatement[] => at === null
      ? []
      : [actStatement({ id: uuid(at), shipmentId: one.id, kind, details, by: { personId: by.id }, occurredAt: at, recordedAt: at })]
    return [
      ...act('created', people.warehouse, one.at - 4 * HOUR, { cylinders: one.cylinders.length }),
      ...act('carrier-chosen', people.warehouse, one.at - 3 * HOUR, { carrierId: firms.carrier.id }),
      { sql: 'UPDATE shipments SET carrier_id = ? WHERE id = ?', args: [firms.carrier.id, one.id] },
      ...act('ready', people.warehouse, one.at - HOUR),
      ...act('dispatched', people.manager, one.at, { cylinders: one.cylinders.length }),
      ...act('arrived', people.manager, arrivedAt),
      ...act('settled', people.manager, settledAt),
      ...act('closed', people.manager, closedAt),
    ]
  })
}

/** The papers of the shipments that have left and are not closed. Asked once the history is recorded. */
export async function sentShipmentPapers(db: Database, { shipments, cast: { people }, endAt }: Stage): Promise<InStatement[]> {
  const access: Access = { personId: people.manager.id, roles: ['manager'], trainee: false }
  const sent = shipments.filter(one => one.cylinders.length > 0)
  const states = sentStates(sent, endAt)
  const statements: InStatement[] = []
  for (const one of sent.filter((_, index) => states[index]!.state !== 'closed')) {
    const lines = (await shipmentLines(db, one.id)).flatMap(({ cylinderId, sent: figures }) => figures === null ? [] : [{ cylinderId, sent: figures }])
    const papers = await makePapers(db, one.id, lines, { access, nowMs: one.at })
    statements.push({ sql: 'UPDATE shipments SET papers = ? WHERE id = ?', args: [JSON.stringify(papers), one.id] })
  }
  return statements
}
