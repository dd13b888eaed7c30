import type { Database } from '../database/database'

/**
 * The number of the newest line of the custody log and how many lines there are; the two differ where one is missing.
 *
 * Errors: RangeError for a number that no line of ours can hold, which only tampering can cause.
 */
export async function logLength(db: Database): Promise<{ seq: number, events: number }> {
  const { rows: [counted] } = await db.readClient.execute('SELECT coalesce(max(seq), 0), count(*) FROM custody_events')
  return { seq: counted![0] as number, events: counted![1] as number }
}
