import { describe, expect, it } from 'vitest'
import { DEFAULT_FILL_POLICY } from '~~/utils/capacity/types'
import type { FirmRule } from '~~/utils/contract/policy'
import { ruleHistory } from '~~/utils/rules/ruleHistory'

const BY = { id: 'p', name: 'A manager' }

function rule(id: string, fromAt: number, isWithdrawn = false): FirmRule {
  return {
    id, fromAt, kind: 'fill-policy', value: DEFAULT_FILL_POLICY, reason: 'because', setBy: BY, setAt: 0,
    withdrawn: isWithdrawn ? { by: BY, at: 1, reason: 'a slip' } : null,
  }
}

const told = (rules: FirmRule[], nowMs: number) => ruleHistory(rules, 'fill-policy', nowMs).map(({ rule: { id }, standing, untilAt }) => [id, standing, untilAt])

describe('the history of a rule', () => {
  it('has one in force from its own millisecond on, until another begins', () => {
    const rules = [rule('third', 300), rule('second', 200), rule('first', 100)]
    expect(told(rules, 199)).toEqual([['third', 'to-come', null], ['second', 'to-come', 300], ['first', 'in-force', 200]])
    expect(told(rules, 200)).toEqual([['third', 'to-come', null], ['second', 'in-force', 300], ['first', 'ended', 200]])
    expect(told(rules, 300)).toEqual([['third', 'in-force', null], ['second', 'ended', 300], ['first', 'ended', 200]])
  })

  it('keeps a withdrawn one, which takes nobody\'s place', () => {
    expect(told([rule('second', 200, true), rule('first', 100)], 250)).toEqual([['second', 'withdrawn', null], ['first', 'in-force', null]])
  })

  it('has none in force before the first', () => {
    expect(told([rule('first', 100)], 99)).toEqual([['first', 'to-come', null]])
  })
})
