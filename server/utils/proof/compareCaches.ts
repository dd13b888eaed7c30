import { setImmediate as nextTurn } from 'node:timers/promises'
import type { InValue, Row } from '@libsql/client'
import type { AnyRecordedEvent } from '../../../utils/custody/event'
import { fold, type FoldResult } from '../../../utils/custody/fold'
import type { SaidByOthers } from '../../../utils/custody/saidByOthers'
import { cylinderColumns } from '../custody/caches'
import { foldContext, rowContext } from '../custody/foldContext'
import { LOG_COLUMNS, logRow, recordedEvent } from '../custody/logRow'
import { saidByOthers } from '../custody/saidByOthers'
import type { Database } from '../database/database'
import { rulesInForceKey } from '../directory/datedRules'
import { directory, type Directory } from '../directory/directory'
import { damageList, type DamageList } from './damageList'
import type { VerifySteps } from './verifyLog'

const CYLINDERS_AT_ONCE = 50

const MOVEMENT_COLUMNS = ['event_id', 'ordinal', 'cause', 'refrigerant', 'owner_id', 'grams', 'at', 'apart'] as const
const STOCK_COLUMNS = ['event_id', 'ordinal', 'refrigerant', 'owner_id', 'grams', 'not_known', 'weighed_variance', 'found_variance', 'weighed_together', 'found_together', 'at', 'apart'] as const
const CLAIM_COLUMNS = ['event_id', 'code', 'effective_at', 'device_id', 'device_seq'] as const

/** What one cylinder has in the log and in everything that is made from it, read at one instant. */
interface Cylinder { id: string, events: AnyRecordedEvent[] | null, row: Row | null, movements: Row[], stock: Row[], claims: Row[], halves: Row[] }

/**
 * Folds each cylinder again and compares: its row in the fleet, its movements, what it changed in stock, its labels.
 *
 * It says nothing of the log itself. A row that rests on rules which were in force before is passed over: it is being
 * made anew by itself.
 */
export async function* comparingCaches(db: Database, now: number): VerifySteps {
  const damage = damageList()
  const from = await directory(db, true)
  const { rows: [counted] } = await db.readClient.execute('SELECT count(*) FROM custody_events')
  let checked = 0
  let cylinders = 0
  for (let after: string | null = ''; after !== null;) {
    const page: Cylinder[] = await cylindersAfter(db, after)
    const said = await saidByOthers(db, page.map(({ id }) => id))
    for (const cylinder of page) {
      compare(cylinder, from, now, said(cylinder.id), damage)
      checked += cylinder.events?.length ?? 0
      cylinders++
    }
    after = page.length < CYLINDERS_AT_ONCE ? null : page.at(-1)!.id
    yield { done: checked, of: counted![0] as number }
    await nextTurn()
  }
  const told = damage.told()
  return {
    ok: told.length === 0, scope: 'caches', checked, cylinders, ...(told[0] ? { firstBad: told[0] } : {}), damage: told, found: damage.count(),
    checkpoints: 0, since: null, upTo: null, verifiedAt: new Date(now).toISOString(),
  }
}

function compare({ id, events, row, movements, stock, claims, halves }: Cylinder, from: Directory, now: number, said: SaidByOthers, damage: DamageList): void {
  if (events === null) return damage.add('unreadable', { cylinderId: id })
  if (events.length === 0) return damage.add('row-differs', { cylinderId: id })
  const folded = fold(events, foldContext(from))
  const isBehind = row !== null && row.ruled_by !== rulesInForceKey(from, now)
  if (!isBehind && !isSameRow(row, cylinderColumns(id, folded.state, rowContext(from, now, said)))) damage.add('row-differs', { cylinderId: id })
  if (halves.map(one => one.half).join('\n') !== folded.state.halves.map(one => JSON.stringify(one)).join('\n')) damage.add('row-differs', { cylinderId: id })
  if (!isSameTable(movements, MOVEMENT_COLUMNS, folded.movements) || !isSameTable(stock, STOCK_COLUMNS, folded.stockChanges)) {
    damage.add('movements-differ', { cylinderId: id })
  }
  if (!isSameTable(claims, CLAIM_COLUMNS, folded.labelClaims)) damage.add('labels-differ', { cylinderId: id })
}

