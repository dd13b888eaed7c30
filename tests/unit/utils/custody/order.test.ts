import { describe, expect, it } from 'vitest'
import { effectOrder, isClamped } from '~~/utils/custody/order'

const NOON = 1_000_000
const event = (name: string, changes: Partial<Parameters<typeof effectOrder>[0]> = {}) => ({
  id: name, deviceId: '', deviceSeq: 0, occurredAt: NOON, clockSkewSeconds: 0, effectiveAt: NOON, ...changes,
})
const inOrder = (...events: ReturnType<typeof event>[]) => [...events].sort(effectOrder).map(({ id }) => id)

describe('the order of effect', () => {
  it('goes by time before anything else', () => {
    expect(inOrder(event('a', { deviceSeq: 9, effectiveAt: 2, occurredAt: 2 }), event('b', { deviceSeq: 10, effectiveAt: 1, occurredAt: 1 }))).toEqual(['b', 'a'])
  })

  it('goes at one time by device, by its count, and by id whatever its case', () => {
    expect(inOrder(event('d', { deviceId: 'phone-2' }), event('C', { deviceId: 'phone-1', deviceSeq: 2 }), event('b', { deviceId: 'phone-1', deviceSeq: 2 }), event('a', { deviceId: 'phone-1', deviceSeq: 10 }), event('e')))
      .toEqual(['e', 'b', 'C', 'a', 'd'])
  })

  it('puts events held back to one instant by the times they claim, after what truly happened then', () => {
    const late = event('late', { occurredAt: NOON + 9, deviceId: 'a' })
    const later = event('later', { occurredAt: NOON + 20, deviceId: 'Z' })
    const then = event('then', { deviceId: 'zz' })
    expect(inOrder(later, late, then)).toEqual(['then', 'late', 'later'])
    expect([then, late].map(isClamped)).toEqual([false, true])
  })
})
