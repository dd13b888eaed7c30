import { z } from 'zod'
import type { CapacityView } from '../custody/cylinderView'
import { parseMassText } from '../quantity/mass'
import type { Saturation } from '../refrigerant/saturation'
import type { Refrigerant } from '../refrigerant/types'
import { splitSpec } from '../requalification/specs'
import type { Page } from './parts'

/** GET /api/refrigerants, one line. */
export interface RefrigerantLine { designation: string, kind: string, safetyClass: string | null, accuracyGroup: string, flammable: boolean, toxic: boolean }

export type RefrigerantsAnswer = Page<RefrigerantLine>

/** GET /api/refrigerants/{designation}: composition, class, sources and how sure they are. Any case. */
export type RefrigerantRecordAnswer = Omit<Refrigerant, 'table'> & { flammable: boolean, toxic: boolean }
export const designationParams = z.strictObject({ designation: z.string().min(1).max(40) })

/** GET /api/refrigerants/{designation}/saturation?temperatureC= ; 422 outside the refrigerant's table. */
export const saturationQuery = z.strictObject({ temperatureC: z.string().regex(/^-?\d{1,3}(\.\d+)?$/, 'must be degrees Celsius').transform(Number) })

/** What GET /api/refrigerants/{designation}/saturation answers. Densities kg/m3, pressures kPa absolute. */
export type SaturationAnswer = Saturation

const massInQuery = z.string().max(20).transform((text, context) => {
  const reading = parseMassText(text)
  if (reading) return reading
  context.addIssue({ code: 'custom', message: 'must be a mass such as 47.6lb, 41lb13oz or 18.97kg' })
  return z.NEVER
})

const specInQuery = z.string().max(20).transform((text, context) => {
  const mark = splitSpec(text)
  if (mark) return mark
  context.addIssue({ code: 'custom', message: 'must be a specification such as DOT-4BA400 or DOT-4BA' })
  return z.NEVER
})

/**
 * GET /api/fill-limit: capacity for a stamp without a cylinder. Masses as '47.6lb', '41lb13oz', '18.97kg'. What is left
 * out of the stamp is not known and named in `missing`.
 */
export const fillLimitQuery = z.strictObject({
  refrigerant: z.string().min(1).max(40),
  waterCapacity: massInQuery.optional(),
  tareWeight: massInQuery.optional(),
  spec: specInQuery,
  servicePressurePsig: z.coerce.number().positive().max(10_000).optional(),
  flammableMarked: z.enum(['true', 'false']).default('false'),
  gross: massInQuery.optional(),
  condition: z.enum(['clean', 'suspect', 'burnt', 'mixed', 'unknown']).default('clean'),
  /** A stricter share than the firm's, to compare with. */
  share: z.coerce.number().positive().max(0.8).optional(),
})
export type FillLimitQuery = z.output<typeof fillLimitQuery>

export type FillLimitAnswer = CapacityView & { netGrams: number | null }
