import { describe, expect, it } from 'vitest'
import { judgeLevel } from '../../../../utils/recovery/judgeLevel'
import { addressOf, chargeGramsOf, levelDraft, levelQuery } from '../../../../utils/recovery/levelDraft'
import { gaugeFor, reachedDraft, readReached } from '../../../../utils/recovery/reachedDraft'

describe('the address of a question', () => {
  const address = { refrigerant: 'R-134a', charge: '212.5lb', machineMade: 'before-1993-11-15', circumstances: 'leaking', inHg: '3.5', barometerInHg: '29.1', heldMinutes: '6' }

  it('opens the same question again', () => {
    expect(addressOf(levelDraft(address))).toEqual(address)
  })

  it('asks the server only for the level', () => {
    expect(levelQuery(levelDraft(address))).toEqual({ refrigerant: 'R-134a', charge: '212.5lb', machineMade: 'before-1993-11-15', circumstances: 'leaking' })
  })

  it('of nothing is empty', () => {
    expect(addressOf(levelDraft({}))).toEqual({})
    expect(levelDraft({})).toMatchObject({ refrigerant: '', charge: null, machineMade: '', appliance: 'other', circumstances: '', compressorRuns: '' })
  })

  it('takes a date of the machine as the side that it lies on', () => {
    expect(levelDraft({ machineMade: '2004' }).machineMade).toBe('since-1993-11-15')
    expect(levelDraft({ machineMade: '1993' }).machineMade).toBe('')
    expect(levelDraft({ machineMade: '1993-02-28' }).machineMade).toBe('before-1993-11-15')
    expect(levelDraft({ machineMade: '1993-02-31' }).machineMade).toBe('')
  })

  it('holds what it cannot be as not known', () => {
    expect(levelDraft({ appliance: 'large', circumstances: 'whim', compressorRuns: 'perhaps', charge: '12', refrigerant: ['R-22', 'R-12'] })).toEqual(levelDraft({}))
  })

  it('leaves out what does not count for this kind of appliance', () => {
    const said = { ...levelDraft({ ...address, compressorRuns: 'true' }) }
    expect(levelQuery({ ...said, appliance: 'mvac' })).toEqual({ refrigerant: 'R-134a', charge: '212.5lb', appliance: 'mvac' })
    expect(levelQuery({ ...said, appliance: 'small' })).toEqual({ refrigerant: 'R-134a', charge: '212.5lb', machineMade: 'before-1993-11-15', appliance: 'small', compressorRuns: 'true' })
  })

  it('keeps a charge of nothing', () => {
    expect(addressOf(levelDraft({ charge: '0lb' }))).toEqual({ charge: '0lb' })
    expect(chargeGramsOf(levelDraft({ charge: '0lb' }))).toBe(0)
    expect(chargeGramsOf(levelDraft({}))).toBeNull()
  })
})

describe('what was read', () => {
  const typed = { ...reachedDraft({}), figure: '28.5', held: '5' }

  it('is read on the gauge that goes with the level, until another is chosen', () => {
    expect(gaugeFor(typed, { unit: 'inHg-vacuum', value: 10 })).toBe('inHg')
    expect(gaugeFor(typed, { unit: 'mmHg-absolute', value: 25 })).toBe('mmHgAbsolute')
    expect(gaugeFor(typed, { unit: 'percent-of-charge', value: 90 })).toBe('recovered')
    expect(gaugeFor({ ...typed, gauge: 'microns' }, { unit: 'percent-of-charge', value: 90 })).toBe('microns')
    expect(gaugeFor({ ...typed, gauge: 'recovered' }, { unit: 'inHg-vacuum', value: 10 })).toBe('inHg')
  })

  it('comes with its barometer and with how long it held', () => {
    expect(readReached(typed, 'inHg', null)).toEqual({ reached: { inHg: 28.5 }, heldMinutes: 5, faults: {} })
    expect(readReached({ ...typed, barometer: '29.1' }, 'inHg', null).reached).toEqual({ inHg: 28.5, barometerInHg: 29.1 })
    expect(readReached({ ...typed, barometer: '29.1' }, 'microns', null).reached).toEqual({ microns: 28.5 })
  })

  it('is nothing where the field is empty, and 0 where it says 0', () => {
    expect(readReached(reachedDraft({}), 'inHg', null)).toEqual({ reached: null, heldMinutes: null, faults: {} })
    expect(readReached({ ...reachedDraft({}), figure: '0', held: '0' }, 'inHg', null)).toMatchObject({ reached: { inHg: 0 }, heldMinutes: 0 })
  })

  it('is not taken where it cannot be read, and says which field', () => {
    expect(readReached({ ...typed, figure: '1,000' }, 'microns', null)).toMatchObject({ reached: null, faults: { figure: expect.any(String) as string } })
    expect(readReached({ ...typed, figure: '33' }, 'inHg', null)).toMatchObject({ reached: null, faults: { figure: 'It goes from 0 to 32.' } })
    expect(readReached({ ...typed, barometer: '14' }, 'inHg', null)).toMatchObject({ reached: null, faults: { barometer: 'It goes from 15 to 32.' } })
    expect(readReached({ ...typed, held: 'long' }, 'inHg', null)).toMatchObject({ reached: { inHg: 28.5 }, heldMinutes: null, faults: { held: expect.any(String) as string } })
  })

  it('of 1.8 from 2.0 lb is 90 %, whole grams or not, and of 1.79 is not', () => {
    const share = (value: number) => {
      const { reached } = readReached({ ...reachedDraft({}), recovered: { unit: 'lb', value } }, 'recovered', { unit: 'lb', value: 2 })
      return judgeLevel({ level: { unit: 'percent-of-charge', value: 90 }, alternative: null }, reached, null).verdict
    }
    expect(share(1.8)).toBe('reached')
    expect(share(1.79)).toBe('not-reached')
  })

  it('is a share only of a charge that is known', () => {
    const weighed = { ...reachedDraft({}), recovered: { unit: 'kg' as const, value: 0.9 } }
    expect(readReached(weighed, 'recovered', { unit: 'kg', value: 1 }).reached).toEqual({ recoveredGrams: 900, chargeGrams: 1000 })
    expect(readReached(weighed, 'recovered', null).reached).toBeNull()
  })
})