function isSameRow(row: Row | null, columns: Record<string, InValue>): boolean {
  return row !== null && Object.entries(columns).every(([name, value]) => row[name] === value)
}

function isSameTable(rows: readonly Row[], columns: readonly string[], made: FoldResult['movements' | 'stockChanges' | 'labelClaims']): boolean {
  const stored = rows.map(row => JSON.stringify(columns.map(column => row[column])))
  const expected = made.map(one => JSON.stringify(columns.map((column) => {
    const value = (one as unknown as Record<string, unknown>)[column.replaceAll(/_(\w)/g, (_, letter: string) => letter.toUpperCase())]
    return typeof value === 'boolean' ? Number(value) : value
  })))
  return stored.length === expected.length && stored.sort().join('\n') === expected.sort().join('\n')
}

/** The next cylinders that are in the log or in the fleet, in the order of their ids. */
async function cylindersAfter(db: Database, after: string): Promise<Cylinder[]> {
  const { rows: ids } = await db.readClient.execute({
    sql: `SELECT cylinder_id FROM custody_events WHERE cylinder_id > ?1 GROUP BY cylinder_id
      UNION SELECT id FROM cylinders WHERE id > ?1 ORDER BY 1 LIMIT ${CYLINDERS_AT_ONCE}`,
    args: [after],
  })
  if (ids.length === 0) return []
  const range = [ids[0]![0] as string, ids.at(-1)![0] as string]
  // One transaction: what is recorded meanwhile is in all of these, or in none.
  const [log, fleet, movements, stock, claims, halves] = await db.readClient.batch([
    { sql: `SELECT ${LOG_COLUMNS.join(', ')} FROM custody_events WHERE cylinder_id BETWEEN ? AND ? ORDER BY cylinder_id, version`, args: range },
    { sql: 'SELECT * FROM cylinders WHERE id BETWEEN ? AND ?', args: range },
    { sql: `SELECT cylinder_id, ${MOVEMENT_COLUMNS.join(', ')} FROM movements WHERE cylinder_id BETWEEN ? AND ?`, args: range },
    { sql: `SELECT cylinder_id, ${STOCK_COLUMNS.join(', ')} FROM stock_changes WHERE cylinder_id BETWEEN ? AND ?`, args: range },
    { sql: `SELECT cylinder_id, ${CLAIM_COLUMNS.join(', ')} FROM label_claims WHERE cylinder_id BETWEEN ? AND ?`, args: range },
    { sql: 'SELECT cylinder_id, half FROM halves WHERE cylinder_id BETWEEN ? AND ? ORDER BY cylinder_id, position', args: range },
  ], 'read')
  const rowOf = new Map(fleet!.rows.map(row => [row.id as string, row]))
  const [lines, moved, held, claimed, halved] = [log!, movements!, stock!, claims!, halves!].map(({ rows }) => byCylinder(rows))
  return ids.map(row => row[0] as string).map(id => ({
    id, events: eventsOf(lines!.get(id) ?? []), row: rowOf.get(id) ?? null,
    movements: moved!.get(id) ?? [], stock: held!.get(id) ?? [], claims: claimed!.get(id) ?? [], halves: halved!.get(id) ?? [],
  }))
}

function byCylinder(rows: readonly Row[]): Map<string, Row[]> {
  const groups = new Map<string, Row[]>()
  for (const row of rows) {
    const id = row.cylinder_id as string
    const group = groups.get(id)
    if (group) group.push(row)
    else groups.set(id, [row])
  }
  return groups
}

/** The events of a cylinder; null where one cannot be read. */
function eventsOf(rows: readonly Row[]): AnyRecordedEvent[] | null {
  try {
    return rows.map(row => recordedEvent(logRow(row)))
  }
  catch {
    return null
  }
}
