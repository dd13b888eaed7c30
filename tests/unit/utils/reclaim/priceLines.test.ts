import { describe, expect, it } from 'vitest'
import type { DatedPrice } from '~~/utils/reclaim/price'
import { priceLines } from '~~/utils/reclaim/priceLines'

function price(id: string, fromDay: string, untilDay: string | null, more: Partial<DatedPrice> = {}): DatedPrice {
  return { id, refrigerant: 'R-22', condition: 'clean', fromDay, untilDay, rate: { mills: 5000, per: 'lb' }, recordedAt: 0, ...more }
}

const only = (prices: DatedPrice[], today = '2026-06-15') => priceLines(prices, today)[0]!
const periods = (prices: DatedPrice[]) => only(prices).periods.map(({ fromDay, untilDay, price: one }) => [fromDay, untilDay, one?.id ?? null])

describe('the prices of a refrigerant in a condition', () => {
  it('follow each other, each until the day before the next, without a remark', () => {
    const line = only([price('march', '2026-03-01', null), price('june', '2026-06-01', null), price('august', '2026-08-01', null)])
    expect(line.periods.map(({ fromDay, untilDay }) => [fromDay, untilDay])).toEqual([['2026-03-01', '2026-05-31'], ['2026-06-01', '2026-07-31'], ['2026-08-01', null]])
    expect(line.now?.price?.id).toBe('june')
    expect(line.next).toMatchObject({ fromDay: '2026-08-01', price: { id: 'august' } })
    expect(line.remarks).toEqual([])
  })

  it('leave a gap that is said, and none where one begins the day after another ends', () => {
    expect(only([price('a', '2026-03-01', '2026-05-31'), price('b', '2026-06-01', null)]).remarks).toEqual([])
    expect(only([price('a', '2026-03-01', '2026-05-30'), price('b', '2026-06-01', null)]).remarks).toEqual(['No price from 31 May 2026 to 31 May 2026.'])
  })

  it('that have ended give none any more', () => {
    const line = only([price('a', '2026-03-01', '2026-06-14')])
    expect(line.now).toBeNull()
    expect(line.remarks).toEqual(['No price from 15 Jun 2026 on.'])
    expect(only([price('a', '2026-03-01', '2026-06-15')]).now?.price?.id).toBe('a')
  })

  it('that are all to come give none yet, and say from when', () => {
    const line = only([price('a', '2026-06-16', null)])
    expect(line.now).toBeNull()
    expect(line.next).toMatchObject({ fromDay: '2026-06-16', price: { id: 'a' } })
  })

  it('that overlap against a stated end say which counts, and what counts after it', () => {
    const year = price('year', '2026-01-01', '2026-12-31')
    const june = price('june', '2026-06-01', '2026-06-30', { rate: { mills: 5500, per: 'lb' } })
    expect(periods([year, june])).toEqual([['2026-01-01', '2026-05-31', 'year'], ['2026-06-01', '2026-06-30', 'june'], ['2026-07-01', '2026-12-31', 'year'], ['2027-01-01', null, null]])
    expect(only([year, june]).remarks).toEqual([
      'No price from 1 Jan 2027 on.',
      'Two prices from 1 Jun 2026 to 30 Jun 2026: $5.50\u00A0a\u00A0lb counts, which begins later. The other one counts again after it.',
    ])
    expect(only([year, { ...june, fromDay: '2027-01-01', untilDay: '2027-01-31' }]).remarks).toEqual(['No price from 1 Feb 2027 on.'])
  })

  it('are kept apart by refrigerant and condition, named ones first', () => {
    const names = priceLines([
      price('a', '2026-01-01', null, { refrigerant: null, condition: 'mixed' }), price('b', '2026-01-01', null, { refrigerant: 'R-134a' }),
      price('c', '2026-01-01', null, { condition: 'suspect' }), price('d', '2026-01-01', null),
    ], '2026-06-15').map(({ refrigerant, condition }) => [refrigerant, condition])
    expect(names).toEqual([['R-22', 'clean'], ['R-22', 'suspect'], ['R-134a', 'clean'], [null, 'mixed']])
  })
})
