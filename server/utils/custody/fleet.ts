import type { InStatement, InValue, Row } from '@libsql/client'
import type { CylinderRow, FleetAnswer, FleetQuery } from '../../../utils/contract/custody'
import type { Database } from '../database/database'
import { directory } from '../directory/directory'
import { dateBounds, type DateBounds } from './dateBounds'
import { fleetCursorText, readFleetCursor, type FleetCursor } from './fleetCursor'
import { fleetFilter, type FleetFilter } from './fleetFilter'
import { readingOrder, stretchesOf, type ReadStretch } from './fleetOrder'
import { fleetTotal } from './fleetTotal'
import { listedRows, rowColumns, type ListedRow } from './listedRows'

/**
 * A page of the fleet, filtered and sorted by the cache of the fold and today's date.
 *
 * A page goes on from the cylinder on which the one before ended, not from a count: whatever changes in between, what
 * stays as it is comes once.
 *
 * Errors: 400 for a cursor that is none of ours.
 */
export async function fleet(db: Database, query: FleetQuery, nowMs: number): Promise<FleetAnswer> {
  const from = await directory(db)
  const bounds = dateBounds(from, nowMs)
  const cursor = readFleetCursor(query.cursor, query, stretchesOf(query.sort, bounds).length)
  const page = await db.readClient.execute(fleetPage(query, cursor, bounds, rowColumns(from, nowMs)))
  const read = page.rows.slice(0, query.limit)
  const hasMore = page.rows.length > query.limit
  const shown = cursor?.isBackward ? read.reverse() : read
  const after = cursor?.isBackward ? true : hasMore
  const before = cursor?.isBackward ? hasMore : cursor !== null
  const at = (row: Row | undefined, isBackward: boolean) => row === undefined
    ? null
    : fleetCursorText({ isBackward, stretch: row['stretch'] as number, value: row['sort_value'] as FleetCursor['value'], id: row['id'] as string }, query)
  return {
    items: (await listedRows(db, shown, from, nowMs)).map(({ row }) => row),
    nextCursor: after ? at(shown.at(-1), false) : null,
    prevCursor: before ? at(shown[0], true) : null,
    total: await fleetTotal(db, fleetFilter(query, bounds)),
  }
}

/** The statement that reads a page and one row more: the stretches one after another, as far as the page needs them. */
export function fleetPage(query: FleetQuery, cursor: FleetCursor | null, bounds: DateBounds, columns: FleetFilter): InStatement {
  const filter = fleetFilter(query, bounds)
  const order = readingOrder(query.sort, query.order, cursor?.isBackward ?? false, bounds)
  const left = cursor === null ? order : order.slice(order.findIndex(stretch => stretch.index === cursor.stretch))
  const parts = left.map((stretch, place) => stretchRows(stretch, filter, place === 0 ? cursor : null, query.limit + 1))
  return {
    sql: `SELECT ${columns.sql}, k.stretch, k.sort_value FROM (${parts.map(part => part.sql).join(' UNION ALL ')} LIMIT ?) k CROSS JOIN cylinders c ON c.id = k.id`,
    args: [...columns.args, ...parts.flatMap(part => part.args), query.limit + 1],
  }
}

function stretchRows({ where, by, index, isDown }: ReadStretch, filter: FleetFilter, after: FleetCursor | null, limit: number): FleetFilter {
  const way = isDown ? 'DESC' : 'ASC'
  const compare = isDown ? '<' : '>'
  const seek = after === null ? '' : by === null ? ` AND c.id ${compare} ?` : ` AND (${by}, c.id) ${compare} (?, ?)`
  const from: InValue[] = after === null ? [] : by === null ? [after.id] : [after.value, after.id]
  return {
    sql: `SELECT * FROM (SELECT c.id AS id, ${index} AS stretch, ${by ?? 'NULL'} AS sort_value FROM cylinders c
      WHERE (${where.sql}) AND ${filter.sql}${seek} ORDER BY ${by === null ? '' : `${by} ${way}, `}c.id ${way} LIMIT ?)`,
    args: [...where.args, ...filter.args, ...from, limit],
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

/** Rows of the fleet that a filter lets through, at most `limit` where there is one, in the order of their ids. */
export async function cylinderRowsWhere(db: Database, filter: FleetFilter, limit: number | null, nowMs: number): Promise<CylinderRow[]> {
  const from = await directory(db)
  const columns = rowColumns(from, nowMs)
  const result = await db.readClient.execute({
    sql: `SELECT ${columns.sql} FROM cylinders c WHERE ${filter.sql} ORDER BY c.id LIMIT ?`,
    // For the database a limit below nothing is none.
    args: [...columns.args, ...filter.args, limit ?? -1],
  })
  return (await listedRows(db, result.rows, from, nowMs)).map(({ row }) => row)
}
