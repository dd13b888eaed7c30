import { v7 as uuid } from 'uuid'
import { settings } from '../../../drizzle/schema'
import type { Access } from '../../../utils/access/roles'
import type { FirmRule } from '../../../utils/contract/policy'
import { statement, type Database } from '../database/database'
import { directory } from '../directory/directory'
import { firmRules } from '../directory/firmRules'
import { problem } from '../http/problem'

/** The kind of a rule. Errors: 404 where there is none. */
export async function kindOfRule(db: Database, id: string): Promise<FirmRule['kind']> {
  return (await theRule(db, id)).kind
}

/**
 * Takes back a rule that has not begun, for a reason. The rule and its withdrawal both stay in the history.
 *
 * Errors: 404 where there is none; 409 once it has begun, for by then it may have judged something. One withdrawn
 * already is answered as it stands.
 */
export async function withdrawRule(db: Database, id: string, reason: string, by: Access, clock: () => number): Promise<FirmRule> {
  await db.exclusive(async (commit) => {
    await directory(db, true)
    const rule = await theRule(db, id)
    const now = clock()
    if (rule.withdrawn) return
    if (rule.fromAt <= now) {
      throw problem(409, 'It has begun', 'What was judged by it keeps it. Set the rule that shall follow it.', undefined, { type: 'rule-begun' })
    }
    await commit([statement(db.read.insert(settings).values({
      id: uuid(), kind: 'withdrawal', fromAt: now, value: { ruleId: id }, reason, setBy: by.personId, setAt: now,
    }))])
    await directory(db, true)
  })
  return theRule(db, id)
}

async function theRule(db: Database, id: string): Promise<FirmRule> {
  const rule = firmRules(await directory(db)).find(one => one.id === id)
  if (!rule) throw problem(404, 'Not there', 'No rule has this id.')
  return rule
}
