import { z } from 'zod'
import type { Day } from '../quantity/day'
import type { ScaleStep } from '../quantity/scale'
import { id, line, type Page } from './parts'

const MOST_OFF = { g: 5_000, oz: 176, lb: 11, kg: 5 } as const satisfies Record<ScaleStep['unit'], number>

const step = z.strictObject({ unit: z.enum(['g', 'oz', 'lb', 'kg']), value: z.number().nonnegative().finite() })
  .refine(({ unit, value }) => value <= MOST_OFF[unit], 'a scale that is off by more weighs no cylinder')

const percent = z.number().min(0).max(10, 'must be at most 10 %')
  .refine(value => Math.abs(value * 100 - Math.round(value * 100)) < 1e-9, 'may have two decimals')

const lastCheckOn = z.iso.date('must be a day, as 2026-12-01').nullable()

/** POST /api/scales. A reading may be off by the larger of the two parts of its accuracy, which cannot be changed later. */
export const scaleBody = z.strictObject({
  id: id.optional(),
  name: line(80),
  accuracy: step,
  accuracyPercent: percent,
  lastCheckOn: lastCheckOn.default(null),
}).refine(({ accuracy, accuracyPercent }) => accuracy.value > 0 || accuracyPercent > 0, { path: ['accuracy'], message: 'no scale is exact: give a weight, a percent, or both' })
export type NewScale = z.output<typeof scaleBody>

/** PATCH /api/scales/{id}: its name, its last check, on or off. Of another accuracy is another scale. */
export const scaleChange = z.strictObject({
  name: line(80).optional(),
  lastCheckOn: lastCheckOn.optional(),
  active: z.boolean().optional(),
}).refine(change => Object.keys(change).length > 0, 'must change something')
export type ScaleChange = z.output<typeof scaleChange>

/** GET /api/scales?active=true|false: the whole list, by name. */
export const scalesQuery = z.strictObject({ active: z.enum(['true', 'false']).optional() })

/** One line of GET /api/scales. */
export interface ScaleLine {
  id: string
  name: string
  /** As it was entered. */
  accuracy: ScaleStep
  accuracyPercent: number
  lastCheckOn: Day | null
  active: boolean
}
/** What GET /api/scales answers. */
export type ScalesAnswer = Page<ScaleLine>
