import { z } from 'zod'
import { isPressurePossible, PRESSURE_READING_RANGES, type PressureReadingField } from '../../refrigerant/pressureReading'
import { MOST_PERCENT_TOGETHER } from '../analysis'
import { condition, line, refrigerant } from './parts'

function reading(field: PressureReadingField) {
  const { least, most, unit } = PRESSURE_READING_RANGES[field]
  return z.number('must be a number').min(least, `must be at least ${least} ${unit}`).max(most, `must be at most ${most} ${unit}`)
}

/** A gauge and a thermometer on a cylinder at rest. `pressureKPa` is what the gauge showed and 101.325, whatever the barometer. */
const pressure = z.strictObject({
  method: z.literal('pressure'),
  pressureKPa: reading('pressureKPa'),
  temperatureC: reading('temperatureC'),
  barometerKPa: reading('barometerKPa').optional(),
  gaugeErrorKPa: reading('gaugeErrorKPa').optional(),
  thermometerErrorC: reading('thermometerErrorC').optional(),
})

const MOST_COMPONENTS = 20

const composition = z.array(z.strictObject({
  /** A refrigerant, or what else was found, such as air. */
  component: line(40),
  massPercent: z.number('must be a number').nonnegative('must not be negative').max(100, 'must be at most 100 %'),
}))
  .min(1, 'must name a component').max(MOST_COMPONENTS, `must be at most ${MOST_COMPONENTS} components`)
  .refine(parts => new Set(parts.map(part => part.component.toUpperCase())).size === parts.length, 'must name each component once')
  .refine(parts => parts.reduce((sum, part) => sum + part.massPercent, 0) <= MOST_PERCENT_TOGETHER, 'must not come to more than 100 %')

/** An analysis by an instrument in the hand, or by a laboratory of a sample. */
const analysis = z.strictObject({
  method: z.enum(['identifier', 'laboratory']),
  composition: composition.optional(),
  verdict: z.strictObject({ refrigerant: refrigerant.nullable(), condition }).refine(
    verdict => verdict.refrigerant !== null || verdict.condition !== 'clean', 'cannot call clean what nobody can name',
  ),
})

/** What is in a cylinder is checked. Only an analysis says what it is; a pressure only agrees with what the log has, or does not. */
export const details = z.discriminatedUnion('method', [
  pressure.refine(isPressurePossible, { path: ['pressureKPa'], message: 'is a deeper vacuum than this barometer allows' }),
  analysis,
], 'must have a method: pressure, identifier or laboratory')
