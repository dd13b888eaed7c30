import type { InStatement, Row } from '@libsql/client'
import type { AnyRecordedEvent } from '../../../utils/custody/event'
import { CACHE_TURN, sinceTurn } from './cacheTurn'

/** The columns of the custody log, in the order in which they are written and hashed. */
export const LOG_COLUMNS = [
  'seq', 'id', 'cylinder_id', 'version', 'device_id', 'device_seq', 'kind', 'occurred_at', 'occurred_offset_minutes',
  'clock_skew_seconds', 'effective_at', 'recorded_at', 'actor_id', 'posted_by', 'supervisor_id', 'trainee', 'place_id',
  'body', 'content_hash', 'prev_hash', 'hash',
] as const

/** One line of the log as stored. */
export type LogRow = {
  seq: number
  id: string
  cylinder_id: string
  version: number
  device_id: string
  device_seq: number
  kind: string
  occurred_at: number
  occurred_offset_minutes: number
  clock_skew_seconds: number
  effective_at: number
  recorded_at: number
  actor_id: string
  posted_by: string
  supervisor_id: string | null
  /** 0 or 1. */
  trainee: number
  place_id: string | null
  body: string
  content_hash: string
  prev_hash: string
  hash: string
}

/** Lines whole, with what chains them. */
export const SELECT_LOG = `SELECT ${LOG_COLUMNS.join(', ')} FROM custody_events`

/** A row of {@link SELECT_LOG}, as the driver gives it. */
export function logRow(row: Row): LogRow {
  return Object.fromEntries(LOG_COLUMNS.map((column, index) => [column, row[index]])) as LogRow
}

/** What of a line its event is read from. */
export type EventLine = Omit<LogRow, 'content_hash' | 'prev_hash'>

const EVENT_COLUMNS = LOG_COLUMNS.filter(column => column !== 'content_hash' && column !== 'prev_hash')

/** Lines for their events, one value to each: the driver takes three times as long over a value to each column. */
export const SELECT_EVENT_LINES = `SELECT json_array(${EVENT_COLUMNS.join(', ')}) FROM custody_events`

/** A row of {@link SELECT_EVENT_LINES}, as the driver gives it. */
export function eventLine(row: Row): EventLine {
  const values = JSON.parse(row[0] as string) as EventLine[keyof EventLine][]
  const line: Record<string, unknown> = {}
  for (const [index, column] of EVENT_COLUMNS.entries()) line[column] = values[index]
  return line as EventLine
}

/**
 * The event that a line holds.
 *
 * Errors: throws where the body is not JSON, which only tampering can cause.
 */
export function recordedEvent(row: EventLine): AnyRecordedEvent {
  const body = JSON.parse(row.body) as {
    note?: string
    practice?: boolean
    confirmed?: string[]
    details?: Record<string, unknown>
  }
  return {
    seq: row.seq,
    id: row.id,
    cylinderId: row.cylinder_id,
    version: row.version,
    kind: row.kind,
    occurredAt: row.occurred_at,
    occurredOffsetMinutes: row.occurred_offset_minutes,
    clockSkewSeconds: row.clock_skew_seconds,
    effectiveAt: row.effective_at,
    recordedAt: row.recorded_at,
    deviceId: row.device_id,
    deviceSeq: row.device_seq,
    actorId: row.actor_id,
    postedBy: row.posted_by,
    supervisorId: row.supervisor_id,
    trainee: row.trainee === 1,
    placeId: row.place_id,
    note: body.note ?? null,
    practice: body.practice ?? false,
    confirmed: body.confirmed ?? [],
    details: body.details ?? {},
  } as AnyRecordedEvent
}

/** Many to a statement, for the driver prepares each anew; few enough for the arguments that one may have. */
const LINES_A_STATEMENT = 200

/** How far the log and its caches had gone when something was read of them. */
export interface LogPoint {
  /** The last line of the whole log; null while it is empty. */
  newest: { seq: number, id: string } | null
  turn: string | null
}

/** Asks for it. */
export const LOG_POINT = `SELECT ${CACHE_TURN}, (SELECT seq FROM custody_events ORDER BY seq DESC LIMIT 1), (SELECT id FROM custody_events ORDER BY seq DESC LIMIT 1)`

/** The answer of {@link LOG_POINT}. */
export function logPoint(row: Row): LogPoint {
  return { turn: row[0] as string | null, newest: row[1] === null ? null : { seq: row[1] as number, id: row[2] as string } }
}

/**
 * Writes lines, in their order, if, and only if, the log still ends with the line that they were computed after, and
 * nobody has made the caches anew that they were computed from.
 *
 * Each statement answers a row for each of its lines when they were written, and none when another process was first.
 */
export function insertLogRows(rows: readonly LogRow[], { newest, turn }: LogPoint): InStatement[] {
  const one = `(${LOG_COLUMNS.map(() => '?').join(', ')})`
  const guard = sinceTurn(turn)
  return Array.from({ length: Math.ceil(rows.length / LINES_A_STATEMENT) }, (_, part) => {
    const some = rows.slice(part * LINES_A_STATEMENT, (part + 1) * LINES_A_STATEMENT)
    const lineBefore = part === 0 ? newest?.id ?? null : rows[part * LINES_A_STATEMENT - 1]!.id
    return {
      sql: `INSERT INTO custody_events (${LOG_COLUMNS.join(', ')}) SELECT * FROM (VALUES ${some.map(() => one).join(', ')})
        WHERE (SELECT id FROM custody_events ORDER BY seq DESC LIMIT 1) IS ? AND ${guard.sql}
        ON CONFLICT DO NOTHING RETURNING seq`,
      args: [...some.flatMap(row => LOG_COLUMNS.map(column => row[column])), lineBefore, ...guard.args],
    }
  })
}
