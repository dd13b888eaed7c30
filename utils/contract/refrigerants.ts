import { z } from 'zod'
import type { CapacityView } from '../custody/cylinderView'

/** GET /api/refrigerants, one line. */
export interface RefrigerantLine { designation: string, kind: string, safetyClass: string | null, accuracyGroup: string, flammable: boolean, toxic: boolean }

/** GET /api/refrigerants/{designation}/saturation. Densities kg/m3, pressures kPa absolute. */
export interface Saturation {
  liquidDensity: number
  vapourDensity: number
  bubblePressureKPa: number
  dewPressureKPa: number
  source: string
  relativeErrorDensity: number
  relativeErrorPressure: number
}

/** GET /api/fill-limit: capacity for a stamp without a cylinder. Masses as '47.6lb', '41lb13oz', '18.97kg'. */
export const fillLimitQuery = z.strictObject({
  refrigerant: z.string().min(1).max(40),
  waterCapacity: z.string().max(20),
  tareWeight: z.string().max(20),
  spec: z.string().max(20).default('DOT-4BA'),
  servicePressurePsig: z.coerce.number().positive().max(10_000).optional(),
  flammableMarked: z.enum(['true', 'false']).default('false'),
  gross: z.string().max(20).optional(),
  condition: z.enum(['clean', 'suspect', 'burnt', 'mixed', 'unknown']).default('clean'),
  share: z.coerce.number().positive().max(0.8).optional(),
})

export type FillLimitAnswer = CapacityView & { netGrams: number | null }
