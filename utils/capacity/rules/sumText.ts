import type { MassReading } from '../../quantity/mass'
import { exactGrams, formatReading } from '../../quantity/mass'
import { fahrenheitFromCelsius } from '../../quantity/temperature'
import type { Factor, FillTerm } from '../types'
import { productGrams } from './factors'

// The last decimals of a product that is whole on paper.
const FLOAT_NOISE = 1e-6

/**
 * A rule's sum as the trade writes it, with its result unless that is unsafe; nothing where there is no sum.
 *
 * Rounding: a volume to the nearest hundredth of a litre, a density to the nearest ten-thousandth; what is stamped as it
 * is; the result down.
 *
 * @example '0.95 × 21.61 L × 1.0572 kg/L (liquid R-22 at 131 °F) = 47.85 lb'
 */
export function workingText({ factors, limitGrams }: FillTerm, waterCapacity: MassReading): string {
  const sum = factors.map(factor => FACTOR_TEXT[factor.name](factor)).join(' × ')
  return factors.length === 0 || limitGrams === null ? sum : `${sum} = ${resultText(productGrams(factors), waterCapacity)}`
}

/** The result of a sum in pounds, or in kilograms where the stamp is metric. Rounding: down to two decimals. */
function resultText(grams: number, waterCapacity: MassReading): string {
  const symbol = waterCapacity.unit === 'kg' ? 'kg' : 'lb'
  const hundredths = Math.floor(grams / exactGrams({ unit: symbol, value: 1 }) * 100 + FLOAT_NOISE)
  return `${(hundredths / 100).toFixed(2)} ${symbol}`
}

/** A share in thousandths as it stands in a sum: '0.80', or '0.825' where there is more to it. */
export function shareText(thousandths: number): string {
  return (thousandths / 1000).toFixed(thousandths % 10 === 0 ? 2 : 3)
}

/** A volume as it stands in a sum. Rounding: to the nearest hundredth of a litre. */
export function litresText(litres: number): string {
  return `${litres.toFixed(2)} L`
}

/** A temperature of a rule, which the trade gives in whole degrees Fahrenheit. Rounding: to the nearest degree. */
export function temperatureText(tC: number): string {
  return `${Math.round(fahrenheitFromCelsius(tC))} °F`
}

const FACTOR_TEXT: Record<Factor['name'], (factor: Factor) => string> = {
  'share': ({ value }) => shareText(Math.round(value * 1000)),
  'water-capacity': waterCapacityText,
  'volume': ({ value }) => litresText(value),
  'liquid-density': densityText,
  'filling-density': factor => `${factor.value} %${noteText(factor)}`,
  'filling-ratio': densityText,
  'density-at-pressure': densityText,
  'derate': factor => `${factor.value.toFixed(2)}${noteText(factor)}`,
}

function waterCapacityText({ value, unit, note }: Factor): string {
  return `WC ${note ?? formatReading({ unit: unit === 'kg' ? 'kg' : 'lb', value })}`
}

function densityText(factor: Factor): string {
  return `${factor.value.toFixed(4)} kg/L${noteText(factor)}`
}

function noteText({ note, atC }: Factor): string {
  const words = [note, atC === undefined ? undefined : `at ${temperatureText(atC)}`].filter(word => word !== undefined)
  return words.length === 0 ? '' : ` (${words.join(' ')})`
}
