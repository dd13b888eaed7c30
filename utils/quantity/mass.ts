export { parseFigure } from './figure'
export type { ParsedFigure } from './figure'

/** How a scale or a stamp gives a mass. */
export type MassUnit = 'lb' | 'lb-oz' | 'kg'

/** A mass as it was read or stamped, kept with its unit. */
export type MassReading
  = | { unit: 'lb', value: number }
    | { unit: 'lb-oz', lb: number, oz: number }
    | { unit: 'kg', value: number }

/** Which way a mass is brought to the division of a scale. */
export type MassRounding = 'down' | 'nearest' | 'up'

// Exact by definition of the international pound (1959): 1 lb = 0.45359237 kg.
const GRAMS_PER_POUND = 453.59237
const OUNCES_PER_POUND = 16

type Division = { grams: number, perUnit: number, decimals: number }

const DIVISIONS: Record<MassUnit, Division> = {
  'lb': { grams: GRAMS_PER_POUND / 10, perUnit: 10, decimals: 1 },
  'lb-oz': { grams: GRAMS_PER_POUND / OUNCES_PER_POUND, perUnit: OUNCES_PER_POUND, decimals: 0 },
  'kg': { grams: 10, perUnit: 100, decimals: 2 },
}

// Whole grams lose up to half a gram against the reading they came from.
const CONVERSION_NOISE_GRAMS = 0.5

const NO_BREAK_SPACE = '\u00A0'
const MINUS = '\u2212'

const SINGLE_UNIT_TEXT = /^(\d+(?:\.\d+)?)(lb|kg)$/
const POUNDS_AND_OUNCES_TEXT = /^(\d+)lb(\d+(?:\.\d+)?)oz$/

/** A reading in grams, unrounded. */
export function exactGrams(reading: MassReading): number {
  switch (reading.unit) {
    case 'lb': return reading.value * GRAMS_PER_POUND
    case 'lb-oz': return (reading.lb * OUNCES_PER_POUND + reading.oz) * GRAMS_PER_POUND / OUNCES_PER_POUND
    case 'kg': return reading.value * 1000
  }
}

/** A reading in whole grams. Rounding: to the nearest gram. */
export function readingGrams(reading: MassReading): number {
  return Math.round(exactGrams(reading))
}

/**
 * The reading written in a query, or null where the text is none.
 *
 * @example parseMassText('41lb13oz') // { unit: 'lb-oz', lb: 41, oz: 13 }
 */
export function parseMassText(text: string): MassReading | null {
  const single = SINGLE_UNIT_TEXT.exec(text)
  if (single) return { unit: single[2] as 'lb' | 'kg', value: Number(single[1]) }
  const pair = POUNDS_AND_OUNCES_TEXT.exec(text)
  if (!pair) return null
  const oz = Number(pair[2])
  return oz < OUNCES_PER_POUND ? { unit: 'lb-oz', lb: Number(pair[1]), oz } : null
}

/** A reading as {@link parseMassText} reads it. */
export function massText(reading: MassReading): string {
  if (reading.unit === 'lb-oz') return `${plainDecimal(reading.lb)}lb${plainDecimal(reading.oz)}oz`
  return `${plainDecimal(reading.value)}${reading.unit}`
}

/**
 * The highest reading of a scale that is not above a mass.
 *
 * Units: lb to 0.1, lb-oz to the whole ounce, kg to 0.01.
 * Rounding: down, after half a gram against conversion noise, so that 34.2 lb on paper stays 34.2 lb.
 */
export function floorToDivision(grams: number, unit: MassUnit): MassReading {
  return readingOf(divisionCount(grams, unit, 'down'), unit)
}

/** The lowest reading of a scale that is not below a mass. Rounding: up, less half a gram against conversion noise. */
export function ceilToDivision(grams: number, unit: MassUnit): MassReading {
  return readingOf(divisionCount(grams, unit, 'up'), unit)
}

