import { v7 as uuid } from 'uuid'
import { settings } from '../../../drizzle/schema'
import type { Access } from '../../../utils/access/roles'
import type { FirmRule, NewRule } from '../../../utils/contract/policy'
import { policyOf, ruleFaults } from '../../../utils/rules/ruleFaults'
import { followRules } from '../custody/rowsByRule'
import { statement, type Database } from '../database/database'
import { directory } from '../directory/directory'
import { firmRules } from '../directory/firmRules'
import { problem } from '../http/problem'
import { beginningOf, instantNamed } from './beginning'

/** Postings that may still stand beside each other in the log out of the order of their clocks. */
const LAST_LINES = 200

/**
 * Sets a rule of the firm from now or from a later day on. Nothing is changed: the new one follows the others.
 *
 * It is written in its turn between the events, so that each of them was judged by the rule of its own instant. The rows
 * of the fleet follow right after, some at a time.
 *
 * Errors: 422 for what is looser than may be, and for a day that has passed; 409 where another rule has this id. The
 * same rule sent again is answered as it stands.
 */
export async function setRule(db: Database, body: NewRule, by: Access, clock: () => number): Promise<FirmRule> {
  const faults = ruleFaults(body)
  if (faults.length > 0) throw problem(422, 'This cannot be the firm\'s rule', 'Mend what is named.', faults)
  const id = body.id ?? uuid()
  const value = body.kind === 'fill-policy' ? policyOf(body.value) : body.value
  await db.exclusive(async (commit) => {
    const { settings: known, timeZone } = await directory(db, true)
    if (known.some(row => row.id === id)) return
    const setAt = clock()
    const fromAt = beginningOf(body.from, timeZone, setAt) ?? await afterLastEvent(db, setAt)
    await commit([statement(db.read.insert(settings).values({ id, kind: body.kind, fromAt, value, reason: body.reason, setBy: by.personId, setAt }))])
    await directory(db, true)
  })
  const from = await directory(db)
  const rule = firmRules(from).find(one => one.id === id)
  const asked = instantNamed(body.from, from.timeZone)
  if (!rule || rule.kind !== body.kind || rule.reason !== body.reason || (asked ?? rule.fromAt) !== rule.fromAt
    || JSON.stringify(rule.value) !== JSON.stringify({ ...rule.value, ...value })) {
    throw problem(409, 'Another rule has this id', 'It was set before with another beginning, other figures or another reason. Look at the rules as they stand, then set yours under a new id.')
  }
  followRules(db, clock).catch((error: unknown) => console.error('The rows could not follow the new rule; they will later:', String(error)))
  return rule
}

/** Now, but after everything recorded: an event of this very millisecond was judged by the rule before. */
async function afterLastEvent(db: Database, nowMs: number): Promise<number> {
  const result = await db.readClient.execute(`SELECT max(recorded_at) FROM (SELECT recorded_at FROM custody_events ORDER BY seq DESC LIMIT ${LAST_LINES})`)
  return Math.max(nowMs, ((result.rows[0]?.[0] as number | null) ?? 0) + 1)
}
