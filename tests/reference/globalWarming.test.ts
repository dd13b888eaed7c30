import { describe, expect, it } from 'vitest'
import { CATALOGUE } from '~~/utils/refrigerant/allRefrigerants'
import { gwpOf } from '~~/utils/refrigerant/gwp'
import type { GwpBasis } from '~~/utils/refrigerant/gwp'

const blend = (...shares: [string, number][]) => ({ composition: shares.map(([component, massPercent]) => ({ component, massPercent })) })

describe('the GWP of blends that were printed elsewhere', () => {
  // US EPA, Technology Transitions GWP Reference Table (2 April 2026), whole numbers, as a public data file restates them.
  it.each([
    ['R-404A', 3922], ['R-407C', 1774], ['R-410A', 2088], ['R-448A', 1386], ['R-449A', 1396], ['R-450A', 601], ['R-452A', 2140], ['R-452B', 698],
    ['R-454B', 465], ['R-454C', 146], ['R-455A', 146], ['R-507A', 3985], ['R-513A', 630], ['R-514A', 3], ['R-515B', 287], ['R-516A', 140],
  ])('%s is %d by exchange values', (designation, printed) => {
    expect(Math.round(valueOf(designation, 'exchange-value') ?? Number.NaN)).toBe(printed)
  })

  // Real Decreto 552/2019 (Spain), instruction IF-02, Appendix 1 Table A, with the values of Regulation (EU) No 517/2014.
  it('R-454B is 466.32 and R-515B 293 with the values of Regulation (EU) No 517/2014', () => {
    expect(valueOf('R-454B', 'EU-517/2014')).toBeCloseTo(466.32, 2)
    expect(Math.round(valueOf('R-515B', 'EU-517/2014') ?? Number.NaN)).toBe(293)
  })

  // Reporting lists of the Montreal Protocol's secretariat (2021), which count on AR4.
  it.each([
    ['R-401A', 1182.48], ['R-404A', 3921.6], ['R-407A', 2107], ['R-407C', 1773.85], ['R-408A', 3151.9], ['R-409A', 1584.75], ['R-410A', 2087.5], ['R-421A', 2630.6],
  ])('%s is %d on AR4', (designation, printed) => {
    expect(valueOf(designation, 'AR4')).toBeCloseTo(printed, 2)
  })

  it('a blend outside the catalogue sums alike: R-407B, 10/70/20, is 2803.5', () => {
    expect(gwpOf(blend(['R-32', 10], ['R-125', 70], ['R-134a', 20]), 'AR4').value).toBeCloseTo(2803.5, 2)
  })

  // A manufacturer's text on R-466A.
  it('R-466A is 733', () => {
    expect(Math.round(valueOf('R-466A', 'AR4') ?? Number.NaN)).toBe(733)
  })
})

// A second list than the one that the values were entered from: 40 CFR 98 Table A-1 in its form before 2025, on AR4.
describe('the GWP of single refrigerants in 40 CFR 98 Table A-1', () => {
  it.each([
    ['R-23', 14_800], ['R-32', 675], ['R-125', 3_500], ['R-134a', 1_430], ['R-143a', 4_470], ['R-152a', 124], ['R-227ea', 3_220],
    ['R-236fa', 9_810], ['R-245fa', 1_030],
  ])('%s is %d on AR4, by exchange value and in the European annex', (designation, printed) => {
    for (const basis of ['AR4', 'exchange-value', 'EU-2024/573', 'EU-517/2014'] as const) expect(valueOf(designation, basis)).toBe(printed)
  })
})

function valueOf(designation: string, basis: GwpBasis): number | null {
  const refrigerant = CATALOGUE.refrigerants.get(designation)
  if (!refrigerant) throw new Error(`No ${designation}`)
  return gwpOf(refrigerant, basis).value
}
