import type { InStatement } from '@libsql/client'
import type { FleetQuestion, FleetTopic } from '../../../utils/now/fleetQuestions'
import { FEW_EMPTY, type CylinderFacts, type FewEmptyFacts, type FullFacts, type NowFacts } from '../../../utils/now/nowFacts'
import type { DateBounds } from '../custody/dateBounds'
import { cylinderRowsWhere } from '../custody/fleet'
import { findingFilter, fleetFilter, IN_FLEET, isOverdue, type FleetFilter } from '../custody/fleetFilter'
import type { Database } from '../database/database'
import { retestAt } from '../directory/datedRules'
import { namesOf, type Directory } from '../directory/directory'

/** How many get a new label in one go: each is fetched on its own by the labels' page. */
const MOST_LABELS = 24
/** Far more than one truck takes. */
const MOST_ON_A_SHIPMENT = 100

type Asked = [FleetTopic, FleetQuestion]

/** The cylinders that each question finds. Each scope is read once, however many questions there are. */
export async function cylinderFacts(db: Database, asked: readonly Asked[], bounds: DateBounds, nowMs: number): Promise<NowFacts['cylinders']> {
  const held = asked.filter(([, question]) => question.holder !== undefined)
  const all = asked.filter(([, question]) => question.holder === undefined)
  const scopes = [all, held].filter(scope => scope.length > 0)
  const counted = await Promise.all(scopes.map(scope => db.readClient.execute(countsOf(scope, bounds))))
  const found = await Promise.all(scopes.flatMap((scope, at) => scope.map(async ([topic, question], index): Promise<[FleetTopic, CylinderFacts] | null> => {
    const figure = (offset: number) => (counted[at]?.rows[0]?.[index * 3 + offset] as number | null) ?? 0
    const count = figure(0)
    if (count === 0) return null
    const first = await cylinderRowsWhere(db, fleetFilter(question, bounds), topic === 'old-tare' ? MOST_LABELS : 1, nowMs)
    return [topic, { question, count, netGrams: figure(1), withContents: figure(2), first }]
  })))
  return Object.fromEntries(found.filter(each => each !== null))
}

function countsOf(scope: readonly Asked[], bounds: DateBounds): InStatement {
  const filters = scope.map(([, question]) => fleetFilter(question, bounds))
  const holder = scope[0]?.[1].holder
  return {
    sql: `SELECT ${filters.map(({ sql }) => `sum(CASE WHEN ${sql} THEN 1 ELSE 0 END), sum(CASE WHEN ${sql} THEN c.net_grams END), sum(CASE WHEN ${sql} THEN 1 - c.nothing_in_it ELSE 0 END)`).join(', ')}
      FROM cylinders c ${holder === undefined ? '' : 'WHERE c.holder_id = ?'}`,
    args: [...filters.flatMap(({ args }) => [...args, ...args, ...args]), ...(holder === undefined ? [] : [holder])],
  }
}

/** Who had last what was not seen lately, and how many for so long that they may be missing. */
export async function unseenFacts(db: Database, from: Directory, bounds: DateBounds, nowMs: number): Promise<NowFacts['unseen']> {
  const { notSeenDays, missingDays } = retestAt(from.retests, nowMs)
  const filter = findingFilter('not-seen', bounds)
  const { rows } = await db.readClient.execute({
    sql: `SELECT c.holder_id, count(*), sum(CASE WHEN c.last_seen_at < ? THEN 1 ELSE 0 END) FROM cylinders c WHERE ${filter.sql} GROUP BY c.holder_id ORDER BY count(*) DESC, c.holder_id`,
    args: [bounds.missingBefore, ...filter.args],
  })
  const { person } = namesOf(from)
  return {
    days: notSeenDays, longDays: missingDays,
    longCount: rows.reduce((sum, row) => sum + (row[2] as number), 0),
    holders: rows.map(row => ({ name: row[0] === null ? null : person(row[0] as string).name, count: row[1] as number })),
  }
}

/** Full cylinders in a shop that may leave and are on no list yet, by refrigerant, the most first; a rack goes by its shop. */
export async function fullFacts(db: Database, bounds: DateBounds): Promise<FullFacts[]> {
  const full = findingFilter('nearly-full', bounds)
  const { rows } = await db.readClient.execute({
    sql: `SELECT c.refrigerant, c.id, c.net_grams, coalesce(shop.name, p.name) AS place FROM cylinders c
      JOIN places p ON p.id = c.place_id LEFT JOIN places shop ON shop.id = p.parent_id
      WHERE ${full.sql} AND c.severity < 2 AND c.lifecycle = 'in-service' AND c.label_code IS NOT NULL AND c.refrigerant IS NOT NULL
        AND p.kind IN ('shop', 'rack') AND c.id NOT IN (SELECT o.cylinder_id FROM open_lines o) ORDER BY c.refrigerant, place, c.id`,
    args: full.args,
  })
  return [...new Set(rows.map(row => row[0] as string))].map((refrigerant) => {
    const some = rows.filter(row => row[0] === refrigerant).slice(0, MOST_ON_A_SHIPMENT)
    return {
      refrigerant,
      netGrams: some.reduce((sum, row) => sum + (row[2] as number), 0),
      ids: some.map(row => row[1] as string),
      places: [...new Set(some.map(row => row[3] as string))],
    }
  }).sort((a, b) => b.netGrams - a.netGrams)
}

/** Shops, with their racks, in which few empty cylinders may be filled and are on no list, the fewest first; nothing while there are no cylinders. */
export async function fewEmptyFacts(db: Database, bounds: DateBounds): Promise<FewEmptyFacts[]> {
  const overdue = isOverdue(bounds)
  const { rows } = await db.readClient.execute({
    sql: `SELECT shop.id, shop.name, count(c.id) AS empty FROM places shop JOIN places p ON p.id = shop.id OR p.parent_id = shop.id
      LEFT JOIN cylinders c ON c.place_id = p.id AND c.nothing_in_it = 1 AND c.lifecycle = 'in-service' AND c.severity < 2
        AND (${overdue.sql}) IS NOT TRUE AND c.id NOT IN (SELECT o.cylinder_id FROM open_lines o)
      WHERE shop.kind = 'shop' AND shop.active = 1 AND EXISTS (SELECT 1 FROM cylinders any_one WHERE any_one.lifecycle = 'in-service')
      GROUP BY shop.id HAVING empty < ? ORDER BY empty, shop.name, shop.id`,
    args: [...overdue.args, FEW_EMPTY],
  })
  return rows.map(row => ({ id: row[0] as string, name: row[1] as string, count: row[2] as number }))
}

/** Cylinders in use that wear no label, and the first of them. */
export async function unlabelledFacts(db: Database, nowMs: number): Promise<NowFacts['unlabelled']> {
  const filter: FleetFilter = { sql: `c.label_code IS NULL AND c.lifecycle = 'in-service' AND ${IN_FLEET}`, args: [] }
  const [first, { rows }] = await Promise.all([
    cylinderRowsWhere(db, filter, MOST_LABELS, nowMs),
    db.readClient.execute(`SELECT count(*) FROM cylinders c WHERE ${filter.sql}`),
  ])
  return { count: rows[0]?.[0] as number, first }
}
