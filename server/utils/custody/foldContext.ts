import type { FoldContext } from '../../../utils/custody/fold'
import type { RowContext } from '../../../utils/custody/row'
import { NOTHING_SAID, type SaidByOthers } from '../../../utils/custody/saidByOthers'
import type { ViewContext } from '../../../utils/custody/view'
import type { RetestSettings } from '../../../utils/requalification/retestSettings'
import type { Access } from '../../../utils/access/roles'
import { CATALOGUE } from '../../../utils/refrigerant/allRefrigerants'
import { asListed } from '../../../utils/refrigerant/designation'
import { fillPolicyAt, retestAt, rulesInForceKey } from '../directory/datedRules'
import { namesOf, type Directory } from '../directory/directory'

/** What the fold takes from outside the log: the firm's rules, each as of its day. */
export function foldContext(from: Directory): FoldContext {
  return {
    catalogue: CATALOGUE,
    scales: from.scales,
    policyAt: at => fillPolicyAt(from.fillPolicies, at),
    retestAt: at => retestAt(from.retests, at),
    timeZone: from.timeZone,
    placeOfFirm: id => from.placeOfFirm.get(id) ?? null,
  }
}

/** What a view takes from outside the log: today, the firm's rules, and who is asking. */
export function viewContext(from: Directory, more: {
  nowMs: number
  access: Access | null
  saidByOthers?: SaidByOthers
  askedRefrigerant?: string | null
}): ViewContext {
  return {
    ...foldContext(from),
    nowMs: more.nowMs,
    policyNow: fillPolicyAt(from.fillPolicies, more.nowMs),
    retest: retestAt(from.retests, more.nowMs),
    askedRefrigerant: more.askedRefrigerant ? asListed(more.askedRefrigerant, CATALOGUE.refrigerants.keys()) : null,
    access: more.access,
    ...(more.saidByOthers ?? NOTHING_SAID),
    names: namesOf(from),
  }
}

/** A {@link RowContext}, and the name by which a row keeps the rules in it. */
export interface RuledRowContext extends RowContext {
  ruledBy: string
  retest: RetestSettings
}

/** What the cached columns take from outside the log: the rules in force, but not the day. */
export function rowContext(from: Directory, nowMs: number, saidByOthers: SaidByOthers = NOTHING_SAID): RuledRowContext {
  return {
    ruledBy: rulesInForceKey(from, nowMs),
    policyNow: fillPolicyAt(from.fillPolicies, nowMs),
    policyAt: at => fillPolicyAt(from.fillPolicies, at),
    catalogue: CATALOGUE,
    timeZone: from.timeZone,
    retest: retestAt(from.retests, nowMs),
    ...saidByOthers,
  }
}
