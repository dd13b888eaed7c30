import type { InStatement } from '@libsql/client'
import type { Database } from '../database/database'
import { directory } from '../directory/directory'
import { refreshedRow } from './caches'
import { cylinderStates } from './cylinderViews'
import { rowContext } from './foldContext'
import type { Guard } from './posting'
import { saidByOthers } from './saidByOthers'

/** The rows of cylinders as they must read by what other cylinders' logs say of them now, each under a condition where one is given. */
export async function refreshedRows(db: Database, cylinderIds: readonly string[], nowMs: number, guard?: Guard): Promise<InStatement[]> {
  const [from, said, states] = await Promise.all([directory(db), saidByOthers(db, cylinderIds), cylinderStates(db, cylinderIds)])
  return [...states].map(([id, state]) => refreshedRow(id, state, rowContext(from, nowMs, said(id)), guard))
}
