import { randomBytes } from 'node:crypto'
import { drawLabelCode } from '~~/utils/label/code'
import type { Database } from '../database/database'

/** Among 2^40 codes two draws hardly ever meet; this many rounds mean that the random source is broken. */
const MOST_ROUNDS = 20

/**
 * New label codes that no label carries yet. Each call makes others.
 *
 * Errors: throws where the random source gives codes that are taken over and over.
 */
export async function mintLabels(db: Database, count: number, mintedBy: string, now: number, random = randomBytes): Promise<string[]> {
  const codes: string[] = []
  for (let round = 0; codes.length < count; round++) {
    if (round === MOST_ROUNDS) throw new Error('The random source gives only label codes that are taken')
    const drawn = Array.from({ length: count - codes.length }, () => drawLabelCode(random))
    const answers = await db.write(drawn.map(code => ({
      // A code may be on a cylinder without having been minted here.
      sql: `INSERT INTO labels (code, minted_at, minted_by) SELECT ?, ?, ?
        WHERE NOT EXISTS (SELECT 1 FROM label_claims WHERE code = ?) ON CONFLICT DO NOTHING RETURNING code`,
      args: [code, now, mintedBy, code],
    })))
    codes.push(...answers.flatMap(answer => answer.rows.map(row => row[0] as string)))
  }
  return codes
}
