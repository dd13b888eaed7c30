import type { Access } from '../../../utils/access/roles'
import type { CylinderView } from '../../../utils/custody/cylinderView'
import type { CylinderState } from '../../../utils/custody/state'
import { view } from '../../../utils/custody/view'
import type { Database } from '../database/database'
import { directory } from '../directory/directory'
import { viewContext } from './foldContext'
import { saidByOthers } from './saidByOthers'

/** Who asks, when, and of which refrigerant where nothing is in the cylinder. */
export interface Asking { access: Access | null, nowMs: number, askedRefrigerant?: string | null }

/** What is to be said of cylinders today, in the order asked; ids without a cylinder are left out. */
export async function cylinderViews(db: Database, ids: readonly string[], asking: Asking): Promise<CylinderView[]> {
  if (ids.length === 0) return []
  const [from, said, states] = await Promise.all([directory(db), saidByOthers(db, ids), cylinderStates(db, ids)])
  return ids.flatMap((id) => {
    const state = states.get(id)
    if (!state) return []
    return [view(state, viewContext(from, { ...asking, saidByOthers: said(id) }))]
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
