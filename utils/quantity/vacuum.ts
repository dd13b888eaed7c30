import { inHgFromKPa, KPA_PER_PSI } from './pressure'

/** A vacuum as a gauge gives it: inches of mercury below the barometer, or what is left above nothing. */
export type VacuumReading = { inHg: number, barometerInHg?: number } | { microns: number } | { mmHgAbsolute: number }

/** Millimeters to the inch, of mercury as of anything else (exact). */
export const MMHG_PER_INHG = 25.4

// A micron of a vacuum gauge is a thousandth of a millimeter of mercury.
const MICRONS_PER_MMHG = 1000

/**
 * What is left of a pressure, in mmHg absolute, by any of the three gauges.
 *
 * A gauge of inHg without its own barometer is taken against the one given; above it the answer is below zero, and the
 * reading cannot be right.
 */
export function absoluteMmHg(reading: VacuumReading, barometerInHg: number): number {
  if ('microns' in reading) return reading.microns / MICRONS_PER_MMHG
  if ('mmHgAbsolute' in reading) return reading.mmHgAbsolute
  return ((reading.barometerInHg ?? barometerInHg) - reading.inHg) * MMHG_PER_INHG
}

/** A pressure in mmHg absolute as inches of mercury below a barometer. */
export function inHgBelow(mmHgAbsolute: number, barometerInHg: number): number {
  return barometerInHg - mmHgAbsolute / MMHG_PER_INHG
}

/** A pressure in mmHg as a vacuum gauge shows it, in microns. */
export function micronsFromMmHg(mmHg: number): number {
  return mmHg * MICRONS_PER_MMHG
}

/** A difference of pressure in psi as mmHg. */
export function mmHgFromPsi(psi: number): number {
  return inHgFromKPa(psi * KPA_PER_PSI) * MMHG_PER_INHG
}
