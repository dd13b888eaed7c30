import { describe, expect, it } from 'vitest'
import { celsiusFromFahrenheit, fahrenheitFromCelsius, kelvinFromCelsius } from '~~/utils/quantity/temperature'

describe('a temperature', () => {
  it('is exactly 55 C at 131 F and 25 C at 77 F', () => {
    expect(celsiusFromFahrenheit(131)).toBe(55)
    expect(celsiusFromFahrenheit(77)).toBe(25)
  })

  it('is 54.4444 C at 130 F and 15.5556 C at 60 F', () => {
    expect(celsiusFromFahrenheit(130)).toBeCloseTo(54.4444, 4)
    expect(celsiusFromFahrenheit(60)).toBeCloseTo(15.5556, 4)
  })

  it('is the same number at minus 40', () => {
    expect(fahrenheitFromCelsius(-40)).toBe(-40)
    expect(kelvinFromCelsius(-40)).toBeCloseTo(233.15, 9)
  })
})
