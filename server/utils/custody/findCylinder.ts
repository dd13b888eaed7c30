import type { Row } from '@libsql/client'
import { normaliseLabelCode } from '../../../utils/label/code'
import type { Database } from '../database/database'

const UUID = /^[0-9a-f]{8}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{12}$/

/** Which claim of a code counts: the earliest in effect. */
export const CLAIM_ORDER = 'effective_at, device_id, device_seq, event_id'

/**
 * The cylinder that a reference names: its id, else its label code in any case and grouping, a replaced one included,
 * else its stamped serial where only one cylinder has it. null where nothing or more than one answers.
 */
export async function findCylinder(db: Database, ref: string): Promise<string | null> {
  const id = ref.toLowerCase()
  if (UUID.test(id)) {
    const result = await db.readClient.execute({ sql: 'SELECT id FROM cylinders WHERE id = ?', args: [id] })
    return (result.rows[0]?.[0] as string | undefined) ?? null
  }
  const code = normaliseLabelCode(ref)
  if (code) {
    const result = await db.readClient.execute({ sql: `SELECT cylinder_id FROM label_claims WHERE code = ? ORDER BY ${CLAIM_ORDER} LIMIT 1`, args: [code] })
    if (result.rows[0]) return result.rows[0][0] as string
  }
  const bySerial = await db.readClient.execute({ sql: 'SELECT id FROM cylinders WHERE serial = ? LIMIT 2', args: [ref] })
  return bySerial.rows.length === 1 ? bySerial.rows[0]![0] as string : null
}

/** The cylinder that the code of a claim `mine` belongs to. */
const ITS_OWNER = `(SELECT first.cylinder_id FROM label_claims first WHERE first.code = mine.code ORDER BY ${CLAIM_ORDER} LIMIT 1)`

/**
 * Codes of cylinders that are on another cylinder too; a list of the cylinders' ids follows.
 *
 * A code belongs to the cylinder that had it first. Once a new label has taken its place on the other, it is on one again.
 */
export const SHARED_CODES = `SELECT DISTINCT mine.cylinder_id, mine.code FROM label_claims mine
  JOIN label_claims other ON other.code = mine.code AND other.cylinder_id <> mine.cylinder_id
  WHERE NOT EXISTS (SELECT 1 FROM cylinders c, json_each(c.state, '$.labels') label
    WHERE c.id = iif(mine.cylinder_id = ${ITS_OWNER}, other.cylinder_id, mine.cylinder_id)
      AND label.value ->> 'code' = mine.code AND label.value ->> 'replacedAt' IS NOT NULL)
  AND mine.cylinder_id IN`

/** The answer of {@link SHARED_CODES}, by cylinder. */
export function sharedCodes(rows: readonly Row[]): Map<string, Set<string>> {
  const answer = new Map<string, Set<string>>()
  for (const row of rows) {
    const id = row[0] as string
    answer.set(id, (answer.get(id) ?? new Set()).add(row[1] as string))
  }
  return answer
}
