import type { Access } from '../../../utils/access/roles'
import type { CylinderView } from '../../../utils/custody/cylinderView'
import type { CylinderState } from '../../../utils/custody/state'
import { view } from '../../../utils/custody/view'
import type { Database } from '../database/database'
import { directory } from '../directory/directory'
import type { Standing } from './caches'
import { viewContext } from './foldContext'
import { saidByOthers } from './saidByOthers'

/** Who asks, when, and of which refrigerant where nothing is in the cylinder. */
export interface Asking { access: Access | null, nowMs: number, askedRefrigerant?: string | null }

/**
 * What is to be said of cylinders today, in the order asked; ids without a cylinder are left out.
 *
 * @param known how some of them stand, which then are not read.
 */
export async function cylinderViews(db: Database, ids: readonly string[], asking: Asking, known: ReadonlyMap<string, Standing> = new Map()): Promise<CylinderView[]> {
  const unknown = ids.filter(id => !known.has(id))
  const [from, said, states] = await Promise.all([directory(db), saidByOthers(db, unknown), cylinderStates(db, unknown)])
  return ids.flatMap((id) => {
    const read = states.get(id)
    const standing = known.get(id) ?? (read && { state: read, said: said(id) })
    return standing ? [view(standing.state, viewContext(from, { ...asking, saidByOthers: standing.said }))] : []
  })
}

/** The view of one cylinder; null where there is none. */
export async function cylinderView(db: Database, id: string, asking: Asking): Promise<CylinderView | null> {
  return (await cylinderViews(db, [id], asking))[0] ?? null
}

/** The cached states of cylinders by id. */
export async function cylinderStates(db: Database, ids: readonly string[]): Promise<Map<string, CylinderState>> {
  if (ids.length === 0) return new Map()
  const result = await db.readClient.execute({
    sql: `SELECT id, state FROM cylinders WHERE id IN (${ids.map(() => '?').join(', ')})`,
    args: [...ids],
  })
  return new Map(result.rows.map(row => [row[0] as string, JSON.parse(row[1] as string) as CylinderState]))
}
