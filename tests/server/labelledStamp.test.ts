import { describe, expect, it } from 'vitest'
import { labelledStamp } from '../../server/utils/labels/labelledStamp'
import { stampOf } from '../helpers/stamps'

const SPACE = '\u00A0'

describe('what of a collar stands on its label', () => {
  it('is as it was entered', () => {
    const stamp = stampOf({ serial: 'K48213', waterCapacity: { unit: 'lb-oz', lb: 47, oz: 9.6 } })
    expect(labelledStamp(stamp, { exactGrams: 12_473.79, since: 0, isWeighedAnew: false })).toEqual({
      serial: 'K48213', spec: 'DOT-4BA', servicePressurePsig: 400, tareWeight: `27.5${SPACE}lb`, waterCapacity: `47${SPACE}lb${SPACE}9.6${SPACE}oz`,
    })
  })

  it('has the tare that was weighed at its test in place of the stamped one, in the stamp\'s unit', () => {
    // 27.1 lb x 453.59237 g.
    const weighedAnew = { exactGrams: 12_292.353, since: 0, isWeighedAnew: true }
    expect(labelledStamp(stampOf(), weighedAnew).tareWeight).toBe(`27.1${SPACE}lb`)
    expect(labelledStamp(stampOf({ tareWeight: { unit: 'kg', value: 12.5 } }), weighedAnew).tareWeight).toBe(`12.29${SPACE}kg`)
    expect(labelledStamp(stampOf({ tareWeight: null }), weighedAnew).tareWeight).toBe(`27.1${SPACE}lb`)
  })

  it('leaves out what nobody could read', () => {
    const stamp = stampOf({ serial: null, servicePressurePsig: null, tareWeight: null, waterCapacity: null })
    expect(labelledStamp(stamp, null)).toEqual({ serial: null, spec: 'DOT-4BA', servicePressurePsig: null, tareWeight: null, waterCapacity: null })
  })
})
