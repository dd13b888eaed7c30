import { describe, expect, it } from 'vitest'
import { massEntryText, readMassEntry } from '../../../../utils/quantity/massEntry'

describe('a weight field', () => {
  it('reads a decimal weight with a point or a comma', () => {
    expect(readMassEntry({ figure: '62.3', ounces: '' }, 'lb')).toEqual({ reading: { unit: 'lb', value: 62.3 } })
    expect(readMassEntry({ figure: '28,3', ounces: '' }, 'kg')).toEqual({ reading: { unit: 'kg', value: 28.3 } })
  })

  it('takes 0 for a weight', () => {
    expect(readMassEntry({ figure: '0', ounces: '' }, 'lb')).toEqual({ reading: { unit: 'lb', value: 0 } })
  })

  it('reads pounds and ounces from two boxes', () => {
    expect(readMassEntry({ figure: '41', ounces: '13' }, 'lb-oz')).toEqual({ reading: { unit: 'lb-oz', lb: 41, oz: 13 } })
  })

  it('takes less than a pound of ounces and no more', () => {
    expect(readMassEntry({ figure: '41', ounces: '15.9' }, 'lb-oz')).toEqual({ reading: { unit: 'lb-oz', lb: 41, oz: 15.9 } })
    expect(readMassEntry({ figure: '41', ounces: '16' }, 'lb-oz')).toMatchObject({ reason: 'Ounces go from 0 to less than 16.' })
  })

  it('never reads missing ounces as none', () => {
    expect(readMassEntry({ figure: '41', ounces: '' }, 'lb-oz')).toMatchObject({ reason: expect.stringContaining('ounces are missing'), empty: false })
  })

  it('never reads missing pounds as none', () => {
    expect(readMassEntry({ figure: '', ounces: '13' }, 'lb-oz')).toMatchObject({ reason: 'The pounds are missing.', empty: false })
  })

  it('asks again for decimal pounds beside ounces', () => {
    expect(readMassEntry({ figure: '41.5', ounces: '2' }, 'lb-oz')).toMatchObject({ reason: expect.stringContaining('Whole pounds') })
  })

  it('says what is wrong with a text that is no weight', () => {
    expect(readMassEntry({ figure: 'sixty', ounces: '' }, 'lb')).toEqual({ reason: '“sixty” is not a weight. Write figures, such as 62.3.', empty: false })
    expect(readMassEntry({ figure: '1,022', ounces: '' }, 'lb')).toMatchObject({ reason: expect.stringContaining('two ways') })
  })

  it('is only empty before anything is typed', () => {
    expect(readMassEntry({ figure: '  ', ounces: '' }, 'lb')).toMatchObject({ empty: true })
    expect(readMassEntry({ figure: '', ounces: '' }, 'lb-oz')).toMatchObject({ empty: true })
  })

  it('shows a reading as it was entered', () => {
    expect(massEntryText({ unit: 'lb-oz', lb: 41, oz: 0 })).toEqual({ figure: '41', ounces: '0' })
    expect(massEntryText({ unit: 'kg', value: 18.97 })).toEqual({ figure: '18.97', ounces: '' })
    expect(massEntryText(null)).toEqual({ figure: '', ounces: '' })
  })
})
