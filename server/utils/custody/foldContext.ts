import type { FoldContext } from '../../../utils/custody/fold'
import type { RowContext } from '../../../utils/custody/row'
import type { ViewContext } from '../../../utils/custody/view'
import type { Access } from '../../../utils/access/roles'
import { CATALOGUE } from '../../../utils/refrigerant/allRefrigerants'
import { fillPolicyAt, namesOf, type Directory } from '../directory/directory'

/** What the fold and the cached columns take from outside the log: the firm's rules as they stand now. */
export function foldContext(from: Directory): FoldContext & RowContext {
  return {
    catalogue: CATALOGUE,
    scales: from.scales,
    policyAt: at => fillPolicyAt(from.fillPolicies, at),
    policyNow: fillPolicyAt(from.fillPolicies, from.readAt),
    timeZone: from.timeZone,
    retest: from.retest,
  }
}

/** What a view takes from outside the log: today, the firm's rules, and who is asking. */
export function viewContext(from: Directory, more: {
  nowMs: number
  access: Access | null
  codesOnTwo?: ReadonlySet<string>
  askedRefrigerant?: string | null
}): ViewContext {
  return {
    ...foldContext(from),
    nowMs: more.nowMs,
    policyNow: fillPolicyAt(from.fillPolicies, more.nowMs),
    retest: from.retest,
    askedRefrigerant: more.askedRefrigerant ?? null,
    access: more.access,
    codesOnTwo: more.codesOnTwo ?? new Set(),
    names: namesOf(from),
  }
}

/** What the cached columns take from outside the log: the rule in force, but not the day. */
export function rowContext(from: Directory, nowMs: number, codesOnTwo: ReadonlySet<string> = new Set()): RowContext {
  return {
    policyNow: fillPolicyAt(from.fillPolicies, nowMs),
    policyAt: at => fillPolicyAt(from.fillPolicies, at),
    catalogue: CATALOGUE,
    timeZone: from.timeZone,
    retest: from.retest,
    codesOnTwo,
  }
}
