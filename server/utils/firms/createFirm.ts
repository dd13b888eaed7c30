import { v7 as uuid } from 'uuid'
import { firms } from '~~/drizzle/schema'
import type { Firm, NewFirm } from '~~/utils/contract/places'
import { statement, type Database } from '../database/database'
import { directory } from '../directory/directory'
import { refuseTakenName } from '../directory/takenName'
import { problem } from '../http/problem'
import { firmById } from './firms'

/**
 * A new firm and, in the same commit, the place where its cylinders stand.
 *
 * Errors: 422 for a RIN on a firm that is no requalifier; 409 for a name that is taken, and where another firm has this
 * id. The same firm sent again is answered as it stands.
 */
export async function createFirm(db: Database, body: NewFirm, now: number): Promise<Firm> {
  const row = {
    id: body.id ?? uuid(),
    name: body.name,
    kind: body.kind,
    telephone: body.telephone ?? null,
    email: body.email ?? null,
    address: body.address ?? null,
    rin: body.rin ?? null,
  }
  refuseStrayRin(row.kind, row.rin)
  // The name that is free now must still be free when it is written.
  await db.exclusive(async (commit) => {
    const known = (await directory(db, true)).firms
    if (known.has(row.id)) return
    refuseTakenName(known.values(), row)
    await commit([
      statement(db.read.insert(firms).values({ ...row, createdAt: now }).onConflictDoNothing()),
      {
        sql: `INSERT INTO places (id, name, kind, firm_id, active, created_at)
          SELECT ?, name, 'firm', id, 1, created_at FROM firms WHERE id = ?
            AND NOT EXISTS (SELECT 1 FROM places WHERE firm_id = ?)`,
        args: [uuid(), row.id, row.id],
      },
    ])
  })
  await directory(db, true)
  const firm = await firmById(db, row.id)
  const isTheSame = firm !== null && (Object.keys(row) as (keyof typeof row)[]).every(key => firm[key] === row[key])
  if (!isTheSame) throw problem(409, 'Another firm has this id', 'Send it again under a new id.')
  return firm
}

/** Errors: 422 where a firm that is no requalifier would have a RIN. */
export function refuseStrayRin(kind: Firm['kind'], rin: string | null): void {
  if (rin === null || kind === 'requalifier') return
  throw problem(422, 'This firm cannot be', 'Mend what is named.', [{ path: 'rin', message: 'only a requalifier has a RIN' }])
}
