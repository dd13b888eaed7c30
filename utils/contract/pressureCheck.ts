import { z } from 'zod'
import type { PressureCheck } from '../refrigerant/pressureCheck'
import { isPressurePossible, PRESSURE_READING_RANGES, type PressureReadingField } from '../refrigerant/pressureReading'

/**
 * GET /api/pressure-check: a cylinder's pressure against the band of a refrigerant. 404 for a refrigerant that the
 * catalogue does not have; 422 where it has no figures of a liquid at the temperature.
 *
 * `pressureKPa` is absolute by the standard atmosphere: what the gauge shows and 101.325. `barometerKPa` is the air's
 * own pressure at the cylinder, not reduced to sea level; with one, the gauge's reading (pressureKPa - 101.325) stands
 * on that air, so that the absolute pressure is pressureKPa - 101.325 + barometerKPa.
 */
export const pressureCheckQuery = z.strictObject({
  refrigerant: z.string().min(1).max(40),
  pressureKPa: readingInQuery('pressureKPa')
    .describe('What the gauge shows and 101.325, whatever the barometer: absolute by the standard atmosphere.'),
  temperatureC: readingInQuery('temperatureC'),
  gaugeErrorKPa: readingInQuery('gaugeErrorKPa').optional(),
  thermometerErrorC: readingInQuery('thermometerErrorC').optional(),
  barometerKPa: readingInQuery('barometerKPa').optional()
    .describe('The air at the cylinder, not reduced to sea level; 101.325 unless given. The absolute pressure is pressureKPa - 101.325 + barometerKPa.'),
}).refine(isPressurePossible, { path: ['pressureKPa'], message: 'is a deeper vacuum than this barometer allows' })
export type PressureCheckQuery = z.output<typeof pressureCheckQuery>

/** What GET /api/pressure-check answers. Pressures in kPa absolute, differences in kPa, the slope in kPa to a degree C. */
export type PressureCheckAnswer = PressureCheck & { refrigerant: string }

function readingInQuery(field: PressureReadingField) {
  const { least, most, unit } = PRESSURE_READING_RANGES[field]
  return z.string().regex(/^-?\d{1,6}(\.\d{1,20})?$/, { message: `must be a number of ${unit}`, abort: true }).transform(Number)
    .pipe(z.number().min(least, `must be at least ${least} ${unit}`).max(most, `must be at most ${most} ${unit}`))
}
