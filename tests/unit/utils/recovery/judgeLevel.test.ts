import { describe, expect, it } from 'vitest'
import { judgeLevel } from '../../../../utils/recovery/judgeLevel'
import type { EvacuationLevel, Reached } from '../../../../utils/recovery/types'

const TEN: EvacuationLevel = { unit: 'inHg-vacuum', value: 10 }
const NONE: EvacuationLevel = { unit: 'inHg-vacuum', value: 0 }
const LOW: EvacuationLevel = { unit: 'mmHg-absolute', value: 25 }
const MVAC: EvacuationLevel = { unit: 'mmHg-vacuum', value: 102 }
const AIR: EvacuationLevel = { unit: 'psig', value: 0 }
const NINETY: EvacuationLevel = { unit: 'percent-of-charge', value: 90 }

function judged(level: EvacuationLevel, reached: Reached | null, alternative: EvacuationLevel | null = null) {
  return judgeLevel({ level, alternative }, reached, null)
}

describe('a vacuum of 10 inHg', () => {
  it('is reached at 10.0 on the gauge, and 0.1 short at 9.9', () => {
    expect(judged(TEN, { inHg: 10 })).toMatchObject({ verdict: 'reached', shortBy: null })
    const short = judged(TEN, { inHg: 9.9 })
    expect(short.verdict).toBe('not-reached')
    expect(short.shortBy).toBeCloseTo(0.1, 9)
  })

  it('counts from 29.9 inHg, so the barometer decides', () => {
    // 30.4 - 10.0 = 20.4 inHg are left, half an inch more than 19.9; a gauge in thin air of 24.9 inHg is there at 5.
    expect(judged(TEN, { inHg: 10, barometerInHg: 30.4 }).shortBy).toBeCloseTo(0.5, 9)
    expect(judged(TEN, { inHg: 10.5, barometerInHg: 30.4 }).verdict).toBe('reached')
    expect(judged(TEN, { inHg: 5, barometerInHg: 24.9 }).verdict).toBe('reached')
    expect(judged(TEN, { inHg: 4.9, barometerInHg: 24.9 }).verdict).toBe('not-reached')
  })

  it('is 505.46 mmHg absolute on the other gauges', () => {
    // (29.9 - 10) x 25.4.
    expect(judged(TEN, { mmHgAbsolute: 505.4 }).verdict).toBe('reached')
    expect(judged(TEN, { mmHgAbsolute: 505.5 }).verdict).toBe('not-reached')
    expect(judged(TEN, { microns: 505_460 }).verdict).toBe('reached')
    expect(judged(TEN, { microns: 505_470 }).verdict).toBe('not-reached')
  })

  it('says that it took the air as 29.9 inHg where nobody read a barometer', () => {
    expect(judged(TEN, { inHg: 10 }).because).toContain('The barometer is not known: taken as 29.9 inHg.')
    expect(judged(TEN, { inHg: 10, barometerInHg: 29.9 }).because).not.toContain('not known')
    expect(judged(TEN, { microns: 500 }).because).not.toContain('not known')
  })

  it('cannot be told from a weight', () => {
    expect(judged(TEN, { recoveredGrams: 4000, chargeGrams: 4000 }).verdict).toBe('unknown')
  })
})

describe('a vacuum of 0 inHg', () => {
  it('is reached by a gauge at 0, for 0 is a reading', () => {
    const { verdict, absoluteMmHg } = judged(NONE, { inHg: 0 })
    expect(verdict).toBe('reached')
    // 29.9 x 25.4.
    expect(absoluteMmHg).toBeCloseTo(759.46, 9)
  })
})

