import { and, eq } from 'drizzle-orm'
import { tableLayouts } from '~~/drizzle/schema'
import { FIRST_LAYOUT, type FleetLayout } from '~~/utils/contract/fleetLayout'
import { fleetLayoutBody } from '~~/utils/contract/fleetViews'
import { statement, type Database } from '../database/database'

/** How a person has the table of the fleet; as it is at first where they chose nothing that still can be. */
export async function fleetLayoutOf(db: Database, personId: string): Promise<FleetLayout> {
  const [row] = await db.read.select({ columns: tableLayouts.columns, density: tableLayouts.density }).from(tableLayouts)
    .where(and(eq(tableLayouts.personId, personId), eq(tableLayouts.tableName, 'fleet')))
  return fleetLayoutBody.safeParse(row).data ?? FIRST_LAYOUT
}

/** Keeps how a person has the table of the fleet. */
export async function keepFleetLayout(db: Database, personId: string, layout: FleetLayout): Promise<FleetLayout> {
  await db.write([statement(db.read.insert(tableLayouts).values({ personId, tableName: 'fleet', ...layout })
    .onConflictDoUpdate({ target: [tableLayouts.personId, tableLayouts.tableName], set: layout }))])
  return layout
}
