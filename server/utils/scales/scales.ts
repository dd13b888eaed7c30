import { and, asc, eq, sql } from 'drizzle-orm'
import { scales } from '../../../drizzle/schema'
import type { ScaleLine } from '../../../utils/contract/scales'
import type { Database } from '../database/database'

/** The firm's scales by name. */
export async function listScales(db: Database, only: { active?: boolean, id?: string } = {}): Promise<ScaleLine[]> {
  const rows = await db.read.select().from(scales)
    .where(and(only.active === undefined ? undefined : eq(scales.active, only.active), only.id === undefined ? undefined : eq(scales.id, only.id)))
    .orderBy(asc(sql`lower(${scales.name})`), asc(scales.id))
  return rows.map(({ id, name, accuracyEntered, accuracyGrams, accuracyBasisPoints, lastCheckOn, active }) => ({
    id, name, accuracy: accuracyEntered ?? { unit: 'g', value: accuracyGrams }, accuracyPercent: accuracyBasisPoints / 100, lastCheckOn, active,
  }))
}

/** One scale; null where there is none of this id. */
export async function scaleById(db: Database, id: string): Promise<ScaleLine | null> {
  return (await listScales(db, { id }))[0] ?? null
}
