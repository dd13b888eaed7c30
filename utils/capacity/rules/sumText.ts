import type { MassReading } from '../../quantity/mass'
import { exactGrams, formatReading } from '../../quantity/mass'

// The last decimals of a product that is whole on paper.
const FLOAT_NOISE = 1e-6

/** A share in thousandths as it stands in a sum: '0.80'. */
export function shareText(thousandths: number): string {
  return thousandths % 10 === 0 ? (thousandths / 1000).toFixed(2) : (thousandths / 1000).toFixed(3)
}

/** A volume as it stands in a sum. Rounding: to the nearest hundredth of a litre. */
export function litresText(litres: number): string {
  return `${litres.toFixed(2)} L`
}

/** A density as it stands in a sum. Units: kg/m3 in, kg/L out. Rounding: to the nearest ten-thousandth. */
export function densityText(kgPerM3: number): string {
  return `${(kgPerM3 / 1000).toFixed(4)} kg/L`
}

/** A water capacity as it stands in a sum, as stamped. */
export function waterCapacityText(waterCapacity: MassReading): string {
  return `WC ${formatReading(waterCapacity)}`
}

/** The result of a sum in pounds, or in kilograms where the stamp is metric. Rounding: down to two decimals. */
export function resultText(grams: number, waterCapacity: MassReading): string {
  const symbol = waterCapacity.unit === 'kg' ? 'kg' : 'lb'
  const hundredths = Math.floor(grams / exactGrams({ unit: symbol, value: 1 }) * 100 + FLOAT_NOISE)
  return `${(hundredths / 100).toFixed(2)} ${symbol}`
}