/** The reading of a scale nearest to a mass. */
export function nearestToDivision(grams: number, unit: MassUnit): MassReading {
  return readingOf(divisionCount(grams, unit, 'nearest'), unit)
}

/**
 * A mass in the reader's unit, at the division of a scale.
 *
 * Rounding: as asked for; a limit, a room and a stop weight go down, also below zero; an excess goes up.
 *
 * Shape: ounces alone where there is no whole pound.
 *
 * @example formatMass(29_937, 'lb', 'down') // '66.0 lb', with a no-break space
 */
export function formatMass(grams: number, unit: MassUnit, rounding: MassRounding): string {
  const { figure, symbol } = formatFigure(grams, unit, rounding)
  return `${figure}${NO_BREAK_SPACE}${symbol}`
}

/** The same as {@link formatMass} with the last symbol apart, for a figure set larger than its symbol. */
export function formatFigure(grams: number, unit: MassUnit, rounding: MassRounding): { figure: string, symbol: string } {
  const count = divisionCount(grams, unit, rounding)
  const sign = count < 0 ? MINUS : ''
  const { perUnit, decimals } = DIVISIONS[unit]
  if (unit !== 'lb-oz') return { figure: sign + (Math.abs(count) / perUnit).toFixed(decimals), symbol: unit }
  const pounds = Math.floor(Math.abs(count) / perUnit)
  const ounces = Math.abs(count) % perUnit
  return { figure: pounds === 0 ? `${sign}${ounces}` : `${sign}${pounds}${NO_BREAK_SPACE}lb${NO_BREAK_SPACE}${ounces}`, symbol: 'oz' }
}

/**
 * A mass a step finer than a scale shows it, for a sum that is then rounded to the scale.
 *
 * Rounding: down to two decimals, by the same half gram as a division, so that 37.70 is not followed by 37.6.
 */
export function hundredthsText(grams: number, unit: 'lb' | 'kg'): string {
  const hundredth = exactGrams({ unit, value: 1 }) / 100
  return (Math.floor((grams + CONVERSION_NOISE_GRAMS) / hundredth) / 100).toFixed(2)
}

/** A reading as it was entered, with no fewer decimals than its scale shows. */
export function formatReading(reading: MassReading): string {
  if (reading.unit === 'lb-oz') {
    return [plainDecimal(reading.lb), 'lb', plainDecimal(reading.oz), 'oz'].join(NO_BREAK_SPACE)
  }
  const entered = plainDecimal(reading.value)
  const decimals = entered.split('.')[1]?.length ?? 0
  const figure = decimals < DIVISIONS[reading.unit].decimals ? reading.value.toFixed(DIVISIONS[reading.unit].decimals) : entered
  return `${figure.replace('-', MINUS)}${NO_BREAK_SPACE}${reading.unit}`
}

function divisionCount(grams: number, unit: MassUnit, rounding: MassRounding): number {
  const division = DIVISIONS[unit].grams
  const count = {
    down: () => Math.floor((grams + CONVERSION_NOISE_GRAMS) / division),
    up: () => Math.ceil((grams - CONVERSION_NOISE_GRAMS) / division),
    nearest: () => Math.sign(grams) * Math.round(Math.abs(grams) / division),
  }[rounding]()
  return unsignedZero(count)
}

function readingOf(count: number, unit: MassUnit): MassReading {
  const { perUnit } = DIVISIONS[unit]
  if (unit !== 'lb-oz') return { unit, value: count / perUnit }
  return { unit, lb: unsignedZero(Math.trunc(count / perUnit)), oz: unsignedZero(count % perUnit) }
}

function unsignedZero(value: number): number {
  return value === 0 ? 0 : value
}

// String() turns to exponents below 1e-6; a stamp or a query never does.
function plainDecimal(value: number): string {
  const text = String(value)
  return text.includes('e') ? value.toFixed(9).replace(/\.?0+$/, '') : text
}
