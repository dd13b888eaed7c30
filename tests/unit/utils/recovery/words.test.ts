import { describe, expect, it } from 'vitest'
import { judgeLevel } from '../../../../utils/recovery/judgeLevel'
import { methodCaution, methodWords } from '../../../../utils/recovery/methods'
import type { EvacuationLevel } from '../../../../utils/recovery/types'
import { heldWords, shortWords } from '../../../../utils/recovery/verdictWords'

const TEN: EvacuationLevel = { unit: 'inHg-vacuum', value: 10 }
const NINETY: EvacuationLevel = { unit: 'percent-of-charge', value: 90 }
const FOUR: EvacuationLevel = { unit: 'inHg-vacuum', value: 4 }

describe('what is short of a level', () => {
  it('is never rounded to nothing', () => {
    const required = { level: TEN, alternative: null }
    expect(shortWords(judgeLevel(required, { inHg: 9.99 }, null), required)).toBe('0.1 inHg short')
    expect(shortWords(judgeLevel(required, { inHg: 8.5 }, null), required)).toBe('1.5 inHg short')
    expect(shortWords(judgeLevel(required, { inHg: 10 }, null), required)).toBe('')
  })

  it('has the unit of what was read', () => {
    const required = { level: NINETY, alternative: FOUR }
    expect(shortWords(judgeLevel(required, { recoveredGrams: 855, chargeGrams: 1000 }, null), required)).toBe('4.5 % of the charge short')
    expect(shortWords(judgeLevel(required, { inHg: 3 }, null), required)).toBe('1.0 inHg short')
  })
})

describe('how long a vacuum held', () => {
  it('is said, and that nobody said it', () => {
    const required = { level: TEN, alternative: null }
    expect(heldWords(judgeLevel(required, { inHg: 10 }, 1))).toBe('It held for 1 minute.')
    expect(heldWords(judgeLevel(required, { inHg: 10 }, 0))).toBe('It held for 0 minutes.')
    expect(heldWords(judgeLevel(required, { inHg: 10 }, null))).toBe('How long it held is not said.')
    expect(heldWords(judgeLevel(required, null, null))).toBe('')
  })
})

describe('the method of a recovery', () => {
  it('reads by its name, or as it was written before methods had names', () => {
    expect(methodWords('machine-vapor')).toBe('machine, vapor')
    expect(methodWords('machine')).toBe('machine')
  })

  it('has its own caution where it has one', () => {
    expect(methodCaution('push-pull')).toContain('siphon')
    expect(methodCaution('own-compressor')).toContain('15 lb')
    expect(methodCaution('machine')).toBeNull()
  })
})
