import { desc, eq } from 'drizzle-orm'
import { vanMaterials } from '../../../drizzle/schema'
import type { NewVanMaterials, VanMaterials } from '../../../utils/contract/vans'
import { readingGrams } from '../../../utils/quantity/mass'
import { statement, type Database } from '../database/database'
import { namesOf, type Directory } from '../directory/directory'
import { refuseOther } from './refuseOther'

/** What each van was last said to carry beside cylinders, by the van's id. */
export async function materialsByVan(db: Database, from: Directory): Promise<Map<string, VanMaterials>> {
  const rows = await db.read.select().from(vanMaterials).orderBy(desc(vanMaterials.saidAt), desc(vanMaterials.id))
  const latest = new Map<string, VanMaterials>()
  for (const row of rows) if (!latest.has(row.vanId)) latest.set(row.vanId, shown(row, from))
  return latest
}

/** What a van was last said to carry beside cylinders; null where nobody has said. */
export async function materialsOf(db: Database, vanId: string, from: Directory): Promise<VanMaterials | null> {
  const [row] = await db.read.select().from(vanMaterials).where(eq(vanMaterials.vanId, vanId))
    .orderBy(desc(vanMaterials.saidAt), desc(vanMaterials.id)).limit(1)
  return row ? shown(row, from) : null
}

/** Keeps what a van carries beside cylinders; the same said again is kept once. Errors: 409 where something else has the id. */
export async function sayMaterials(db: Database, vanId: string, body: NewVanMaterials, personId: string, now: number): Promise<void> {
  const said = { vanId, gross: body.gross, note: body.note }
  const row = { id: body.id, ...said, saidBy: personId, saidAt: now }
  await db.write([statement(db.read.insert(vanMaterials).values(row).onConflictDoNothing())])
  const [kept] = await db.read.select({ vanId: vanMaterials.vanId, gross: vanMaterials.gross, note: vanMaterials.note })
    .from(vanMaterials).where(eq(vanMaterials.id, body.id))
  refuseOther('What is carried', kept, said)
}

function shown(row: typeof vanMaterials.$inferSelect, from: Directory): VanMaterials {
  return {
    gross: row.gross,
    grams: readingGrams(row.gross),
    note: row.note,
    saidBy: namesOf(from).person(row.saidBy),
    saidAt: new Date(row.saidAt).toISOString(),
  }
}
