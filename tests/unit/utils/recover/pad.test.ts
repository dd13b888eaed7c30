import { describe, expect, it } from 'vitest'
import { EMPTY_PAD, padKeyOf, pointLabel, pressPad, readPad, type PadKey, type PadText } from '../../../../utils/recover/pad'
import type { MassUnit } from '../../../../utils/quantity/mass'

const KEYS: Record<string, PadKey> = { '.': 'point', '<': 'rub-out' }

/** What stands on the pad after these keys, `.` for the point and `<` for the one that rubs out. */
function typed(keys: string, unit: MassUnit): PadText {
  return [...keys].reduce((text, key) => pressPad(text, KEYS[key] ?? key as PadKey, unit), EMPTY_PAD)
}

describe('the number pad in pounds', () => {
  it('reads what the scale shows', () => {
    expect(readPad(typed('62.3', 'lb'), 'lb')).toEqual({ reading: { unit: 'lb', value: 62.3 } })
    expect(readPad(typed('0.5', 'lb'), 'lb')).toEqual({ reading: { unit: 'lb', value: 0.5 } })
    expect(readPad(typed('.5', 'lb'), 'lb')).toEqual({ reading: { unit: 'lb', value: 0.5 } })
    expect(readPad(EMPTY_PAD, 'lb')).toHaveProperty('reason')
  })

  it('takes four figures and two decimals, and no fifth or third', () => {
    expect(typed('12345', 'lb').figure).toBe('1234')
    expect(typed('62.345', 'lb').figure).toBe('62.34')
    expect(typed('62.3.4', 'lb').figure).toBe('62.34')
  })

  it('lets no nought stand before a figure, and rubs out one key at a time', () => {
    expect(typed('062', 'lb').figure).toBe('62')
    expect(typed('62.<<3', 'lb').figure).toBe('63')
    expect(typed('<<', 'lb')).toEqual(EMPTY_PAD)
  })
})

describe('the number pad in kilograms', () => {
  it('takes three decimals', () => {
    expect(readPad(typed('28.2591', 'kg'), 'kg')).toEqual({ reading: { unit: 'kg', value: 28.259 } })
  })
})

describe('the number pad in pounds and ounces', () => {
  it('goes from pounds to ounces by the key of the point, which says so', () => {
    expect(readPad(typed('62.4.8', 'lb-oz'), 'lb-oz')).toEqual({ reading: { unit: 'lb-oz', lb: 62, oz: 4.8 } })
    expect(pointLabel(typed('62', 'lb-oz'), 'lb-oz')).toBe('lb')
    expect(pointLabel(typed('62.', 'lb-oz'), 'lb-oz')).toBe('.')
    expect(pointLabel(EMPTY_PAD, 'lb')).toBe('.')
  })

  it('asks for the ounces, and takes 15 but not 16', () => {
    expect(readPad(typed('62', 'lb-oz'), 'lb-oz')).toEqual({ reason: 'The ounces are missing. Write 0 if the scale shows none.', empty: false })
    expect(readPad(typed('62.0', 'lb-oz'), 'lb-oz')).toEqual({ reading: { unit: 'lb-oz', lb: 62, oz: 0 } })
    expect(readPad(typed('62.15', 'lb-oz'), 'lb-oz')).toEqual({ reading: { unit: 'lb-oz', lb: 62, oz: 15 } })
    expect(readPad(typed('62.16', 'lb-oz'), 'lb-oz')).toHaveProperty('reason')
  })

  it('reads ounces alone as no pounds, and goes back to the pounds by rubbing out', () => {
    expect(readPad(typed('.8', 'lb-oz'), 'lb-oz')).toEqual({ reading: { unit: 'lb-oz', lb: 0, oz: 8 } })
    expect(typed('62.4<<<', 'lb-oz')).toEqual({ figure: '6', ounces: '', inOunces: false })
  })
})

it('a keyboard types on the same keys', () => {
  expect(['0', '9', '.', ',', 'Backspace', 'Enter', 'a', '-', 'F1'].map(padKeyOf)).toEqual(['0', '9', 'point', 'point', 'rub-out', null, null, null, null])
})
