import type { InValue, Row } from '@libsql/client'
import { can } from '../../../utils/access/permissions'
import type { Access } from '../../../utils/access/roles'
import type { CylinderTasksAnswer, PlanAnswer, PlanDetails, PlanLine, PlanQuestion, PlansAnswer, PlanTask } from '../../../utils/contract/plans'
import type { Half } from '../../../utils/custody/half'
import { pairBalance } from '../../../utils/plan/pairBalance'
import { whyNoLonger } from '../../../utils/plan/stillFits'
import { CATALOGUE } from '../../../utils/refrigerant/allRefrigerants'
import { cylinderStates } from '../custody/cylinderViews'
import { instantText } from '../cylinder-lists/paging'
import type { Database } from '../database/database'
import { fillPolicyAt } from '../directory/datedRules'
import { directory } from '../directory/directory'
import { problem } from '../http/problem'
import { followPlans } from './followPlans'
import { planCylinders } from './planCylinders'

/** How many plans a list shows; older ones are reached by their address. */
const MOST_LISTED = 100

const SELECT_PLANS = `SELECT p.id, p.number, p.kind, p.state, p.made_at, people.name AS made_by_name, json_extract(p.answer, '$.freed') AS freed,
    (SELECT count(*) FROM plan_tasks t WHERE t.plan_id = p.id) AS tasks, (SELECT count(*) FROM plan_tasks t WHERE t.plan_id = p.id AND t.done_event_id IS NOT NULL) AS tasks_done
  FROM plans p LEFT JOIN people ON people.id = p.made_by`

/** The plans, the newest first, each with how far it has come. What to ship is for those who may know what reclaimers pay. */
export async function listPlans(db: Database, access: Access, nowMs: number): Promise<PlansAnswer> {
  await followPlans(db, nowMs)
  const kinds = can(access, 'terms:read') ? ['consolidation', 'shipping'] : ['consolidation']
  const { rows } = await db.readClient.execute({
    sql: `${SELECT_PLANS} WHERE p.kind IN (SELECT value FROM json_each(?)) ORDER BY p.number DESC LIMIT ?`, args: [JSON.stringify(kinds), MOST_LISTED],
  })
  return { items: rows.map(lineOf) }
}

/** One plan with its steps, what the log says of each, and why what is left may not fit any more. Errors: 403, 404. */
export async function planDetails(db: Database, id: string, access: Access, nowMs: number): Promise<PlanDetails> {
  await followPlans(db, nowMs)
  const [plans, kept] = await db.readClient.batch([
    { sql: `${SELECT_PLANS} WHERE p.id = ?`, args: [id] },
    { sql: 'SELECT question, answer FROM plans WHERE id = ?', args: [id] },
  ], 'read')
  const [row] = plans!.rows
  if (!row) throw problem(404, 'No such plan', 'It may have been written wrongly.')
  const line = lineOf(row)
  if (line.kind === 'shipping' && !can(access, 'terms:read')) throw problem(403, 'Not yours to read', 'What reclaimers pay is read by the warehouse, the manager and the auditor.')
  const question = JSON.parse(kept!.rows[0]![0] as string) as PlanQuestion
  const answer = JSON.parse(kept!.rows[0]![1] as string) as PlanAnswer
  const steps = await stepsWhere(db, 't.plan_id = ?', [id])
  const undone = steps.filter(({ done }) => done === null)
  const noLongerFits = line.state === 'open' ? await faultsOf(db, { id, question, answer, undone }, access, nowMs) : []
  return { ...line, question, answer, steps: steps.map(({ planId: _, ...step }) => step), noLongerFits }
}

/** The steps that open plans have left for a cylinder, the oldest plan first. */
export async function cylinderTasks(db: Database, cylinderId: string, nowMs: number): Promise<CylinderTasksAnswer> {
  await followPlans(db, nowMs)
  const steps = await stepsWhere(db, `t.done_event_id IS NULL AND (t.from_cylinder_id = ? OR t.to_cylinder_id = ?) AND t.plan_id IN (SELECT id FROM plans WHERE state = 'open')`, [cylinderId, cylinderId])
  const others = steps.map(({ fromId, toId }) => fromId === cylinderId ? toId : fromId)
  const [plans, cylinders] = await db.readClient.batch([
    { sql: 'SELECT id, number FROM plans WHERE id IN (SELECT value FROM json_each(?))', args: [JSON.stringify(steps.map(({ planId }) => planId))] },
    { sql: 'SELECT id, label_code, serial FROM cylinders WHERE id IN (SELECT value FROM json_each(?))', args: [JSON.stringify(others)] },
  ], 'read')
  const numbers = new Map(plans!.rows.map(row => [row[0] as string, row[1] as number]))
  const names = new Map(cylinders!.rows.map(row => [row[0] as string, { id: row[0] as string, labelCode: row[1] as string | null, serial: row[2] as string | null }]))
  return {
    items: steps.map(({ planId, ...step }, index) => ({ planId, planNumber: numbers.get(planId)!, step, other: names.get(others[index] ?? '') ?? null }))
      .sort((a, b) => a.planNumber - b.planNumber),
  }
}

