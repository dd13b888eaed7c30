import { z } from 'zod'
import type { CapacityView } from '../custody/cylinderView'
import type { Gwp } from '../refrigerant/gwp'
import type { CompositionLine, RefrigerantLine } from '../refrigerant/lines'
import type { PressureClassing } from '../refrigerant/pressureClass'
import type { Saturation } from '../refrigerant/saturation'
import type { Refrigerant, SaturationRow } from '../refrigerant/types'
import type { UnEntry } from '../refrigerant/unEntry'
import { splitSpec } from '../requalification/specs'
import { massInQuery, stampedMassInQuery, type Page } from './parts'

export type { CompositionLine, RefrigerantLine }

export type RefrigerantsAnswer = Page<RefrigerantLine> & { compositions: CompositionLine[] }

interface NamedForTransport { unEntry: UnEntry | null, noUnEntryBecause: string | null }

/** A point of the saturation table; null above the refrigerant's last temperature, where it has no liquid. Units: F, C. */
export interface PropertyPoint { temperatureF: number, temperatureC: number, saturation: Saturation | null }

/** GET /api/refrigerants/{designation} of the catalogue: properties, class, composition, GWPs, transport entry, how sure each is. */
export interface RefrigerantRecordAnswer extends Omit<Refrigerant, 'table' | 'curves'>, NamedForTransport {
  known: 'properties'
  flammable: boolean
  toxic: boolean
  pressureClass: PressureClassing
  gwp: Gwp[]
  /** At the temperatures that the trade and the regulations name. */
  points: PropertyPoint[]
  /** The rows of its table, for a picture. Units: C, kPa absolute. */
  curve: CurveRow[]
}

export type CurveRow = Pick<SaturationRow, 'tC' | 'bubblePressureKPa' | 'dewPressureKPa'>

/** GET /api/refrigerants/{designation} of a blend whose composition alone is known. */
export interface CompositionRecordAnswer extends NamedForTransport {
  known: 'composition'
  designation: string
  composition: Refrigerant['composition']
  compositionSource: string
  gwp: Gwp[]
}

/** The path of a refrigerant: its designation in any case. */
export const designationParams = z.strictObject({ designation: z.string().min(1).max(40) })

/** GET /api/refrigerants/{designation}/saturation?temperatureC= ; 422 outside the refrigerant's table. */
export const saturationQuery = z.strictObject({ temperatureC: z.string().regex(/^-?\d{1,3}(\.\d+)?$/, 'must be degrees Celsius').transform(Number) })

/** What GET /api/refrigerants/{designation}/saturation answers. Densities kg/m3, pressures kPa absolute. */
export type SaturationAnswer = Saturation

const specInQuery = z.string().max(20).transform((text, context) => {
  const mark = splitSpec(text)
  if (mark) return mark
  context.addIssue({ code: 'custom', message: 'must be a specification such as DOT-4BA400 or DOT-4BA' })
  return z.NEVER
})

const componentInQuery = /^([^:,]{1,40}):(\d{1,3}(?:\.\d{1,4})?)$/

const compositionInQuery = z.string().max(400).transform((text, context) => {
  const parts = text.split(',').map(part => componentInQuery.exec(part))
  const components = parts.flatMap(part => part ? [{ component: part[1]!, massPercent: Number(part[2]) }] : [])
  if (components.length === parts.length) return components
  context.addIssue({ code: 'custom', message: 'must be components with their mass percent such as R-32:50,R-125:50' })
  return z.NEVER
})

/**
 * GET /api/fill-limit: capacity for a stamp without a cylinder. Masses as '47.6lb', '41lb13oz', '18.97kg'. What is left
 * out of the stamp is not known and named in `missing`. Either `refrigerant` or, for a blend that has no name in the
 * catalogue, `composition`: 422 with both or neither, and where no density can be reckoned from it.
 */
export const fillLimitQuery = z.strictObject({
  refrigerant: z.string().min(1).max(40).optional(),
  composition: compositionInQuery.optional(),
  waterCapacity: stampedMassInQuery.optional(),
  tareWeight: stampedMassInQuery.optional(),
  spec: specInQuery,
  servicePressurePsig: z.coerce.number('must be a figure in psig').positive('must be above 0').max(10_000, 'must be at most 10,000').optional(),
  flammableMarked: z.enum(['true', 'false']).default('false'),
  gross: massInQuery.optional(),
  condition: z.enum(['clean', 'suspect', 'burnt', 'mixed', 'unknown'], 'must be clean, suspect, burnt, mixed or unknown').default('clean'),
  /** A stricter share than the firm's, to compare with. */
  share: z.coerce.number('must be a share such as 0.75').min(0.01, 'must be at least 0.01').max(0.8, 'must be at most 0.80').optional(),
})
export type FillLimitQuery = z.output<typeof fillLimitQuery>

export type FillLimitAnswer = CapacityView & { netGrams: number | null }
