import type { InStatement, Row } from '@libsql/client'
import type { Half } from '../../../utils/custody/half'
import { NOTHING_SAID, type SaidByOthers } from '../../../utils/custody/saidByOthers'
import type { Database } from '../database/database'
import { SHARED_CODES, sharedCodes } from './findCylinder'

/** What the logs of other cylinders say of these, for each of them. */
export async function saidByOthers(db: Database, cylinderIds: readonly string[]): Promise<(cylinderId: string) => SaidByOthers> {
  if (cylinderIds.length === 0) return () => NOTHING_SAID
  const [codes, halves] = await db.readClient.batch([
    { sql: `${SHARED_CODES} (${marks(cylinderIds)})`, args: [...cylinderIds] },
    halvesOf('other_id', cylinderIds),
  ], 'read')
  const shared = sharedCodes(codes?.rows ?? [])
  const naming = halvesFrom(halves?.rows ?? [])
  return cylinderId => ({
    codesOnTwo: shared.get(cylinderId) ?? NOTHING_SAID.codesOnTwo,
    otherHalves: naming.filter(({ otherId }) => otherId === cylinderId),
  })
}

/** Halves by whose they are, or by whom they name, in order of effect. */
export function halvesOf(column: 'cylinder_id' | 'other_id', cylinderIds: readonly string[]): InStatement {
  return { sql: `SELECT half FROM halves WHERE ${column} IN (${marks(cylinderIds)}) ORDER BY cylinder_id, position`, args: [...cylinderIds] }
}

/** The answer of {@link halvesOf}. */
export function halvesFrom(rows: readonly Row[]): Half[] {
  return rows.map(row => JSON.parse(row[0] as string) as Half)
}

function marks(values: readonly unknown[]): string {
  return values.map(() => '?').join(', ')
}