/** A plan is followed no longer; its cylinders are free for others. Safe to send twice. Errors: 404; 409 where it was done. */
export async function dropPlan(db: Database, id: string, nowMs: number): Promise<void> {
  await db.write([{ sql: `UPDATE plans SET state = 'dropped', ended_at = ? WHERE id = ? AND state = 'open'`, args: [nowMs, id] }])
  const { rows: [row] } = await db.readClient.execute({ sql: 'SELECT state FROM plans WHERE id = ?', args: [id] })
  if (!row) throw problem(404, 'No such plan', 'It may have been written wrongly.')
  if (row[0] !== 'dropped') throw problem(409, 'This plan is done', 'Nothing of it is left to drop.')
}

async function faultsOf(
  db: Database, plan: { id: string, question: PlanQuestion, answer: PlanAnswer, undone: readonly PlanTask[] }, access: Access, nowMs: number,
): Promise<PlanDetails['noLongerFits']> {
  const transfers = plan.answer.transfers.filter(({ fromId, toId }) => plan.undone.some(step => step.fromId === fromId && step.toId === toId))
  if (plan.question.kind !== 'consolidation' || transfers.length === 0) return []
  const ids = [...new Set(transfers.flatMap(({ fromId, toId }) => [fromId, toId]))]
  const [from, cylinders] = await Promise.all([directory(db), planCylinders(db, ids, { access, nowMs, exceptPlanId: plan.id })])
  return whyNoLonger({
    transfers, now: new Map(cylinders.map(cylinder => [cylinder.view.id, cylinder])), then: plan.answer.cylinders,
    worseTogether: plan.question.worseTogether, limits: { policy: fillPolicyAt(from.fillPolicies, nowMs), catalogue: CATALOGUE },
  })
}

async function stepsWhere(db: Database, where: string, args: InValue[]): Promise<(PlanTask & { planId: string })[]> {
  const { rows } = await db.readClient.execute({
    sql: `SELECT t.plan_id, t.position, t.kind, t.from_cylinder_id, t.to_cylinder_id, t.net_grams, t.done_event_id, t.done_at,
        (SELECT json_extract(one.value, '$.grams') FROM plans p JOIN json_each(p.answer, '$.transfers') one
          WHERE p.id = t.plan_id AND json_extract(one.value, '$.fromId') = t.from_cylinder_id AND json_extract(one.value, '$.toId') = t.to_cylinder_id)
      FROM plan_tasks t WHERE ${where} ORDER BY t.plan_id, t.position`,
    args,
  })
  const done = rows.filter(row => row[6] !== null && row[2] === 'transfer').flatMap(row => [row[3] as string, row[4] as string])
  const states = await cylinderStates(db, [...new Set(done)])
  const halvesOf = (id: string | null): Half[] => (id === null ? undefined : states.get(id)?.halves) ?? []
  return rows.map((row) => {
    const [fromId, toId] = [row[3] as string, row[4] as string | null]
    const pair = row[6] === null ? null : pairBalance(row[6] as string, halvesOf(fromId), halvesOf(toId))
    return {
      planId: row[0] as string, position: row[1] as number, kind: row[2] as PlanTask['kind'], fromId, toId,
      netGrams: (row[5] ?? row[8]) as number | null, isAll: row[5] === null,
      done: row[6] === null ? null : { eventId: row[6] as string, at: instantText(row[7])!, grams: pair?.grams ?? null, balance: pair?.balance ?? null },
    }
  })
}

function lineOf(row: Row): PlanLine {
  return {
    id: row['id'] as string,
    number: row['number'] as number,
    kind: row['kind'] as PlanLine['kind'],
    state: row['state'] as PlanLine['state'],
    madeAt: instantText(row['made_at'])!,
    madeBy: row['made_by_name'] as string,
    tasks: row['tasks'] as number,
    tasksDone: row['tasks_done'] as number,
    freed: row['freed'] as number,
  }
}
