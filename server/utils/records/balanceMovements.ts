import type { Row } from '@libsql/client'
import type { BalanceMovement, BalanceMovementsAnswer, BalanceMovementsQuery } from '../../../utils/contract/massBalance'
import type { EventKind } from '../../../utils/custody/kinds'
import type { MovementCause } from '../../../utils/custody/movement'
import { periodOf } from '../../../utils/records/period'
import type { Database } from '../database/database'
import { directory, namesOf } from '../directory/directory'
import { foreignCursor } from '../http/cursor'
import { conditions } from './bookSums'
import { askedOf } from './massBalance'

/**
 * The movements behind one line of a balance, newest first.
 *
 * Errors: 422 where the last day is before the first; 400 for a cursor that is none of ours.
 */
export async function balanceMovements(db: Database, query: BalanceMovementsQuery, nowMs: number): Promise<BalanceMovementsAnswer> {
  const from = await directory(db)
  const { days, span, whose } = askedOf(query, from, nowMs)
  const where = conditions(whose)
  const behind = query.line === 'apart' ? { sql: 'apart = 1', args: [] } : { sql: 'apart = 0 AND cause = ?', args: [query.line] }
  const cursor = readCursor(query.cursor)
  const { rows } = await db.readClient.execute({
    sql: `SELECT m.event_id, m.ordinal, m.at, m.cause, m.refrigerant, m.owner_id, m.grams, m.cylinder_id, c.label_code, c.serial, e.kind
      FROM (SELECT * FROM movements WHERE at >= ? AND at < ?${where.sql} AND ${behind.sql}
        ${cursor ? 'AND (at, event_id, ordinal) < (?, ?, ?)' : ''} ORDER BY at DESC, event_id DESC, ordinal DESC LIMIT ?) m
      JOIN custody_events e ON e.id = m.event_id LEFT JOIN cylinders c ON c.id = m.cylinder_id
      ORDER BY m.at DESC, m.event_id DESC, m.ordinal DESC`,
    args: [span.fromMs, span.untilMs, ...where.args, ...behind.args, ...cursor ?? [], query.limit + 1],
  })
  const shown = rows.slice(0, query.limit)
  const last = shown.at(-1)
  const { firm } = namesOf(from)
  return {
    period: periodOf(days, span),
    items: shown.map(row => movementOf(row, firm)),
    nextCursor: rows.length > query.limit && last ? cursorText(last) : null,
  }
}

function movementOf(row: Row, firm: ReturnType<typeof namesOf>['firm']): BalanceMovement {
  return {
    eventId: row.event_id as string,
    ordinal: row.ordinal as number,
    at: new Date(row.at as number).toISOString(),
    kind: row.kind as EventKind,
    cylinder: { id: row.cylinder_id as string, labelCode: row.label_code as string | null, serial: row.serial as string | null },
    refrigerant: row.refrigerant as string | null,
    owner: row.owner_id === null ? null : firm(row.owner_id as string),
    cause: row.cause as MovementCause,
    grams: row.grams as number,
  }
}

type Cursor = [at: number, eventId: string, ordinal: number]

function cursorText(row: Row): string {
  return Buffer.from(JSON.stringify([row.at, row.event_id, row.ordinal])).toString('base64url')
}

function readCursor(text: string | undefined): Cursor | null {
  if (text === undefined) return null
  try {
    const parts = JSON.parse(Buffer.from(text, 'base64url').toString('utf8')) as unknown
    if (Array.isArray(parts) && parts.length === 3 && Number.isInteger(parts[0]) && typeof parts[1] === 'string' && Number.isInteger(parts[2])) return parts as Cursor
  }
  catch {
    // Not JSON: none of ours.
  }
  throw foreignCursor()
}
