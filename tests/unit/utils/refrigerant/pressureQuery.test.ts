import { describe, expect, it } from 'vitest'
import { pressureEntryOf, readPressureEntry } from '~~/utils/refrigerant/pressureEntry'
import { pressureQuery, readingInQuery } from '~~/utils/refrigerant/pressureQuery'

describe('a reading in an address', () => {
  it('comes out as it went in, with what was said and nothing else', () => {
    const reading = { pressureKPa: 1091.412, temperatureC: -3.5, barometerKPa: 84.3 }
    expect(pressureQuery(reading)).toEqual({ pressureKPa: '1091.412', temperatureC: '-3.5', barometerKPa: '84.3' })
    expect(readingInQuery(pressureQuery(reading))).toEqual(reading)
    expect(readingInQuery({ pressureKPa: '0' })).toEqual({ pressureKPa: 0 })
  })

  it('is left out where it is no figure', () => {
    expect(readingInQuery({ pressureKPa: 'high', temperatureC: '', gaugeErrorKPa: ['1', '2'], barometerKPa: 'Infinity', thermometerErrorC: null })).toEqual({})
  })

  it('is not judged by the standard air where its barometer cannot be: 29.92 was inHg', () => {
    const entry = pressureEntryOf(readingInQuery({ pressureKPa: '1000', temperatureC: '25', barometerKPa: '29.92' }), 'psi')
    expect(entry.barometer).toBe('8.84')
    expect(readPressureEntry(entry)).toEqual({ reason: 'The barometer shows more or less than can be. Look at its unit.' })
  })
})