describe('25 mmHg absolute', () => {
  it('is reached at 25 and not at 25.1', () => {
    expect(judged(LOW, { mmHgAbsolute: 25 }).verdict).toBe('reached')
    expect(judged(LOW, { mmHgAbsolute: 25.1 }).shortBy).toBeCloseTo(0.1, 9)
    expect(judged(LOW, { microns: 0 })).toMatchObject({ verdict: 'reached', absoluteMmHg: 0 })
  })

  it('is 28.92 on a gauge of inHg in air of 29.9, and not 28.9', () => {
    expect(judged(LOW, { inHg: 28.92, barometerInHg: 29.9 }).verdict).toBe('reached')
    expect(judged(LOW, { inHg: 28.9, barometerInHg: 29.9 }).verdict).toBe('not-reached')
  })

  it('is not told by a gauge of inHg whose barometer nobody read', () => {
    // In air of 30.2 inHg 28.95 leaves 31.75 mmHg, in thin air of 24.9 it cannot be.
    expect(judged(LOW, { inHg: 28.95 })).toMatchObject({ verdict: 'unknown', shortBy: null })
    expect(judged(LOW, { inHg: 28.95, barometerInHg: 30.2 }).verdict).toBe('not-reached')
  })

  it('is not told by a gauge that shows more than the air can give', () => {
    expect(judged(TEN, { inHg: 29.92 })).toMatchObject({ verdict: 'unknown', shortBy: null })
    expect(judged(LOW, { inHg: 29.92, barometerInHg: 29.92 }).verdict).toBe('reached')
    expect(judged(LOW, { inHg: 29, barometerInHg: 27 }).verdict).toBe('unknown')
  })
})

describe('102 mmHg of vacuum', () => {
  it('is a vacuum, not what is left', () => {
    // 29.9 x 25.4 - 102 = 657.46; 102 / 25.4 = 4.016 inHg.
    expect(judged(MVAC, { mmHgAbsolute: 657.4 }).verdict).toBe('reached')
    expect(judged(MVAC, { inHg: 4 }).verdict).toBe('not-reached')
    expect(judged(MVAC, { inHg: 4.02 }).verdict).toBe('reached')
  })
})

describe('0 psig at most', () => {
  it('is what the gauge shows, whatever the barometer', () => {
    expect(judged(AIR, { inHg: 0, barometerInHg: 30.5 }).verdict).toBe('reached')
    expect(judged(AIR, { mmHgAbsolute: 800 }).verdict).toBe('not-reached')
  })
})

describe('90 % of a small appliance’s charge', () => {
  const four: EvacuationLevel = { unit: 'inHg-vacuum', value: 4 }

  it('is judged by weight, to the gram', () => {
    expect(judged(NINETY, { recoveredGrams: 900, chargeGrams: 1000 }, four).verdict).toBe('reached')
    expect(judged(NINETY, { recoveredGrams: 899, chargeGrams: 1000 }, four)).toMatchObject({ verdict: 'not-reached', because: '89.9 % of the charge came out, 90 % is asked for.' })
    expect(judged(NINETY, { recoveredGrams: 0, chargeGrams: 1000 }, four).verdict).toBe('not-reached')
    expect(judged(NINETY, { recoveredGrams: 10, chargeGrams: 0 }, four).verdict).toBe('unknown')
  })

  it('is doubted in words where more came out than there was', () => {
    expect(judged(NINETY, { recoveredGrams: 1000, chargeGrams: 1000 }, four).because).toBe('100.0 % of the charge came out, 90 % is asked for.')
    expect(judged(NINETY, { recoveredGrams: 1001, chargeGrams: 1000 }, four).because)
      .toBe('100.1 % of the charge came out, 90 % is asked for. That is more than there was: look at the charge and at the scale.')
  })

  it('or by four inches of vacuum instead', () => {
    expect(judged(NINETY, { inHg: 4 }, four).verdict).toBe('reached')
    expect(judged(NINETY, { inHg: 3.9 }, four).verdict).toBe('not-reached')
    expect(judged(NINETY, { inHg: 4 }).verdict).toBe('unknown')
  })
})

describe('how long it held', () => {
  it('is kept and changes no verdict', () => {
    expect(judgeLevel({ level: TEN, alternative: null }, { inHg: 10 }, 0)).toMatchObject({ verdict: 'reached', heldMinutes: 0 })
    expect(judgeLevel({ level: TEN, alternative: null }, { inHg: 9 }, 30)).toMatchObject({ verdict: 'not-reached', heldMinutes: 30 })
  })

  it('says nothing of a vacuum that nobody read', () => {
    expect(judgeLevel({ level: TEN, alternative: null }, null, 5)).toMatchObject({ verdict: 'unknown', absoluteMmHg: null, heldMinutes: 5 })
  })
})
