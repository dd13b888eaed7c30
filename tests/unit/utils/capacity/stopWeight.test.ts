import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { roomGrams, stopWeight, tareInForceGrams } from '~~/utils/capacity/stopWeight'
import { exactGrams, floorToDivision } from '~~/utils/quantity/mass'
import { lb, stampOf } from '~~/tests/helpers/stamps'

describe('the stop weight', () => {
  it('shows 34.2 lb for WC 24.0 lb and TW 15.0 lb', () => {
    const sum = stopWeight(exactGrams(lb(24)) * 0.8, exactGrams(lb(15)))
    expect(floorToDivision(sum.exactStopWeightGrams, 'lb')).toEqual(lb(34.2))
    // 34.2 x 453.59237 = 15512.859
    expect(sum.stopWeightGrams).toBe(15_512)
  })

  it('is the floor of the unrounded sum, not the sum of floors', () => {
    expect(stopWeight(1000.6, 500.5).stopWeightGrams).toBe(1501)
  })

  it('never stands above tare and limit together', () => {
    const mass = fc.double({ min: 0, max: 500_000, noNaN: true })
    fc.assert(fc.property(mass, mass, (limit, tare) => {
      const { stopWeightGrams, exactStopWeightGrams } = stopWeight(limit, tare)
      expect(stopWeightGrams).toBeLessThanOrEqual(limit + tare)
      expect(exactStopWeightGrams - stopWeightGrams).toBeLessThan(1)
    }))
  })
})

describe('the tare in force', () => {
  it('is the one a retest set, else the stamped one', () => {
    expect(tareInForceGrams(stampOf(), 12_600)).toBe(12_600)
    expect(tareInForceGrams(stampOf(), null)).toBeCloseTo(27.5 * 453.59237, 9)
  })

  it('is not known where none is stamped or the stamp leaves the valve out', () => {
    expect(tareInForceGrams(stampOf({ tareWeight: null }))).toBeNull()
    expect(tareInForceGrams(stampOf({ tareIncludesValve: false }))).toBeNull()
    expect(tareInForceGrams(stampOf({ tareIncludesValve: true }))).not.toBeNull()
  })
})

describe('the room', () => {
  it('is what may still go in, below zero when overfilled', () => {
    expect(roomGrams(17_272, 9117)).toBe(8155)
    expect(roomGrams(17_272, 17_272)).toBe(0)
    expect(roomGrams(17_272, 17_273)).toBe(-1)
  })

  it('never grows as the gross grows', () => {
    const gross = fc.integer({ min: 0, max: 500_000 })
    fc.assert(fc.property(gross, gross, fc.nat(100_000), (a, b, tare) => {
      const [light, heavy] = a < b ? [a, b] : [b, a]
      expect(roomGrams(17_272, heavy - tare)).toBeLessThanOrEqual(roomGrams(17_272, light - tare))
    }))
  })
})
