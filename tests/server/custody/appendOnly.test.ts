import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { LOG_COLUMNS, SELECT_LOG, type LogRow, logRow } from '../../../server/utils/custody/logRow'
import { verifyLog } from '../../../server/utils/proof/verifyLog'
import { lb } from '../../helpers/stamps'
import { newCylinder, openLogDatabase, record, sent, type LogDatabase } from '../../helpers/logDatabase'

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
