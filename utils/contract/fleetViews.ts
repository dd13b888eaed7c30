import { z } from 'zod'
import { line } from './parts'

/** The columns that the fleet's table can show, as they stand until somebody chooses: the code always names its row. */
export const FLEET_COLUMNS = [
  'code', 'verdict', 'refrigerant', 'net', 'rule', 'room', 'stop', 'retest', 'place', 'last', 'serial', 'spec', 'condition', 'lifecycle', 'tare', 'holder',
] as const
export type FleetColumn = (typeof FLEET_COLUMNS)[number]

/** Always shown, and first: what names a cylinder and how it stands. */
export const FIXED_COLUMNS = ['code', 'verdict'] as const satisfies readonly FleetColumn[]

export const DENSITIES = ['compact', 'comfortable'] as const
export type Density = (typeof DENSITIES)[number]

/** How a person has the table of the fleet. */
export interface FleetLayout { columns: FleetColumn[], density: Density }

/** What everybody has who has not chosen yet. */
export const FIRST_LAYOUT: FleetLayout = {
  columns: ['code', 'verdict', 'refrigerant', 'net', 'rule', 'room', 'stop', 'retest', 'place', 'last'],
  density: 'compact',
}

/** Columns by name, in order; the fixed ones stand first. */
export const fleetColumns = z.array(z.enum(FLEET_COLUMNS)).min(FIXED_COLUMNS.length).max(FLEET_COLUMNS.length)
  .refine(columns => new Set(columns).size === columns.length, 'must name each column once')
  .refine(columns => FIXED_COLUMNS.every((fixed, index) => columns[index] === fixed), 'must begin with code and verdict')

/** PUT /api/fleet/layout. */
export const fleetLayoutBody = z.strictObject({ columns: fleetColumns, density: z.enum(DENSITIES) })

/** The most views that a person keeps. */
export const MOST_VIEWS = 50

/** POST /api/fleet/views: a name for filters and an order, as they stand in the fleet's address. */
export const fleetViewBody = z.strictObject({
  name: line(60),
  query: z.record(z.string().max(20), z.string().max(80)),
})

/** PATCH /api/fleet/views/{id}. */
export const fleetViewChange = z.strictObject({ name: line(60) })

export interface FleetView { id: string, name: string, query: Record<string, string> }
export interface FleetViewsAnswer { items: FleetView[] }
