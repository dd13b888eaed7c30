import type { Access } from '../../../utils/access/roles'
import { view } from '../../../utils/custody/view'
import type { PlanQuestion } from '../../../utils/contract/plans'
import { MOST_PLANNED } from '../../../utils/contract/plans'
import type { PlanCylinder } from '../../../utils/plan/bars'
import { cylinderStates } from '../custody/cylinderViews'
import { dateBounds } from '../custody/dateBounds'
import { fleetFilter } from '../custody/fleetFilter'
import { viewContext } from '../custody/foldContext'
import { saidByOthers } from '../custody/saidByOthers'
import type { Database } from '../database/database'
import { directory, type Directory } from '../directory/directory'
import { problem } from '../http/problem'

/**
 * Which cylinders a question is about, in the order of their ids.
 *
 * Errors: 422 where it names one that nobody knows, where there are none, or more than a plan is made for.
 */
export async function chosenIds(db: Database, question: PlanQuestion, nowMs: number): Promise<string[]> {
  const ids = question.cylinderIds ? await knownIds(db, question.cylinderIds) : await idsWhere(db, question, nowMs)
  if (ids.length === 0) throw problem(422, 'No cylinders to plan with', 'Choose another place or refrigerant.')
  if (ids.length > MOST_PLANNED) throw problem(422, 'Too many for one plan', `A plan is made for ${MOST_PLANNED} cylinders at most. Choose a place or a refrigerant.`)
  return ids
}

async function knownIds(db: Database, ids: readonly string[]): Promise<string[]> {
  const { rows } = await db.readClient.execute({ sql: 'SELECT id FROM cylinders WHERE id IN (SELECT value FROM json_each(?)) ORDER BY id', args: [JSON.stringify(ids)] })
  const known = new Set(rows.map(row => row[0] as string))
  const unknown = ids.flatMap((id, index) => known.has(id) ? [] : [{ path: `cylinderIds.${index}`, message: 'no such cylinder' }])
  if (unknown.length > 0) throw problem(422, 'It names what nobody knows', 'Choose the cylinders again.', unknown)
  return [...known]
}

async function idsWhere(db: Database, { kind, placeId, refrigerant }: PlanQuestion, nowMs: number): Promise<string[]> {
  const filter = fleetFilter({ place: placeId }, dateBounds(await directory(db), nowMs))
  const held = refrigerant === undefined ? { sql: '1', args: [] } : { sql: kind === 'shipping' ? 'c.refrigerant = ?' : '(c.refrigerant = ? OR c.nothing_in_it = 1)', args: [refrigerant] }
  const { rows } = await db.readClient.execute({
    sql: `SELECT c.id FROM cylinders c WHERE ${filter.sql} AND ${held.sql} AND c.lifecycle IN ('in-service', 'quarantined', 'rejected') ORDER BY c.id LIMIT ?`,
    args: [...filter.args, ...held.args, MOST_PLANNED + 1],
  })
  return rows.map(row => row[0] as string)
}

/** Cylinders as a plan looks at them, those without anything in them asked about every refrigerant among the others. */
export async function planCylinders(db: Database, ids: readonly string[], asking: { access: Access, nowMs: number, exceptPlanId?: string }): Promise<PlanCylinder[]> {
  const [from, said, states, standing] = await Promise.all([directory(db), saidByOthers(db, ids), cylinderStates(db, ids), standsOn(db, ids, asking.exceptPlanId ?? null)])
  const refrigerants = [...new Set([...states.values()].flatMap(({ contents }) => contents.refrigerant ?? []))]
  return ids.flatMap((id): PlanCylinder[] => {
    const state = states.get(id)
    if (!state) return []
    const askedFor = (askedRefrigerant: string | null) => view(state, viewContext(from, { ...asking, askedRefrigerant, saidByOthers: said(id) }))
    return [{
      view: askedFor(null),
      asked: new Map(state.contents.nothingInIt ? refrigerants.map(refrigerant => [refrigerant, askedFor(refrigerant)]) : []),
      siteId: siteOf(from, state.placeId),
      standsOn: standing.get(id) ?? null,
    }]
  })
}

/** The outermost place that a place stands in. */
function siteOf({ places }: Directory, placeId: string | null): string | null {
  const seen = new Set<string>()
  let at = placeId
  for (let parent = at; parent !== null && !seen.has(parent); parent = places.get(parent)?.parentId ?? null) {
    seen.add(parent)
    at = parent
  }
  return at
}

/** The open list or plan on which each cylinder stands, in words. */
async function standsOn(db: Database, ids: readonly string[], exceptPlanId: string | null): Promise<Map<string, string>> {
  const wanted = JSON.stringify(ids)
  const [lists, plans] = await db.readClient.batch([
    {
      sql: `SELECT o.cylinder_id, o.list_kind, coalesce(s.number, l.number) FROM open_lines o
        LEFT JOIN shipments s ON o.list_kind = 'shipment' AND s.id = o.list_id LEFT JOIN test_lots l ON o.list_kind = 'test-lot' AND l.id = o.list_id
        WHERE o.cylinder_id IN (SELECT value FROM json_each(?))`,
      args: [wanted],
    },
    {
      sql: `SELECT j.value, p.number FROM json_each(?) j JOIN plan_tasks t ON (t.from_cylinder_id = j.value OR t.to_cylinder_id = j.value) AND t.done_event_id IS NULL
        JOIN plans p ON p.id = t.plan_id AND p.state = 'open' AND p.id IS NOT ?`,
      args: [wanted, exceptPlanId],
    },
  ], 'read')
  return new Map([
    ...plans!.rows.map(row => [row[0] as string, `plan ${row[1] as number}`] as const),
    ...lists!.rows.map(row => [row[0] as string, `${row[1] === 'shipment' ? 'shipment' : 'test lot'} ${String(row[2]).padStart(4, '0')}`] as const),
  ])
}
