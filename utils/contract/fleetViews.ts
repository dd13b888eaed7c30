import { z } from 'zod'
import { DENSITIES, FIXED_COLUMNS, FLEET_COLUMNS } from './fleetLayout'
import { line } from './parts'

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

/** Filters and an order that a person keeps under a name. */
export interface FleetView { id: string, name: string, query: Record<string, string> }
/** What GET /api/fleet/views answers. */
export interface FleetViewsAnswer { items: FleetView[] }
