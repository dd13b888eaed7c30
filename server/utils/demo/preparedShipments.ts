import type { Access } from '../../../utils/access/roles'
import type { CylinderView } from '../../../utils/custody/cylinderView'
import { mayShip } from '../../../utils/custody/plan'
import { nearestToDivision } from '../../../utils/quantity/mass'
import { cylinderViews } from '../custody/cylinderViews'
import type { Database } from '../database/database'
import { cancelShipment } from '../shipments/cancelShipment'
import { chooseCarrier } from '../shipments/chooseCarrier'
import { createShipment } from '../shipments/createShipment'
import { readyShipment } from '../shipments/readyShipment'
import { weighLine } from '../shipments/weighLine'
import { HOUR, MINUTE } from './calendar'
import type { Cast } from './cast'
import { seededRandom } from './random'

const SEED = 20_261_219
/** Named by an entry of their own, so that nobody has to judge how they travel. */
const LISTED = new Set(['R-22', 'R-134a', 'R-404A', 'R-407C'])
const LINES = 2

/**
 * Three shipments that have not left: one begun and half weighed, one that is ready, one that was given up.
 *
 * By the same way as a person prepares one; asked once the history is recorded.
 */
export async function prepareShipments(db: Database, { people, firms }: Cast, now: number): Promise<void> {
  const { uuid } = seededRandom(SEED)
  const { warehouse } = people
  const access: Access = { personId: warehouse.id, roles: ['warehouse'], trainee: false }
  let at = now - 3 * HOUR
  const act = () => {
    at += MINUTE
    return { id: uuid(at), occurredAt: new Date(at).toISOString() }
  }
  const begun = async (cylinders: readonly CylinderView[], note: string | null) => {
    at += MINUTE
    return createShipment(db, { id: uuid(at), toFirmId: firms.reclaimer.id, cylinderIds: cylinders.map(({ id }) => id), note }, warehouse.id, at)
  }
  const weigh = (shipmentId: string, { id, labelCode, stamp, contents }: CylinderView) => weighLine(
    db, shipmentId, { ...act(), ref: labelCode ?? id, gross: nearestToDivision(stamp!.tareWeightGrams! + contents.netGrams!, 'lb') }, warehouse.id, at,
  )

  const free = await shippable(db, now)
  const [givenUp, half, whole] = [0, 1, 2].map(index => free.slice(index * LINES, (index + 1) * LINES)) as [CylinderView[], CylinderView[], CylinderView[]]
  await cancelShipment(db, await begun(givenUp, null), { ...act(), reason: 'They are wanted on a job this week' }, warehouse.id, at)

  const draft = await begun(half, 'Ring the dock the day before.')
  await weigh(draft, half[0]!)

  const ready = await begun(whole, null)
  for (const cylinder of whole) await weigh(ready, cylinder)
  await chooseCarrier(db, ready, { ...act(), carrierId: firms.carrier.id }, warehouse.id, at)
  await readyShipment(db, ready, act(), access, at)
}

/** Half full cylinders that stand in the shop, have nothing wrong with them, and are on no list. */
async function shippable(db: Database, nowMs: number): Promise<CylinderView[]> {
  const { rows } = await db.readClient.execute(`SELECT cylinders.id FROM cylinders JOIN places ON places.id = cylinders.place_id
    WHERE cylinders.lifecycle = 'in-service' AND cylinders.net_grams BETWEEN 0.3 * cylinders.fill_limit_grams AND 0.8 * cylinders.fill_limit_grams
      AND places.kind IN ('shop', 'rack') AND NOT EXISTS (SELECT 1 FROM open_lines WHERE cylinder_id = cylinders.id) ORDER BY cylinders.id`)
  const views = await cylinderViews(db, rows.map(row => row[0] as string), { access: null, nowMs })
  return views.filter(view => view.findings.length === 0 && mayShip(view).allowed && view.contents.condition === 'clean'
    && view.contents.refrigerant !== null && LISTED.has(view.contents.refrigerant) && view.stamp?.tareWeightGrams != null)
}
