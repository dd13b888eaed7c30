import { describe, expect, it } from 'vitest'
import type { MassReading } from '../../../../utils/quantity/mass'
import { lastGrossOf, notReadyBecause, reachedOf, readingsOf } from '../../../../utils/recover/course'
import { recoveryPlan } from '../../../../utils/recover/plan'
import { did, filled, kg, registered, viewAfter } from '../../../helpers/custody'

const AT = '2026-07-02T10:00:00-05:00'

describe('where a recovery stops', () => {
  it('is settled with its rule from the stamp and what is in the cylinder', () => {
    const view = viewAfter([registered(), filled('R-22', 20)])
    const plan = recoveryPlan(view, AT)!
    expect(plan).toMatchObject({
      refrigerant: 'R-22', rule: 'water weight', at: AT, limitGrams: view.capacity.fillLimitGrams, tareGrams: view.stamp!.tareWeightGrams,
      stopGrams: view.capacity.exactStopWeightGrams,
    })
    expect(plan.waterFullGrams - plan.tareGrams).toBe(view.stamp!.waterCapacityGrams)
  })

  it('is not settled where something speaks against a fill, or nobody said of what', () => {
    expect(recoveryPlan(viewAfter([registered(), filled('R-22', 45)]), AT), 'overfilled').toBeNull()
    expect(recoveryPlan(viewAfter([registered(), filled('R-22', 20), did('quarantined', { reason: 'smells' })]), AT), 'set apart').toBeNull()
    expect(recoveryPlan(viewAfter([registered()]), AT), 'empty').toBeNull()
  })
})

describe('filling begins', () => {
  const plan = recoveryPlan(viewAfter([registered(), filled('R-22', 20)]), AT)!
  const stopKg = Math.floor(plan.stopGrams / 10) / 100
  const ready = (grossBefore: MassReading | null) => notReadyBecause({ grossBefore }, plan)

  it('with a weight before that leaves room', () => {
    expect(ready(null)).toContain('Weigh it before the hoses go on')
    expect(ready(kg(20))).toBeNull()
    expect(ready(kg(Number((stopKg - 0.01).toFixed(2))))).toBeNull()
    expect(ready(kg(stopKg))).toContain('full already')
    expect(notReadyBecause({ grossBefore: kg(20) }, null)).toContain('Nothing may go into it')
  })
})

it('what the scale showed last is the last reading, else the weight before', () => {
  expect(lastGrossOf({ grossBefore: kg(20), onTheWay: {} })).toEqual(kg(20))
  expect(lastGrossOf({ grossBefore: kg(20), onTheWay: { readings: [{ at: AT, gross: kg(21) }, { at: AT, gross: kg(22) }] } })).toEqual(kg(22))
  expect(lastGrossOf({ grossBefore: null, onTheWay: {} })).toBeNull()
  expect(readingsOf({ onTheWay: {} })).toEqual([])
})

describe('the vacuum of the system', () => {
  const read = (reached: Parameters<typeof reachedOf>[0]['reached'], heldMinutes: number | null = null) => reachedOf({ reached, heldMinutes, faults: {} })

  it('is recorded as its gauge read, mmHg absolute as microns', () => {
    expect(read({ inHg: 10, barometerInHg: 29.5 }, 5)).toEqual({ vacuum: { inHg: 10, barometerInHg: 29.5 }, heldMinutes: 5 })
    expect(read({ microns: 900 }, 0)).toEqual({ vacuum: { microns: 900 }, heldMinutes: 0 })
    expect(read({ mmHgAbsolute: 25 })).toEqual({ vacuum: { microns: 25_000 } })
  })

  it('is not recorded where no gauge was read', () => {
    expect(read(null, 5)).toBeUndefined()
    expect(read({ recoveredGrams: 900, chargeGrams: 1000 })).toBeUndefined()
  })
})
