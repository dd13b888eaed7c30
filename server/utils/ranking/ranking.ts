import type { Access } from '../../../utils/access/roles'
import type { RankedLine, RankingAnswer, RankingQuery, Reach } from '../../../utils/contract/ranking'
import { fillPair, rankCylinders, type RankedCylinder } from '../../../utils/fleet/cylinderRanking'
import { readingGrams } from '../../../utils/quantity/mass'
import { cylinderViews } from '../custody/cylinderViews'
import type { FleetFilter } from '../custody/fleetFilter'
import type { Database } from '../database/database'
import { directory, type Directory } from '../directory/directory'
import { problem } from '../http/problem'
import { ownVans } from '../vans/ownVans'
import { CATALOGUE } from '../../../utils/refrigerant/allRefrigerants'

/** Of the shops' cylinders: along more than this nobody walks for one. */
const MOST_COMPARED = 400

/**
 * Which cylinders take an amount of a refrigerant, from a van: those aboard, those its technician holds or drives elsewhere, and
 * in the shops those that are empty or hold the same and wait for no shipment and no test.
 *
 * Errors: 404 where there is no such van or refrigerant.
 */
export async function cylinderRanking(db: Database, query: RankingQuery, access: Access, nowMs: number): Promise<RankingAnswer> {
  const from = await directory(db)
  const { refrigerant } = query
  if (!CATALOGUE.refrigerants.has(refrigerant)) throw problem(404, 'No such refrigerant', `No data is held for ${refrigerant}.`)
  const van = vanOf(from, query.van, access.personId)
  const personId = van?.technicianId ?? access.personId

  const aboard = van ? await idsWhere(db, { sql: 'c.place_id = ?', args: [van.id] }, null) : []
  const otherVans = ownVans(from, personId).filter(other => other.id !== van?.id)
  const held = await idsWhere(db, {
    sql: `(c.holder_id = ? AND c.place_id IS NOT ?) OR c.place_id IN (${otherVans.map(() => '?').join(', ')})`,
    args: [personId, van?.id ?? null, ...otherVans.map(other => other.id)],
  }, null)
  const { ids: inShops, leftOut } = await inTheShops(db, refrigerant, personId)

  const reaches = new Map<string, Reach>([
    ...inShops.map(id => [id, 'shop'] as const), ...held.map(id => [id, 'held'] as const), ...aboard.map(id => [id, 'van'] as const),
  ])
  const views = await cylinderViews(db, [...reaches.keys()], { access, nowMs, askedRefrigerant: refrigerant })
  const asked = { refrigerant, grams: readingGrams(query.amount) }
  const ranked = rankCylinders(views.map(view => ({ view, reach: reaches.get(view.id)! })), asked)
  return {
    refrigerant, leftOut,
    amountGrams: asked.grams,
    van: van && { id: van.id, name: van.name },
    items: ranked.map(lineOf),
    pair: fillPair(ranked, asked)?.map(({ cylinder, grams }) => ({ id: cylinder.view.id, grams })) ?? null,
  }
}

function vanOf(from: Directory, id: string | undefined, personId: string) {
  if (id === undefined) return ownVans(from, personId)[0] ?? null
  const van = from.places.get(id)
  if (van?.kind !== 'van') throw problem(404, 'No such van', 'It may have been written wrongly.')
  return van
}

async function inTheShops(db: Database, refrigerant: string, personId: string): Promise<{ ids: string[], leftOut: number }> {
  const filter: FleetFilter = {
    sql: `c.place_id IN (SELECT p.id FROM places p WHERE p.kind IN ('shop', 'rack')) AND c.lifecycle = 'in-service'
      AND (c.nothing_in_it = 1 OR c.refrigerant = ?) AND (c.holder_id IS NULL OR c.holder_id = ?)
      AND c.id NOT IN (SELECT o.cylinder_id FROM open_lines o)`,
    args: [refrigerant, personId],
  }
  const ids = await idsWhere(db, filter, MOST_COMPARED)
  if (ids.length < MOST_COMPARED) return { ids, leftOut: 0 }
  const counted = await db.readClient.execute({ sql: `SELECT count(*) FROM cylinders c WHERE ${filter.sql}`, args: filter.args })
  return { ids, leftOut: (counted.rows[0]![0] as number) - ids.length }
}

async function idsWhere(db: Database, filter: FleetFilter, limit: number | null): Promise<string[]> {
  const found = await db.readClient.execute({
    sql: `SELECT c.id FROM cylinders c WHERE ${filter.sql} ORDER BY c.water_capacity_grams, c.id LIMIT ?`,
    // For the database a limit below nothing is none.
    args: [...filter.args, limit ?? -1],
  })
  return found.rows.map(row => row[0] as string)
}

function lineOf({ view, reach, fit, roomGrams, reasons }: RankedCylinder): RankedLine {
  return {
    id: view.id,
    labelCode: view.labelCode,
    serial: view.stamp?.serial ?? null,
    place: view.place,
    holder: view.holder,
    reach, fit, roomGrams, reasons,
    exactStopWeightGrams: fit === 'refused' ? null : view.capacity.exactStopWeightGrams,
  }
}
