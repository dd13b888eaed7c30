import { describe, expect, it } from 'vitest'
import { shipmentLinesBody, weighingBody } from '~~/utils/contract/shipments'

const [one, other, first, second] = [1, 2, 3, 4].map(last => `0198f000-0000-7000-8000-00000000000${last}`) as [string, string, string, string]
const changing = (add: object[], takeOff: object[] = []) => shipmentLinesBody.safeParse({ occurredAt: '2026-03-02T15:00:00Z', add, takeOff }).success

describe('changes of a shipment’s lines', () => {
  it('name each cylinder once, each under an id of its own', () => {
    expect(changing([{ id: one, cylinderId: first }, { id: other, cylinderId: second }])).toBe(true)
    expect(changing([{ id: one, cylinderId: first }, { id: other, cylinderId: first }])).toBe(false)
    expect(changing([{ id: one, cylinderId: first }, { id: one, cylinderId: second }])).toBe(false)
    expect(changing([{ id: one, cylinderId: first }], [{ id: one, cylinderId: second, reason: 'leaks' }])).toBe(false)
  })
})

describe('the weight of a line', () => {
  it('is what a scale shows with a cylinder on it: more than nothing', () => {
    const weighing = (gross: object) => weighingBody.safeParse({ id: one, occurredAt: '2026-03-02T15:00:00Z', ref: 'K447103', gross }).success
    expect([{ unit: 'lb', value: 0 }, { unit: 'lb-oz', lb: 0, oz: 0 }, { unit: 'kg', value: 0.0004 }].map(weighing)).toEqual([false, false, false])
    expect([{ unit: 'lb', value: 0.1 }, { unit: 'lb-oz', lb: 0, oz: 1 }, { unit: 'kg', value: 0.001 }].map(weighing)).toEqual([true, true, true])
  })
})
