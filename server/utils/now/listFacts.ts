import type { InStatement } from '@libsql/client'
import type { ListFacts, NowFacts, ShortVanFacts, VanFacts } from '../../../utils/now/nowFacts'
import { MS_PER_DAY } from '../../../utils/quantity/instant'
import { cylinderName } from '../../../utils/shipment/changedLines'
import { vanLoad } from '../../../utils/transport/vanLoad'
import type { Database } from '../database/database'
import type { Directory } from '../directory/directory'
import { lastCheckIn, toLookFor } from '../vans/checkIns'
import { materialsOf } from '../vans/materials'
import { HAS_UNWEIGHED } from '../shipments/shipments'
import { ownVans } from '../vans/ownVans'
import { standingIn } from '../vans/standingIn'

/** A shipment without a receipt is asked about after so many days: common practice, no source. */
const SHIPMENT_WAITS_DAYS = 7
/** A test lot that is not back is asked about after so many days: common practice, no source. */
const LOT_WAITS_DAYS = 30

type Lists = Pick<NowFacts, 'shipmentsReady' | 'shipmentsAway' | 'lotsAway' | 'shipmentDrafts' | 'lotDrafts'>

/** Shipments and test lots that are drafts, that are ready, or that have been away for long. */
export async function listFacts(db: Database, nowMs: number): Promise<Lists> {
  const answers = await db.readClient.batch([
    listed('shipments', 'ready_at', `state = 'ready' AND NOT ${HAS_UNWEIGHED} AND ready_at <= ?`, nowMs),
    listed('shipments', 'dispatched_at', `state IN ('dispatched', 'arrived') AND dispatched_at <= ?`, nowMs - SHIPMENT_WAITS_DAYS * MS_PER_DAY),
    listed('test_lots', 'sent_at', `state = 'sent' AND sent_at <= ?`, nowMs - LOT_WAITS_DAYS * MS_PER_DAY),
    listed('shipments', 'created_at', `(state = 'draft' OR state = 'ready' AND ${HAS_UNWEIGHED}) AND created_at <= ?`, nowMs),
    listed('test_lots', 'created_at', `state = 'draft' AND created_at <= ?`, nowMs),
  ], 'read')
  const [shipmentsReady, shipmentsAway, lotsAway, shipmentDrafts, lotDrafts] = answers.map(({ rows: [row] }): ListFacts | undefined => row && {
    id: row[0] as string, number: row[1] as number, since: row[2] as number, count: row[3] as number,
  })
  return { shipmentsReady, shipmentsAway, lotsAway, shipmentDrafts, lotDrafts }
}

/** The longest waiting one, and how many there are. */
function listed(table: 'shipments' | 'test_lots', since: string, where: string, until: number): InStatement {
  return { sql: `SELECT id, number, ${since}, count(*) OVER () FROM ${table} WHERE ${where} ORDER BY ${since}, id LIMIT 1`, args: [until] }
}

/** What each of a person's own vans carries against what goes without a shipping paper. */
export function vanFacts(db: Database, from: Directory, personId: string, nowMs: number): Promise<VanFacts[]> {
  return Promise.all(ownVans(from, personId).map(async ({ id, name }) => {
    const [aboard, materials] = await Promise.all([standingIn(db, id, nowMs), materialsOf(db, id, from)])
    return { id, name, load: vanLoad(aboard, materials?.grams ?? null) }
  }))
}

/** Vans in use whose last check-in did not find what nobody has seen since, the latest first. */
export async function shortVanFacts(db: Database, from: Directory, nowMs: number): Promise<ShortVanFacts[]> {
  const vans = [...from.places.values()].filter(({ kind, active }) => kind === 'van' && active)
  const found = await Promise.all(vans.map(async ({ id, name }): Promise<ShortVanFacts | null> => {
    const checkIn = await lastCheckIn(db, id)
    const lines = await toLookFor(db, checkIn, from, nowMs)
    return checkIn && lines.length > 0 ? { id, name, names: lines.map(({ cylinder }) => cylinderName(cylinder)), checkedAt: checkIn.checkedAt } : null
  }))
  return found.filter(each => each !== null).sort((a, b) => b.checkedAt - a.checkedAt)
}
