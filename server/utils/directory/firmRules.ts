import type { FillPolicy } from '../../../utils/capacity/types'
import type { FirmRule } from '../../../utils/contract/policy'
import { retestSettingsOf, type SettingRow } from './datedRules'
import { namesOf, type Directory } from './directory'

/** Every rule that the firm has set, by whom, when and why, and which was withdrawn; the newest first. */
export function firmRules(from: Directory): FirmRule[] {
  const withdrawals = new Map(from.settings.flatMap(row => row.kind === 'withdrawal' ? [[(row.value as { ruleId: string }).ruleId, row]] : []))
  return from.settings.toReversed().flatMap(row => row.kind === 'withdrawal' ? [] : [firmRule(row, withdrawals.get(row.id), from)])
}

function firmRule(row: SettingRow, withdrawal: SettingRow | undefined, from: Directory): FirmRule {
  const { person } = namesOf(from)
  const shared = {
    id: row.id,
    fromAt: row.fromAt,
    reason: row.reason,
    setBy: person(row.setBy),
    setAt: row.setAt,
    withdrawn: withdrawal ? { by: person(withdrawal.setBy), at: withdrawal.setAt, reason: withdrawal.reason } : null,
  }
  return row.kind === 'retest'
    ? { ...shared, kind: 'retest', value: retestSettingsOf(row.value) }
    : { ...shared, kind: 'fill-policy', value: row.value as FillPolicy }
}
