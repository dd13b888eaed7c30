import { describe, expect, it } from 'vitest'
import { loadAdvice } from '../../../../utils/transport/loadAdvice'
import { vanLoad } from '../../../../utils/transport/vanLoad'

// 440 lb = 199,580.6 g, 220 lb = 99,790.3 g, 1,001 lb = 454,046.0 g; one lb is 453.59237 g.
const cylinder = (gross: number | null) => ({ tareWeightGrams: 12_000, netGrams: gross === null ? null : gross - 12_000 })
const advice = (gross: (number | null)[], other: number | null = 0) => loadAdvice(vanLoad(gross.map(cylinder), other), 'lb')

describe('what a crew is told of its load', () => {
  it('is what may still come aboard, where all of it is known', () => {
    // 440 lb less 60,000 g (132.27 lb) leave 307.7 lb.
    expect(advice([60_000])).toEqual({
      kind: 'ok', unknown: [], todo: [], text: '307.7\u00A0lb more without a shipping paper, no cylinder above 220.0\u00A0lb (49 CFR 173.6).',
    })
  })

  it('is never that all is well while something is not known', () => {
    expect(advice([60_000, null]).unknown).toEqual(['1 cylinder is not weighed and not counted here. Weigh it.'])
    expect(advice([60_000, null]).kind).toBe('unk')
    expect(advice([60_000], null).unknown[0]).toContain('What else is carried is not said')
    expect(advice([60_000], null).kind).toBe('unk')
  })

  it('is what to leave behind above 440 lb, rounded up, and which papers go with more', () => {
    // 90,000 g twice and 20,000 g else are 419.4 g above 440 lb: 0.92 lb.
    const over = advice([90_000, 90_000], 20_000)
    expect(over.kind).toBe('att')
    expect(over.text).toBe('1.0\u00A0lb above what goes without a shipping paper (49 CFR 173.6(d)).')
    expect(over.todo).toHaveLength(2)
    expect(over.todo[0]).toBe('Leave at least 1.0\u00A0lb behind.')
  })

  it('names the placard from 1,001 lb gross on, not at 1,000 lb', () => {
    expect(advice(Array(6).fill(75_674), 0).todo.join(' ')).not.toContain('placarded')
    expect(advice(Array(6).fill(75_675), 0).todo.join(' ')).toContain('placarded (49 CFR 172.504(c))')
  })

  it('names a single cylinder above 220 lb although all together are within 440 lb', () => {
    expect(advice([99_790]).kind).toBe('ok')
    expect(advice([99_791]).text).toBe('1 cylinder is above 220.0\u00A0lb: not without a shipping paper (49 CFR 173.6(a)(2)).')
  })
})
