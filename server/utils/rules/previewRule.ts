import { setImmediate as nextTurn } from 'node:timers/promises'
import type { RuleDraft, RulePreview } from '../../../utils/contract/policy'
import type { CylinderRow } from '../../../utils/custody/cylinderView'
import { cacheRow, rowToday } from '../../../utils/custody/row'
import type { CylinderState } from '../../../utils/custody/state'
import { policyOf, ruleFaults } from '../../../utils/rules/ruleFaults'
import { newRulePreview } from '../../../utils/rules/rulePreview'
import { rowContext } from '../custody/foldContext'
import type { Database } from '../database/database'
import { directory, namesOf, type Directory } from '../directory/directory'
import { problem } from '../http/problem'
import { beginningOf } from './beginning'

/** Cylinders between two breaths: what others ask for meanwhile waits for no more than these. */
const CYLINDERS_AT_ONCE = 50

/**
 * What a rule would change of the fleet as it is, against the rule otherwise in force on the day it would begin.
 *
 * Errors: 422 as when it is set.
 */
export async function previewRule(db: Database, draft: RuleDraft, nowMs: number): Promise<RulePreview> {
  const faults = ruleFaults(draft)
  if (faults.length > 0) throw problem(422, 'This cannot be the firm\'s rule', 'Mend what is named.', faults)
  const from = await directory(db, true)
  const at = beginningOf(draft.from, from.timeZone, nowMs) ?? nowMs
  const [before, after] = [rowBy(from, at), rowBy(withDraft(from, draft, at), at)]
  const sum = newRulePreview(at)
  let last = ''
  for (;;) {
    const { rows } = await db.readClient.execute({ sql: `SELECT id, state FROM cylinders WHERE id > ? ORDER BY id LIMIT ${CYLINDERS_AT_ONCE}`, args: [last] })
    for (const row of rows) {
      const state = JSON.parse(row[1] as string) as CylinderState
      sum.take(before(state), after(state))
    }
    if (rows.length < CYLINDERS_AT_ONCE) return sum.answer()
    last = rows.at(-1)![0] as string
    await nextTurn()
  }
}

function rowBy(from: Directory, at: number): (state: CylinderState) => CylinderRow {
  const context = rowContext(from, at)
  const day = { nowMs: at, timeZone: from.timeZone, retest: context.retest, names: namesOf(from) }
  return state => rowToday({ id: state.id, ...cacheRow(state, context) }, day)
}

function withDraft(from: Directory, draft: RuleDraft, at: number): Directory {
  const begun = { id: '', fromAt: at }
  return draft.kind === 'fill-policy'
    ? { ...from, fillPolicies: [...from.fillPolicies.filter(({ fromAt }) => fromAt <= at), { ...begun, policy: policyOf(draft.value) }] }
    : { ...from, retests: [...from.retests.filter(({ fromAt }) => fromAt <= at), { ...begun, retest: draft.value }] }
}
