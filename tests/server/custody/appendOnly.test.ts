import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { LOG_COLUMNS, SELECT_LOG, type LogRow, logRow } from '../../../server/utils/custody/logRow'
import { verifyLog } from '../../../server/utils/proof/verifyLog'
import { lb } from '../../helpers/stamps'
import { newCylinder, openLogDatabase, record, sent, type LogDatabase } from '../../helpers/logDatabase'

const DRAWS = 1000

let log: LogDatabase
beforeAll(async () => {
  log = await openLogDatabase()
  for (let cylinder = 0; cylinder < 6; cylinder++) {
    const id = await newCylinder(log)
    await record(log.db, log.technician, [
      sent(id, 'filled', { refrigerant: 'R-22', condition: 'clean', grossBefore: lb(27.5), grossAfter: lb(31 + cylinder), looked: true }, { placeId: log.placeId, note: 'plant room, 3rd floor – schön' }),
      sent(id, 'weighed', { gross: lb(31 + cylinder) }, { deviceSeq: 2 }),
      sent(id, 'moved', { toPlaceId: log.placeId }, { deviceSeq: 3 }),
    ])
  }
})
afterAll(() => log.close())

describe('the log as a table', () => {
  it.each([
    'UPDATE custody_events SET effective_at = 0',
    'UPDATE OR REPLACE custody_events SET id = id',
    'DELETE FROM custody_events WHERE version = 1',
  ])('refuses %s', async (sql) => {
    await expect(log.db.write([sql])).rejects.toThrow('append-only')
    expect(await verifyLog(log.db, { now: 0, sealing: null })).toMatchObject({ ok: true, checked: 24 })
  })

  it('keeps its row against INSERT OR REPLACE, by seq, by id and by version', async () => {
    const row = logRow((await log.db.readClient.execute(`${SELECT_LOG} LIMIT 1`)).rows[0]!)
    const free = { seq: 900_001, id: '00000000-0000-7000-8000-00000000f00d', version: 77 }
    for (const taken of ['seq', 'id', 'version'] as const) {
      const forged: LogRow = { ...row, ...free, [taken]: row[taken], body: '{}' }
      await log.db.write([{
        sql: `INSERT OR REPLACE INTO custody_events (${LOG_COLUMNS.join(', ')}) VALUES (${LOG_COLUMNS.map(() => '?').join(', ')})`,
        args: LOG_COLUMNS.map(column => forged[column]),
      }])
    }
    const after = logRow((await log.db.readClient.execute({ sql: `${SELECT_LOG} WHERE id = ?`, args: [row.id] })).rows[0]!)
    expect(after).toEqual(row)
    expect((await log.db.readClient.execute('SELECT count(*) FROM custody_events')).rows[0]![0]).toBe(24)
  })
})

describe('verifying', () => {
  it(`finds each of ${DRAWS} changed bytes, in whatever column of whatever event`, { timeout: 120_000 }, async () => {
    expect(await verifyLog(log.db, { now: 0, sealing: null })).toMatchObject({ ok: true, checked: 24, cylinders: 6 })
    const rows = (await log.db.readClient.execute(SELECT_LOG)).rows.map(logRow)
    const drawn = new Set<string>()
    // The owner of the file can drop the triggers: that is the attacker this is about.
    await log.db.write(['DROP TRIGGER custody_events_no_update'])
    let state = 20261201
    const chance = (below: number) => {
      state = (Math.imul(state, 1103515245) + 12345) >>> 0
      return Math.floor(state / 2 ** 32 * below)
    }
    const missed: string[] = []
    let changes = 0
    while (changes < DRAWS) {
      const row = rows[chance(rows.length)]!
      const column = LOG_COLUMNS[chance(LOG_COLUMNS.length)]!
      const changed = changedByte(row[column], chance)
      if (changed === null) continue
      drawn.add(column)
      // Keys of other rows stay free: a change onto one of them is refused by the table itself.
      const written = await log.db.write([{ sql: `UPDATE OR IGNORE custody_events SET ${column} = ? WHERE rowid = ?`, args: [changed, row.seq] }])
      if (written[0]!.rowsAffected === 0) continue
      changes++
      const verdict = await verifyLog(log.db, { now: 0, sealing: null })
      if (verdict.ok) missed.push(`${column} of ${row.id}: ${String(row[column])} -> ${String(changed)}`)
      await log.db.write([{ sql: `UPDATE custody_events SET ${column} = ? WHERE rowid = ?`, args: [row[column], column === 'seq' ? changed : row.seq] }])
    }
    expect(missed).toEqual([])
    expect([...drawn].sort()).toEqual([...LOG_COLUMNS].sort())
    expect(await verifyLog(log.db, { now: 0, sealing: null })).toMatchObject({ ok: true, checked: 24 })
  })
})

/** The value with one byte of it changed; a value that is not there becomes a byte. */
function changedByte(value: string | number | null, chance: (below: number) => number): string | number {
  if (value === null) return 'x'
  if (typeof value === 'number') {
    const digits = String(value).split('')
    const at = chance(digits.length)
    digits[at] = String((Number(digits[at]) + 1 + chance(9)) % 10)
    const changed = Number(digits.join(''))
    return changed === value ? value + 1 : changed
  }
  if (value === '') return 'x'
  const bytes = Buffer.from(value)
  const at = chance(bytes.length)
  bytes[at] = bytes[at]! ^ (1 << chance(7))
  const changed = bytes.toString('utf8')
  return changed === value ? `${value}x` : changed
}
