import type { InStatement } from '@libsql/client'
import { v7 as uuid } from 'uuid'
import { can } from '../../../utils/access/permissions'
import type { Access } from '../../../utils/access/roles'
import type { PlanAnswer, PlanMade, PlanQuestion } from '../../../utils/contract/plans'
import { consolidate } from '../../../utils/plan/consolidate'
import { consolidationAnswer } from '../../../utils/plan/consolidationAnswer'
import type { Solve } from '../../../utils/plan/linearProgram'
import { shippingAnswer } from '../../../utils/plan/shippingAnswer'
import { sortOut } from '../../../utils/plan/sortOut'
import { dayOfInstant } from '../../../utils/quantity/day'
import { CATALOGUE } from '../../../utils/refrigerant/allRefrigerants'
import type { Database } from '../database/database'
import { fillPolicyAt } from '../directory/datedRules'
import { directory, namesOf } from '../directory/directory'
import { problem } from '../http/problem'
import { contaminationOf } from '../reclaim/contamination'
import { pricesOf, termsOn } from '../reclaim/terms'
import { followPlans } from './followPlans'
import { chosenIds, planCylinders } from './planCylinders'
import { solveApart } from './solver'

/** What the search may take, so that the answer comes within ten seconds; a solver is a little longer at its last step. */
const SEARCH_SECONDS = 6.5
/** With less time than this nothing is begun any more. */
const LEAST_SECONDS = 0.1
/** Each keeps the solver busy for as long. */
const MOST_AT_ONCE = 2

let atWork = 0

/**
 * Works a plan out and keeps it as steps to do; where there is nothing to do it only says why. With an id of the sender's
 * own it may be sent twice.
 *
 * Errors: 403; 422 as {@link chosenIds}; 409 where a cylinder of it came onto another plan meanwhile; 503 where others are being worked out.
 */
export async function makePlan(db: Database, question: PlanQuestion, access: Access, nowMs: number): Promise<PlanMade> {
  if (question.kind === 'shipping' && !can(access, 'terms:read')) throw problem(403, 'Not yours to plan', 'It takes what reclaimers pay, which is not for this role.')
  const known = question.id === undefined ? null : await sameAs(db, question, question.id, access)
  if (known) return known
  if (atWork >= MOST_AT_ONCE) throw problem(503, 'Other plans are being worked out', 'Try again in some seconds.', undefined, { headers: { 'Retry-After': '10' } })
  atWork++
  try {
    await followPlans(db, nowMs)
    const answer = await workOut(db, question, access, nowMs)
    if (stepsOf(answer).length === 0) return { id: null, answer }
    const id = question.id ?? uuid()
    await keep(db, { id, question, answer, madeBy: access.personId, nowMs })
    return { id, answer }
  }
  finally {
    atWork--
  }
}

/** The solver for one plan: whatever its steps ask for, all of them together take no longer than the search may. */
function solverUntil(endsAtMs: number): Solve {
  return async (program, { seconds }) => {
    const left = (endsAtMs - performance.now()) / 1000
    return left < LEAST_SECONDS ? { status: 'stopped', values: {} } : solveApart(program, { seconds: Math.min(seconds, left) })
  }
}

async function workOut(db: Database, question: PlanQuestion, access: Access, nowMs: number): Promise<PlanAnswer> {
  const ids = await chosenIds(db, question, nowMs)
  const [from, cylinders] = await Promise.all([directory(db), planCylinders(db, ids, { access, nowMs })])
  const names = namesOf(from)
  const solve = solverUntil(performance.now() + SEARCH_SECONDS * 1000)
  const nameOfFirm = (id: string) => names.firm(id).name
  if (question.kind === 'shipping') {
    const day = dayOfInstant(nowMs, from.timeZone)
    const firms = [...from.firms.values()].filter(({ kind, active }) => kind === 'reclaimer' && active)
    const reclaimers = await Promise.all(firms.map(async ({ id, name }) => ({ firm: { id, name }, terms: await termsOn(db, id, day), prices: await pricesOf(db, id) })))
    return shippingAnswer({ cylinders, contamination: await contaminationOf(db, ids), reclaimers, day, nameOfFirm }, solve, SEARCH_SECONDS)
  }
  const limits = { policy: fillPolicyAt(from.fillPolicies, nowMs), catalogue: CATALOGUE }
  const sorted = sortOut(cylinders, question, limits)
  const found = await consolidate(sorted.problem, solve, SEARCH_SECONDS)
  return consolidationAnswer({ cylinders, sorted, found, limits, nameOfFirm })
}

function stepsOf({ transfers, shipments }: PlanAnswer): { kind: 'transfer' | 'ship', fromId: string, toId: string | null, grams: number | null }[] {
  return [
    ...transfers.map(({ fromId, toId, grams, isAll }) => ({ kind: 'transfer' as const, fromId, toId, grams: isAll ? null : grams })),
    ...shipments.flatMap(({ cylinderIds }) => cylinderIds.map(fromId => ({ kind: 'ship' as const, fromId, toId: null, grams: null }))),
  ]
}

async function keep(db: Database, { id, question, answer, madeBy, nowMs }: { id: string, question: PlanQuestion, answer: PlanAnswer, madeBy: string, nowMs: number }): Promise<void> {
  const steps = stepsOf(answer)
  const touched = JSON.stringify([...new Set(steps.flatMap(({ fromId, toId }) => toId === null ? [fromId] : [fromId, toId]))])
  const [made] = await db.write([
    {
      sql: `INSERT INTO plans (id, number, kind, question, answer, state, made_by, made_at)
        SELECT ?, (SELECT coalesce(max(number), 0) + 1 FROM plans), ?, ?, ?, 'open', ?, ?
        WHERE NOT EXISTS (SELECT 1 FROM plan_tasks t JOIN plans p ON p.id = t.plan_id AND p.state = 'open'
          WHERE t.done_event_id IS NULL AND (t.from_cylinder_id IN (SELECT value FROM json_each(?)) OR t.to_cylinder_id IN (SELECT value FROM json_each(?))))
        ON CONFLICT DO NOTHING RETURNING id`,
      args: [id, question.kind, JSON.stringify(question), JSON.stringify(answer), madeBy, nowMs, touched, touched],
    },
    ...steps.map(({ kind, fromId, toId, grams }, position): InStatement => ({
      sql: `INSERT INTO plan_tasks (plan_id, position, kind, from_cylinder_id, to_cylinder_id, net_grams)
        SELECT ?, ?, ?, ?, ?, ? WHERE EXISTS (SELECT 1 FROM plans WHERE id = ? AND made_by = ? AND made_at = ?) ON CONFLICT DO NOTHING`,
      args: [id, position, kind, fromId, toId, grams, id, madeBy, nowMs],
    })),
  ])
  if (made!.rows.length === 0) throw problem(409, 'The plan was not made', 'One of its cylinders came onto another plan meanwhile. Plan again.')
}

/** The plan that was made of the same question under this id; null where there is none. Errors: 409 for another question. */
async function sameAs(db: Database, question: PlanQuestion, id: string, access: Access): Promise<PlanMade | null> {
  const { rows: [row] } = await db.readClient.execute({ sql: 'SELECT question, answer, made_by FROM plans WHERE id = ?', args: [id] })
  if (!row) return null
  if (row[0] !== JSON.stringify(question) || row[2] !== access.personId) throw problem(409, 'Another plan has this id', 'Send it again under a new id.')
  return { id, answer: JSON.parse(row[1] as string) as PlanAnswer }
}
