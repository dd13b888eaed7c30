/** A temperature in degrees Celsius from one in degrees Fahrenheit. */
export function celsiusFromFahrenheit(f: number): number {
  return (f - 32) * 5 / 9
}

/** A temperature in degrees Fahrenheit from one in degrees Celsius. */
export function fahrenheitFromCelsius(c: number): number {
  return c * 9 / 5 + 32
}

/** A temperature in kelvin from one in degrees Celsius. */
export function kelvinFromCelsius(c: number): number {
  return c + 273.15
}

/** A temperature in degrees Celsius from one in kelvin. */
export function celsiusFromKelvin(k: number): number {
  return k - 273.15
}
