import { describe, expect, it } from 'vitest'
import { vanLoad } from '../../../../utils/transport/vanLoad'

// 440 lb = 199,580.6 g and 220 lb = 99,790.3 g at 453.59237 g a pound.
const aboard = (tareWeightGrams: number | null, netGrams: number | null) => ({ tareWeightGrams, netGrams })

describe('the load of a van against the materials of trade of 49 CFR 173.6', () => {
  it('is within 440 lb at 199,580 g and over it at 199,581 g', () => {
    expect(vanLoad([aboard(60_000, 39_790), aboard(60_000, 39_790)]).isOver).toBe(false)
    expect(vanLoad([aboard(60_000, 39_790), aboard(60_000, 39_791)]).isOver).toBe(true)
  })

  it('counts a single cylinder as too heavy from 99,791 g', () => {
    expect(vanLoad([aboard(50_000, 49_790)]).tooHeavy).toBe(0)
    expect(vanLoad([aboard(50_000, 49_791)]).tooHeavy).toBe(1)
  })

  it('counts what is not weighed apart, and never as nothing', () => {
    const load = vanLoad([aboard(12_000, 0), aboard(12_000, null), aboard(null, 5_000)])
    expect(load.knownGrossGrams).toBe(12_000)
    expect(load.withoutWeight).toBe(2)
  })
})

describe('what else is carried', () => {
  it('shares the 440 lb with the cylinders: 30,000 g of torch gas leave 169,580 g for them', () => {
    expect(vanLoad([aboard(100_000, 69_580)], 30_000)).toMatchObject({ knownGrossGrams: 169_580, allGrams: 199_580, isOver: false })
    expect(vanLoad([aboard(100_000, 69_581)], 30_000)).toMatchObject({ allGrams: 199_581, isOver: true })
  })

  it('is nothing only where somebody has said so', () => {
    expect(vanLoad([]).otherGrams).toBeNull()
    expect(vanLoad([], 0).otherGrams).toBe(0)
  })
})
