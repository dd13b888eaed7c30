/** The columns that the fleet's table can show, as they stand until somebody chooses: the code always names its row. */
export const FLEET_COLUMNS = [
  'code', 'verdict', 'refrigerant', 'net', 'rule', 'room', 'stop', 'retest', 'place', 'last', 'serial', 'spec', 'condition', 'lifecycle', 'tare', 'holder', 'owner',
] as const
export type FleetColumn = (typeof FLEET_COLUMNS)[number]

/** Always shown, and first: what names a cylinder and how it stands. */
export const FIXED_COLUMNS = ['code', 'verdict'] as const satisfies readonly FleetColumn[]

/** How close the lines of the fleet stand. */
export const DENSITIES = ['compact', 'comfortable'] as const
export type Density = (typeof DENSITIES)[number]

/** How a person has the table of the fleet. */
export interface FleetLayout { columns: FleetColumn[], density: Density }

/** What everybody has who has not chosen yet. */
export const FIRST_LAYOUT: FleetLayout = {
  columns: ['code', 'verdict', 'refrigerant', 'net', 'rule', 'room', 'stop', 'retest', 'place', 'last'],
  density: 'compact',
}
