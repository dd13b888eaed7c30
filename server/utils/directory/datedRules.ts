import type { settings } from '../../../drizzle/schema'
import { DEFAULT_FILL_POLICY, type FillPolicy } from '../../../utils/capacity/types'
import { DEFAULT_RETEST_SETTINGS, type RetestSettings } from '../../../utils/requalification/retestSettings'

/** A row of the firm's settings: a rule with its date, or the withdrawal of one that had not begun. */
export type SettingRow = typeof settings.$inferSelect

/** A fill rule and the instant (UTC milliseconds) from which it counts. */
export interface DatedFillPolicy { id: string, fromAt: number, policy: FillPolicy }

/** Retest settings and the instant (UTC milliseconds) from which they count. */
export interface DatedRetest { id: string, fromAt: number, retest: RetestSettings }

/** The firm's rules by their dates, oldest first, without those that were withdrawn. */
export interface DatedRules {
  fillPolicies: readonly DatedFillPolicy[]
  retests: readonly DatedRetest[]
}

/** What counts of the firm's settings. Rows come in order of their beginning. */
export function datedRules(rows: readonly SettingRow[]): DatedRules {
  const withdrawn = new Set(rows.flatMap(row => row.kind === 'withdrawal' ? [(row.value as { ruleId: string }).ruleId] : []))
  const standing = rows.filter(row => !withdrawn.has(row.id))
  return {
    fillPolicies: standing.filter(row => row.kind === 'fill-policy').map(({ id, fromAt, value }) => ({ id, fromAt, policy: value as FillPolicy })),
    retests: standing.filter(row => row.kind === 'retest').map(({ id, fromAt, value }) => ({ id, fromAt, retest: retestSettingsOf(value) })),
  }
}

/** Retest settings as stored; what an older row does not say is as it was before anything was set. */
export function retestSettingsOf(value: unknown): RetestSettings {
  return { ...DEFAULT_RETEST_SETTINGS, ...value as Partial<RetestSettings> }
}

/** The fill rule in force at an instant (UTC milliseconds). */
export function fillPolicyAt(policies: readonly DatedFillPolicy[], at: number): FillPolicy {
  return policies.findLast(entry => entry.fromAt <= at)?.policy ?? DEFAULT_FILL_POLICY
}

/** The retest settings in force at an instant (UTC milliseconds). */
export function retestAt(retests: readonly DatedRetest[], at: number): RetestSettings {
  return retests.findLast(entry => entry.fromAt <= at)?.retest ?? DEFAULT_RETEST_SETTINGS
}

/** Names the rules that the cached columns rest on at an instant: where it differs, they rest on others. */
export function rulesInForceKey(rules: DatedRules & { timeZone: string }, at: number): string {
  const idOf = (entries: readonly { id: string, fromAt: number }[]) => entries.findLast(entry => entry.fromAt <= at)?.id ?? '-'
  return `${idOf(rules.fillPolicies)} ${idOf(rules.retests)} ${rules.timeZone}`
}

/** When the next rule begins (UTC milliseconds); null where none is to come. */
export function nextBeginning(rules: DatedRules, at: number): number | null {
  const coming = [...rules.fillPolicies, ...rules.retests].map(({ fromAt }) => fromAt).filter(fromAt => fromAt > at)
  return coming.length === 0 ? null : Math.min(...coming)
}
