import { describe, expect, it } from 'vitest'
import { scaleCheck } from '../../../../utils/quantity/scaleCheck'

describe('a scale\'s last check', () => {
  it.each([
    ['2026-12-01', '2026-12-01', 'in-date'],
    ['2025-12-01', '2026-12-01', 'in-date'],
    ['2025-11-30', '2026-12-01', 'old'],
    ['2027-02-28', '2028-02-28', 'in-date'],
    ['2027-02-28', '2028-02-29', 'old'],
    ['2028-02-29', '2029-02-28', 'in-date'],
    ['2028-02-29', '2029-03-01', 'old'],
  ] as const)('on %s is on %s %s', (checked, today, standing) => {
    expect(scaleCheck(checked, today)).toBe(standing)
  })

  it('that nobody knows of is unknown, not old', () => {
    expect(scaleCheck(null, '2026-12-01')).toBe('unknown')
  })
})
