import { eq, sql } from 'drizzle-orm'
import { jobs } from '~~/drizzle/schema'
import type { JobChange } from '~~/utils/contract/jobs'
import { statement, type Database } from '../database/database'
import { theJobRow } from './jobRows'
import { listedRefrigerant } from './listedRefrigerant'

/**
 * Mends what was said of a job; its note then is a new issue. Safe to send twice.
 *
 * Errors: 404; 422 for a refrigerant that the catalogue does not have.
 */
export async function changeJob(db: Database, id: string, { refrigerant, ...change }: JobChange): Promise<void> {
  const mended = { ...change, ...(refrigerant !== undefined && { refrigerant: listedRefrigerant(refrigerant) }) }
  await db.exclusive(async (commit) => {
    const row = await theJobRow(db, id)
    const isNew = (Object.keys(mended) as (keyof typeof mended)[]).some(key => JSON.stringify(mended[key] ?? null) !== JSON.stringify(row[key]))
    if (!isNew) return
    // An address for letters is not on the note.
    const isOnNote = Object.keys(mended).some(key => key !== 'email')
    await commit([statement(db.read.update(jobs).set({ ...mended, changes: sql`${jobs.changes} + ${isOnNote ? 1 : 0}` }).where(eq(jobs.id, id)))])
  })
}
