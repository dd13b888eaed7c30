import type { InStatement } from '@libsql/client'
import type { Guard } from './posting'

// Two processes on one database: what one has read of the caches the other may have made anew since. Each line of the
// log has a number by which that is seen; rows that are made anew without a line have this.

/** How often rows of the caches were made anew other than by recording, as the database knows it; null for never. */
export const CACHE_TURN = '(SELECT value FROM meta WHERE key = \'cache-turn\')'

/** Goes into every commit that makes rows of the caches anew without a new line in the log. */
export const NEXT_CACHE_TURN: InStatement = `INSERT INTO meta (key, value) VALUES ('cache-turn', '1')
  ON CONFLICT (key) DO UPDATE SET value = CAST(CAST(value AS INTEGER) + 1 AS TEXT)`

/** The condition that nobody has made rows anew since they were read. */
export function sinceTurn(turn: string | null): Guard {
  return { sql: `${CACHE_TURN} IS ?`, args: [turn] }
}
