import { KPA_PER_PSI, STANDARD_ATMOSPHERE_KPA } from '../quantity/pressure'

/** What a gauge and a thermometer at a cylinder showed, and how far each may be off. */
export interface PressureReading {
  /** Absolute by the standard atmosphere: what the gauge showed and 101.325 kPa, whatever the barometer. */
  pressureKPa: number
  temperatureC: number
  gaugeErrorKPa: number
  thermometerErrorC: number
  /** The air's own pressure at the cylinder, not reduced to sea level. */
  barometerKPa: number
}

export type PressureReadingField = keyof PressureReading

/** How far a gauge may be off that nobody has said more of: 1 psi (US Army TM 5-3810-307-24-1-2 asks for a gauge to 1 psi). */
const DEFAULT_GAUGE_ERROR_KPA = KPA_PER_PSI

/** How far a thermometer may be off that nobody has said more of: 2 F (from memory). */
const DEFAULT_THERMOMETER_ERROR_C = 2 * 5 / 9

/**
 * Between what a reading lies that can be a reading; beyond it a finger slipped or a unit was taken for another.
 *
 * Source: the barometer's from the highest towns (near 5,000 m, 54 kPa by ISO 2533) to a high over a plain at sea level;
 * the others ours.
 */
export const PRESSURE_READING_RANGES: Record<PressureReadingField, { least: number, most: number, unit: string }> = {
  pressureKPa: { least: 0, most: 20_000, unit: 'kPa' },
  temperatureC: { least: -100, most: 200, unit: 'degrees Celsius' },
  gaugeErrorKPa: { least: 0, most: 1_000, unit: 'kPa' },
  thermometerErrorC: { least: 0, most: 20, unit: 'degrees Celsius' },
  barometerKPa: { least: 50, most: 110, unit: 'kPa' },
}

/** A reading with what nobody said filled in: common instruments, and the standard atmosphere. */
export function fullReading(
  { pressureKPa, temperatureC, gaugeErrorKPa, thermometerErrorC, barometerKPa }: Pick<PressureReading, 'pressureKPa' | 'temperatureC'> & Partial<PressureReading>,
): PressureReading {
  return {
    pressureKPa,
    temperatureC,
    gaugeErrorKPa: gaugeErrorKPa ?? DEFAULT_GAUGE_ERROR_KPA,
    thermometerErrorC: thermometerErrorC ?? DEFAULT_THERMOMETER_ERROR_C,
    barometerKPa: barometerKPa ?? STANDARD_ATMOSPHERE_KPA,
  }
}

/** The absolute pressure in the cylinder, in kPa: what the gauge showed, above the air that it stood in. */
export function absolutePressureKPa({ pressureKPa, barometerKPa }: Pick<PressureReading, 'pressureKPa' | 'barometerKPa'>): number {
  return pressureKPa - STANDARD_ATMOSPHERE_KPA + barometerKPa
}

/** Whether a gauge can show this in the air it stood in: there is no pressure below none. */
export function isPressurePossible(
  { pressureKPa, barometerKPa = STANDARD_ATMOSPHERE_KPA }: { pressureKPa: number, barometerKPa?: number },
): boolean {
  return absolutePressureKPa({ pressureKPa, barometerKPa }) >= 0
}
