import { describe, expect, it } from 'vitest'
import { codes, contentsAfter, did, filled, kg, lastFindings, lastMovements, registered, REQUALIFIER, STAMP, viewAfter } from '~~/tests/helpers/custody'
import { isDeep } from '~~/utils/custody/fold/emptied'

const full = [registered(), filled('R-22', 20)]
const deep = { microns: 1000 }

describe('a vacuum', () => {
  it('is deep at 1,000 microns and within 1 inHg of the barometer, not a hair beyond', () => {
    expect(isDeep({ microns: 1000 })).toBe(true)
    expect(isDeep({ microns: 1001 })).toBe(false)
    expect(isDeep({ inHg: 28.92 })).toBe(true)
    expect(isDeep({ inHg: 28.91 })).toBe(false)
    // In Denver the barometer stands near 24.9 inHg.
    expect(isDeep({ inHg: 23.9, barometerInHg: 24.9 })).toBe(true)
    expect(isDeep({ inHg: 23.8, barometerInHg: 24.9 })).toBe(false)
    expect(isDeep(undefined)).toBe(false)
  })

  it('is not believed from a gauge that shows more than the barometer allows', () => {
    expect(isDeep({ inHg: 25.9, barometerInHg: 24.9 })).toBe(true)
    expect(isDeep({ inHg: 26, barometerInHg: 24.9 })).toBe(false)
    expect(isDeep({ inHg: 31 })).toBe(false)
  })
})

describe('a cylinder emptied by a deep vacuum', () => {
  it('has nothing in it, clean and evacuated, whatever was in it', () => {
    const burnt = [registered(), filled('R-22', 20, { condition: 'burnt' }), filled('R-134a', 21)]
    for (const story of [full, burnt]) {
      expect(contentsAfter(...story, did('emptied', { vacuum: deep }))).toMatchObject({
        nothingInIt: true, evacuated: true, burnt: false, refrigerant: null, condition: 'clean', netGrams: 0, basis: 'reckoned', knownSinceVacuum: [],
      })
    }
    expect(codes(viewAfter([...burnt, did('emptied', { vacuum: deep })]))).toEqual([])
  })

  it('books what was in it as lost in emptying', () => {
    expect(lastMovements(...full, did('emptied', { vacuum: deep }))).toEqual(['emptied-loss R-22 -8000'])
  })

  it('weighed above its tare does not count as evacuated and is to be weighed again', () => {
    const heavy = did('emptied', { vacuum: deep, grossAfter: kg(12.1) })
    expect(contentsAfter(...full, heavy)).toMatchObject({ nothingInIt: false, evacuated: false, refrigerant: 'R-22', netGrams: 100 })
    expect(lastFindings(...full, heavy)).toEqual(['weigh-again'])
    expect(contentsAfter(...full, did('emptied', { vacuum: deep, grossAfter: kg(12.06) }))).toMatchObject({ evacuated: true, netGrams: 0, basis: 'weighed' })
  })

  it('weighed below its tare, or without a tare, is evacuated with a weight that nobody knows', () => {
    const light = did('emptied', { vacuum: deep, grossAfter: kg(11) })
    expect(contentsAfter(...full, light)).toMatchObject({ nothingInIt: true, evacuated: true, netGrams: null })
    expect(lastFindings(...full, light)).toEqual(['weigh-again'])
    const noTare = registered({ stamp: { ...STAMP, tareWeight: null }, contents: 'unknown' })
    expect(contentsAfter(noTare, did('emptied', { vacuum: deep, grossAfter: kg(12) }))).toMatchObject({ nothingInIt: true, evacuated: true, netGrams: null })
  })

  it('that weighs 5 % or more below its tare asks for a test, whatever the date', () => {
    // 5 % of 12.00 kg is 0.60 kg.
    const light = (grossAfter: number) => viewAfter([...full, did('emptied', { vacuum: deep, grossAfter: kg(grossAfter) })])
    expect(light(11.41).holds).toEqual([])
    expect(light(11.4)).toMatchObject({ holds: ['tare-loss'], capacity: { stopWeightGrams: null } })
    // What was emptied without a vacuum may have been read with a heel in it, or wrong: nothing is known of its steel.
    expect(viewAfter([...full, did('emptied', { grossAfter: kg(11.4) })]).holds).toEqual([])
  })

  it('is dry again after its test', () => {
    const wet = [registered(), did('retested', { month: '2026-07', method: 'volumetric', result: 'passed', requalifierId: REQUALIFIER })]
    expect(viewAfter([...wet, did('emptied', { vacuum: { microns: 1001 } })]).holds).toEqual(['wet'])
    expect(viewAfter([...wet, did('emptied', { vacuum: deep })]).holds).toEqual([])
  })
})

describe('a cylinder emptied otherwise', () => {
  it('keeps a heel by its name, with the weight it shows', () => {
    expect(contentsAfter(...full, did('emptied', { grossAfter: kg(12.3) }))).toMatchObject({ nothingInIt: false, refrigerant: 'R-22', netGrams: 300 })
    expect(lastMovements(...full, did('emptied', { grossAfter: kg(12.3) }))).toEqual(['emptied-loss R-22 -7700'])
  })

  it('without a weight holds nobody knows how much', () => {
    expect(contentsAfter(...full, did('emptied', { vacuum: { microns: 5000 } }))).toMatchObject({ nothingInIt: false, refrigerant: 'R-22', netGrams: null })
  })
})
