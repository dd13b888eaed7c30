import type { InValue } from '@libsql/client'
import { LOG_COLUMNS, logRow, SELECT_LOG, type LogRow } from '../../server/utils/custody/logRow'
import { sha256 } from '../../server/utils/custody/sha256'
import type { Database } from '../../server/utils/database/database'
import { hashEvent } from '../../utils/custody/chain'

/** Whole numbers below one, the same each time. */
export type Chance = (below: number) => number

/** A seeded source of chance. */
export function seededChance(seed: number): Chance {
  let state = seed
  return (below) => {
    state = (Math.imul(state, 1_103_515_245) + 12_345) >>> 0
    return Math.floor(state / 2 ** 32 * below)
  }
}

/** Somebody who has the database file in hand: what keeps the log and its checkpoints append-only is gone. */
export async function dropGuards(db: Database): Promise<void> {
  for (const table of ['custody_events', 'checkpoints']) {
    await db.write(['update', 'delete', 'replace'].map(verb => `DROP TRIGGER ${table}_no_${verb}`))
  }
}

/** The log as it is stored, in the order of recording. */
export async function storedLog(db: Database): Promise<LogRow[]> {
  return (await db.readClient.execute(`${SELECT_LOG} ORDER BY seq`)).rows.map(logRow)
}

/** Puts lines into the log as they are given, in place of those with the same numbers. */
export async function putLines(db: Database, rows: readonly LogRow[]): Promise<void> {
  await db.write(rows.map(row => ({
    sql: `INSERT OR REPLACE INTO custody_events (${LOG_COLUMNS.join(', ')}) VALUES (${LOG_COLUMNS.map(() => '?').join(', ')})`,
    args: LOG_COLUMNS.map(column => row[column]) as InValue[],
  })))
}

/** Takes lines out of the log. */
export async function takeOut(db: Database, rows: readonly LogRow[]): Promise<void> {
  await db.write(rows.map(({ seq }) => ({ sql: 'DELETE FROM custody_events WHERE seq = ?', args: [seq] })))
}

/** The lines of a cylinder with versions and hashes that fit each other again. */
export function rechained(stream: readonly LogRow[]): LogRow[] {
  let before = { version: 0, hash: '' }
  return stream.map((row) => {
    const open = { ...row, version: before.version + 1, prev_hash: before.hash }
    const closed = { ...open, hash: hashEvent(open, sha256) }
    before = closed
    return closed
  })
}

/** The value with one byte of it changed; a value that is not there becomes a byte. */
export function changedByte(value: string | number | null, chance: Chance): string | number {
  if (value === null) return 'x'
  if (typeof value === 'number') {
    const digits = String(value).split('')
    const at = chance(digits.length)
    digits[at] = String((Number(digits[at]) + 1 + chance(9)) % 10)
    const changed = Number(digits.join(''))
    return changed === value || !Number.isFinite(changed) ? value + 1 : changed
  }
  if (value === '') return 'x'
  const bytes = Buffer.from(value)
  const at = chance(bytes.length)
  bytes[at] = bytes[at]! ^ (1 << chance(7))
  const changed = bytes.toString('utf8')
  return changed === value ? `${value}x` : changed
}

/** The lines of each cylinder, in the order of its versions. */
export function streamsOf(rows: readonly LogRow[]): LogRow[][] {
  const streams = new Map<string, LogRow[]>()
  for (const row of rows) {
    const stream = streams.get(row.cylinder_id)
    if (stream) stream.push(row)
    else streams.set(row.cylinder_id, [row])
  }
  return [...streams.values()]
}
