import { describe, expect, it } from 'vitest'
import { pressureQuery, readingInQuery } from '~~/utils/refrigerant/pressureQuery'

describe('a reading in an address', () => {
  it('comes out as it went in, with what was said and nothing else', () => {
    const reading = { pressureKPa: 1091.412, temperatureC: -3.5, barometerKPa: 84.3 }
    expect(pressureQuery(reading)).toEqual({ pressureKPa: '1091.412', temperatureC: '-3.5', barometerKPa: '84.3' })
    expect(readingInQuery(pressureQuery(reading))).toEqual(reading)
    expect(readingInQuery({ pressureKPa: '0' })).toEqual({ pressureKPa: 0 })
  })

  it('is left out where it is no figure or cannot be', () => {
    expect(readingInQuery({ pressureKPa: 'high', temperatureC: '', gaugeErrorKPa: ['1', '2'], barometerKPa: '29.92', thermometerErrorC: null })).toEqual({})
    expect(readingInQuery({ temperatureC: '200', pressureKPa: '20000.1' })).toEqual({ temperatureC: 200 })
  })
})
