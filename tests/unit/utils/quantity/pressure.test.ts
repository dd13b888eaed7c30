import { describe, expect, it } from 'vitest'
import { kPaFromPsig, psigFromKPa } from '~~/utils/quantity/pressure'

describe('a gauge reading', () => {
  it('is one atmosphere absolute at zero', () => {
    expect(kPaFromPsig(0)).toBe(101.325)
  })

  it('is 2859.2 kPa absolute at 400 psig, and back', () => {
    // 400 x 6.894757 + 101.325
    expect(kPaFromPsig(400)).toBeCloseTo(2859.228, 3)
    expect(psigFromKPa(2859.228)).toBeCloseTo(400, 3)
  })

  it('is negative below the atmosphere', () => {
    expect(psigFromKPa(51.209)).toBeCloseTo(-7.27, 2)
  })
})
