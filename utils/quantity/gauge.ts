import type { MassUnit } from './mass'
import { inHgFromKPa, kPaFromInHg, KPA_PER_PSI, STANDARD_ATMOSPHERE_KPA } from './pressure'
import { celsiusFromFahrenheit, fahrenheitFromCelsius } from './temperature'

/** What a gauge is marked in. The thermometer goes with it: F beside psi, C beside bar and kPa; the barometer in inHg or kPa. */
export const GAUGE_UNITS = ['psi', 'bar', 'kPa'] as const
export type GaugeUnit = (typeof GAUGE_UNITS)[number]

const KPA_PER: Record<GaugeUnit, number> = { psi: KPA_PER_PSI, bar: 100, kPa: 1 }
/** Places of a pressure as gauges of the trade are read. */
const PLACES: Record<GaugeUnit, number> = { psi: 1, bar: 2, kPa: 0 }
const FAHRENHEIT_PER_CELSIUS = 9 / 5
const NO_BREAK_SPACE = '\u00A0'
const MINUS = '\u2212'

/** The gauge that goes with the unit somebody weighs in. */
export function gaugeUnitFor(unit: MassUnit): GaugeUnit {
  return unit === 'kg' ? 'bar' : 'psi'
}

/** The symbol of a gauge's reading, above the air around it. */
export function gaugeSymbol(unit: GaugeUnit): string {
  return unit === 'psi' ? 'psig' : unit
}

/** The symbol of the thermometer that goes with a gauge. */
export function thermometerSymbol(unit: GaugeUnit): '°F' | '°C' {
  return unit === 'psi' ? '°F' : '°C'
}

/** The symbol of the barometer that goes with a gauge. */
export function barometerSymbol(unit: GaugeUnit): 'inHg' | 'kPa' {
  return unit === 'psi' ? 'inHg' : 'kPa'
}

/**
 * Absolute pressure by the standard atmosphere from what a gauge showed.
 *
 * Rounding: to a thousandth of a kPa, far below any gauge, so that the reading comes back as it was entered.
 */
export function kPaFromGauge(reading: number, unit: GaugeUnit): number {
  return toThousandth(reading * KPA_PER[unit] + STANDARD_ATMOSPHERE_KPA)
}

/** What a gauge shows for an absolute pressure by the standard atmosphere. */
export function gaugeFromKPa(kPa: number, unit: GaugeUnit): number {
  return (kPa - STANDARD_ATMOSPHERE_KPA) / KPA_PER[unit]
}

/** A difference of pressures in kPa from one in a gauge's unit. Rounding: to a thousandth of a kPa. */
export function kPaFromDifference(difference: number, unit: GaugeUnit): number {
  return toThousandth(difference * KPA_PER[unit])
}

/** A difference of pressures in a gauge's unit from one in kPa. */
export function differenceFromKPa(kPa: number, unit: GaugeUnit): number {
  return kPa / KPA_PER[unit]
}

/** Degrees Celsius from what the thermometer beside a gauge showed. Rounding: to a thousandth of a degree. */
export function celsiusFromThermometer(reading: number, unit: GaugeUnit): number {
  return toThousandth(unit === 'psi' ? celsiusFromFahrenheit(reading) : reading)
}

/** What the thermometer beside a gauge shows at a temperature. */
export function thermometerFromCelsius(tC: number, unit: GaugeUnit): number {
  return unit === 'psi' ? fahrenheitFromCelsius(tC) : tC
}

/** A difference of temperatures in C from one on the thermometer beside a gauge. Rounding: to a thousandth of a degree. */
export function celsiusFromDegrees(degrees: number, unit: GaugeUnit): number {
  return toThousandth(unit === 'psi' ? degrees / FAHRENHEIT_PER_CELSIUS : degrees)
}

/** A difference of temperatures on the thermometer beside a gauge from one in C. */
export function degreesFromCelsius(differenceC: number, unit: GaugeUnit): number {
  return unit === 'psi' ? differenceC * FAHRENHEIT_PER_CELSIUS : differenceC
}

/** The air's pressure in kPa from the barometer beside a gauge. Rounding: to a thousandth of a kPa. */
export function kPaFromBarometer(reading: number, unit: GaugeUnit): number {
  return toThousandth(unit === 'psi' ? kPaFromInHg(reading) : reading)
}

/** What the barometer beside a gauge shows for the air's pressure. */
export function barometerFromKPa(kPa: number, unit: GaugeUnit): number {
  return unit === 'psi' ? inHgFromKPa(kPa) : kPa
}

/**
 * A gauge's reading in words. Rounding: to the nearest 0.1 psi, 0.01 bar or 1 kPa.
 *
 * @example formatGauge(1731.938, 'psi') // '236.5 psig', with a no-break space
 */
export function formatGauge(kPa: number, unit: GaugeUnit): string {
  return `${fixed(gaugeFromKPa(kPa, unit), PLACES[unit])}${NO_BREAK_SPACE}${gaugeSymbol(unit)}`
}

/** A difference of pressures in words. Rounding: as {@link formatGauge}. */
export function formatDifference(kPa: number, unit: GaugeUnit): string {
  return `${fixed(differenceFromKPa(kPa, unit), PLACES[unit])}${NO_BREAK_SPACE}${unit}`
}

/** A temperature in words, as the thermometer beside a gauge shows it. Rounding: to the nearest 0.1. */
export function formatThermometer(tC: number, unit: GaugeUnit): string {
  return `${fixed(thermometerFromCelsius(tC, unit), 1)}${NO_BREAK_SPACE}${thermometerSymbol(unit)}`
}

/** The air's pressure in words, on both barometers. Rounding: to the nearest 0.1. */
export function formatBarometer(kPa: number): string {
  return `${fixed(inHgFromKPa(kPa), 1)}${NO_BREAK_SPACE}inHg (${fixed(kPa, 1)}${NO_BREAK_SPACE}kPa)`
}

/** A reading as a field shows it again: at most two places, none that says nothing, so that 80 °F comes back as 80. */
export function plainFigure(value: number): string {
  const rounded = Math.round(value * 100) / 100
  return String(rounded === 0 ? 0 : rounded)
}

function fixed(value: number, places: number): string {
  const text = Math.abs(value).toFixed(places)
  return value < 0 && /[1-9]/.test(text) ? `${MINUS}${text}` : text
}

function toThousandth(value: number): number {
  const rounded = Math.round(value * 1000) / 1000
  return rounded === 0 ? 0 : rounded
}
