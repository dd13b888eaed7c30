import type { InValue } from '@libsql/client'
import type { CylinderRow, FleetAnswer, FleetQuery } from '../../../utils/contract/custody'
import type { Database } from '../database/database'
import { directory } from '../directory/directory'
import { foreignCursor } from '../http/cursor'
import { fleetFilter, type FleetFilter } from './fleetFilter'
import { dateBounds, type DateBounds } from './dateBounds'
import { listedRows, rowColumns, type ListedRow } from './listedRows'

/** What the list sorts by, as SQL; each gives a value that is never null, so that a cursor can stand on it. */
const SORT_SQL: Record<FleetQuery['sort'], (bounds: DateBounds) => { sql: string, args: InValue[] }> = {
  'urgency': urgency,
  'code': () => plain(`coalesce(c.label_code, '~')`),
  'serial': () => plain(`coalesce(c.serial, '~')`),
  'refrigerant': () => plain(`coalesce(c.refrigerant, '~')`),
  'net': () => plain('coalesce(c.net_grams, -1)'),
  'room': () => plain('coalesce(c.room_grams, -1000000000)'),
  'due': () => plain(`coalesce(c.due_month, '9999-99')`),
  'place': () => plain(`coalesce(p.name, '~')`),
  'last-event': () => plain('coalesce(c.last_event_at, 0)'),
}

/** The fleet, filtered and sorted by the cache of the fold and today's date. Errors: 400 for a cursor that is none of ours. */
export async function fleet(db: Database, query: FleetQuery, nowMs: number): Promise<FleetAnswer> {
  const from = await directory(db)
  const bounds = dateBounds(from, nowMs)
  const filter = fleetFilter(query, bounds)
  const sort = SORT_SQL[query.sort](bounds)
  const down = query.order === 'desc'
  const after = cursorOf(query.cursor)
  const seek = after ? `AND (${sort.sql}, c.id) ${down ? '<' : '>'} (?, ?)` : ''
  const columns = rowColumns(from, nowMs)
  const [page, count] = await db.readClient.batch([
    {
      sql: `SELECT ${columns.sql}, ${sort.sql} AS sort_value
        FROM cylinders c LEFT JOIN places p ON p.id = c.place_id
        WHERE ${filter.sql} ${seek}
        ORDER BY sort_value ${down ? 'DESC' : 'ASC'}, c.id ${down ? 'DESC' : 'ASC'} LIMIT ?`,
      args: [...columns.args, ...sort.args, ...filter.args, ...(after ? [...sort.args, after.value, after.id] : []), query.limit + 1],
    },
    { sql: `SELECT count(*) FROM cylinders c LEFT JOIN places p ON p.id = c.place_id WHERE ${filter.sql}`, args: filter.args },
  ], 'read')
  const rows = page?.rows ?? []
  const shown = rows.slice(0, query.limit)
  const last = shown.at(-1)
  return {
    items: (await listedRows(db, shown, from, nowMs)).map(({ row }) => row),
    nextCursor: rows.length > query.limit && last ? cursorText(last['sort_value'] as InValue, last['id'] as string) : null,
    total: count?.rows[0]?.[0] as number,
  }
}

/** Rows of the fleet by id, with the version of each. */
export async function cylinderRows(db: Database, ids: readonly string[], nowMs: number): Promise<Map<string, ListedRow>> {
  if (ids.length === 0) return new Map()
  const from = await directory(db)
  const columns = rowColumns(from, nowMs)
  const result = await db.readClient.execute({
    sql: `SELECT ${columns.sql} FROM cylinders c WHERE c.id IN (${ids.map(() => '?').join(', ')})`,
    args: [...columns.args, ...ids],
  })
  return new Map((await listedRows(db, result.rows, from, nowMs)).map(listed => [listed.row.id, listed]))
}

/** Rows of the fleet that a filter lets through, at most `limit`, in the order of their ids. */
export async function cylinderRowsWhere(db: Database, filter: FleetFilter, limit: number, nowMs: number): Promise<CylinderRow[]> {
  const from = await directory(db)
  const columns = rowColumns(from, nowMs)
  const result = await db.readClient.execute({
    sql: `SELECT ${columns.sql} FROM cylinders c LEFT JOIN places p ON p.id = c.place_id WHERE ${filter.sql} ORDER BY c.id LIMIT ?`,
    args: [...columns.args, ...filter.args, limit],
  })
  return (await listedRows(db, result.rows, from, nowMs)).map(({ row }) => row)
}

function plain(sql: string) {
  return { sql, args: [] }
}

/** 0 a stop, 1 a caution, 2 no number known, 3 nothing to do: by the same dates as a row's worst finding. */
function urgency(bounds: DateBounds) {
  return {
    sql: `(CASE WHEN c.severity = 2 OR (c.retest_state = 'dated' AND c.due_month < ? AND c.nothing_in_it = 1 AND ${IN_USE}) THEN 0
      WHEN c.severity = 1 OR (c.retest_state = 'dated' AND c.due_month <= ? AND ${IN_USE}) OR (c.last_seen_at < ? AND c.lifecycle NOT IN ('missing', 'at-reclaim', 'at-test', 'condemned', 'retired')) THEN 1
      WHEN c.net_grams IS NULL THEN 2 ELSE 3 END)`,
    args: [bounds.thisMonth, bounds.lastSoonMonth, bounds.notSeenBefore] as InValue[],
  }
}

const IN_USE = `c.lifecycle NOT IN ('condemned', 'retired')`

function cursorText(value: InValue, id: string): string {
  return Buffer.from(JSON.stringify([value, id])).toString('base64url')
}

function cursorOf(text: string | undefined): { value: InValue, id: string } | null {
  if (text === undefined) return null
  const parts = parsed(Buffer.from(text, 'base64url').toString('utf8'))
  if (!Array.isArray(parts) || parts.length !== 2) throw foreignCursor()
  const [value, id] = parts as unknown[]
  if (!(typeof value === 'string' || Number.isFinite(value)) || typeof id !== 'string') throw foreignCursor()
  return { value: value as InValue, id }
}

function parsed(json: string): unknown {
  try {
    return JSON.parse(json)
  }
  catch {
    return null
  }
}
