import type { FirmRule } from '../contract/policy'

/** Where a rule stands on a day. */
export type RuleStanding = 'in-force' | 'to-come' | 'ended' | 'withdrawn'

/** A rule of the firm, where it stands, and when (UTC milliseconds) another took its place; null where none did. */
export interface StandingRule { rule: FirmRule, standing: RuleStanding, untilAt: number | null }

/**
 * The rules of one kind as they stand at an instant, in the order given: the newest first.
 *
 * One that was withdrawn takes nobody's place.
 */
export function ruleHistory(rules: readonly FirmRule[], kind: FirmRule['kind'], nowMs: number): StandingRule[] {
  const ofKind = rules.filter(rule => rule.kind === kind)
  const counting = ofKind.filter(({ withdrawn }) => withdrawn === null)
  const inForce = counting.find(({ fromAt }) => fromAt <= nowMs)
  return ofKind.map((rule) => {
    if (rule.withdrawn) return { rule, standing: 'withdrawn', untilAt: null }
    const next = counting[counting.indexOf(rule) - 1]
    const standing = rule === inForce ? 'in-force' : rule.fromAt > nowMs ? 'to-come' : 'ended'
    return { rule, standing, untilAt: next?.fromAt ?? null }
  })
}
