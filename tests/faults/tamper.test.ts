import { renameSync, writeFileSync } from 'node:fs'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { LOG_COLUMNS, type LogRow } from '../../server/utils/custody/logRow'
import { allCheckpoints, makeCheckpoint, type StoredCheckpoint } from '../../server/utils/proof/checkpoints'
import type { Sealing } from '../../server/utils/proof/sealing'
import { signerOf } from '../../server/utils/proof/signingKey'
import { verifyLog } from '../../server/utils/proof/verifyLog'
import { checkpointText } from '../../utils/proof/checkpoint'
import { IN_FULL } from '../helpers/inFull'
import { newCylinder, openLogDatabase, record, sent, type LogDatabase } from '../helpers/logDatabase'
import { testSealing } from '../helpers/sealing'
import { lb } from '../helpers/stamps'
import { changedByte, dropGuards, putLines, rechained, seededChance, storedLog, streamsOf, takeOut } from '../helpers/tampering'

// The attacker of this file has the whole database in hand, but not the key, nor the copies of the checkpoints.
const CHANGED_BYTES = 1_000
const ATTACKS = 200
const CYLINDERS = IN_FULL ? 60 : 12

const NOW = Date.parse('2026-07-01T17:00:00Z')
const DAY = 86_400_000

let log: LogDatabase
let seal: Sealing
let rows: LogRow[]
let streams: LogRow[][]
let checkpoints: StoredCheckpoint[]

beforeAll(async () => {
  log = await openLogDatabase()
  seal = await testSealing(log.db)
  const ids: string[] = []
  for (let cylinder = 0; cylinder < CYLINDERS; cylinder++) {
    const id = await newCylinder(log)
    ids.push(id)
    await record(log.db, log.technician, [
      sent(id, 'filled', { refrigerant: 'R-22', condition: 'clean', grossBefore: lb(27.5), grossAfter: lb(31 + cylinder % 9), looked: true }, { placeId: log.placeId, note: 'plant room, 3rd floor – schön' }),
      sent(id, 'weighed', { gross: lb(31 + cylinder % 9) }, { deviceSeq: 2 }),
    ])
  }
  await makeCheckpoint(log.db, seal, NOW, null)
  for (const id of ids) await record(log.db, log.technician, [sent(id, 'moved', { toPlaceId: log.placeId }, { deviceSeq: 3 })])
  await makeCheckpoint(log.db, seal, NOW + DAY, null)
  await dropGuards(log.db)
  rows = await storedLog(log.db)
  streams = streamsOf(rows)
  checkpoints = await allCheckpoints(log.db)
}, 60_000)
afterAll(() => log.close())

function verify(since: number | null = null) {
  return verifyLog(log.db, { now: 0, sealing: seal, since })
}

/** Does something to the log so many times, from the same beginning each time; answers what was not found. */
async function undetected(times: number, attack: (turn: number) => Promise<string>, check: () => Promise<{ ok: boolean }>): Promise<string[]> {
  const missed: string[] = []
  for (let turn = 0; turn < times; turn++) {
    const what = await attack(turn)
    if ((await check()).ok) missed.push(what)
    await log.db.write(['DELETE FROM custody_events'])
    await putLines(log.db, rows)
  }
  expect(await verify()).toMatchObject({ ok: true, checked: rows.length, checkpoints: checkpoints.length })
  return missed
}

describe('a log that nobody touched', () => {
  it('is found whole, all of it and since each checkpoint', async () => {
    expect(await verify()).toMatchObject({ ok: true, found: 0, checked: CYLINDERS * 4, cylinders: CYLINDERS, checkpoints: 2 })
    for (const since of [1, 2]) expect(await verify(since)).toMatchObject({ ok: true, found: 0, since })
  })
})

describe('verifying finds', { timeout: 600_000 }, () => {
  it(`each of ${CHANGED_BYTES} changed bytes, in whatever column of whatever line`, async () => {
    const chance = seededChance(20_261_201)
    const drawn = new Set<string>()
    const missed: string[] = []
    for (let changes = 0; changes < CHANGED_BYTES;) {
      const row = rows[chance(rows.length)]!
      const column = LOG_COLUMNS[chance(LOG_COLUMNS.length)]!
      const changed = changedByte(row[column], chance)
      // Keys of other lines stay free: a change onto one of them is refused by the table itself.
      const [written] = await log.db.write([{ sql: `UPDATE OR IGNORE custody_events SET ${column} = ? WHERE seq = ?`, args: [changed, row.seq] }])
      if (written!.rowsAffected === 0) continue
      drawn.add(column)
      changes++
      if ((await verify()).ok) missed.push(`${column} of ${row.id}: ${String(row[column])} -> ${String(changed)}`)
      await log.db.write([{ sql: `UPDATE custody_events SET ${column} = ? WHERE seq = ?`, args: [row[column], column === 'seq' ? changed : row.seq] }])
    }
    expect(missed).toEqual([])
    expect([...drawn].sort()).toEqual([...LOG_COLUMNS].sort())
    expect(await verify()).toMatchObject({ ok: true })
  })

  it(`each of ${ATTACKS} lines that were taken out of the middle`, async () => {
    const chance = seededChance(2)
    expect(await undetected(ATTACKS, async () => {
      const stream = streams[chance(streams.length)]!
      const row = stream[chance(stream.length - 1)]!
      await takeOut(log.db, [row])
      return `line ${row.seq}`
    }, verify)).toEqual([])
  })

  // What follows is also found since a checkpoint, without a look at the lines before it.
  it.each([null, 1, 2])(`each of ${ATTACKS} tails that were cut off, since checkpoint %s`, async (since) => {
    const chance = seededChance(3)
    expect(await undetected(ATTACKS, async () => {
      const stream = streams[chance(streams.length)]!
      const kept = 1 + chance(stream.length - 1)
      await takeOut(log.db, stream.slice(kept))
      return `${stream[0]!.cylinder_id} cut to ${kept}`
    }, () => verify(since))).toEqual([])
  })

  it.each([null, 1, 2])(`each of ${ATTACKS} whole cylinders that were taken out, since checkpoint %s`, async (since) => {
    const chance = seededChance(4)
    expect(await undetected(ATTACKS, async () => {
      const stream = streams[chance(streams.length)]!
      await takeOut(log.db, stream)
      return stream[0]!.cylinder_id
    }, () => verify(since))).toEqual([])
  })

  it.each([null, 1, 2])(`each of ${ATTACKS} edits whose chain was computed anew, since checkpoint %s`, async (since) => {
    const chance = seededChance(5)
    expect(await undetected(ATTACKS, async () => {
      const stream = streams[chance(streams.length)]!
      const edited = chance(stream.length)
      await putLines(log.db, rechained(stream.map((row, index) => index === edited ? { ...row, occurred_at: row.occurred_at + 1 } : row)))
      return `line ${stream[edited]!.seq}`
    }, () => verify(since))).toEqual([])
  })

  it(`each of ${ATTACKS / 10} cylinders taken out with every number and chain behind it made anew`, async () => {
    const chance = seededChance(6)
    expect(await undetected(ATTACKS / 10, async () => {
      const gone = streams[chance(streams.length)]![0]!.cylinder_id
      const left = rows.filter(row => row.cylinder_id !== gone).map((row, index) => ({ ...row, seq: index + 1 }))
      await log.db.write(['DELETE FROM custody_events'])
      await putLines(log.db, streamsOf(left).flatMap(rechained))
      return gone
    }, verify)).toEqual([])
  })
})

describe('the kind of damage', () => {
  async function kindsAfter(attack: () => Promise<void>, since: number | null = null): Promise<string[]> {
    await attack()
    const { damage } = await verify(since)
    await log.db.write(['DELETE FROM custody_events', 'DELETE FROM checkpoints', ...checkpoints.map(({ number, note }) => ({
      sql: 'INSERT INTO checkpoints (number, note) VALUES (?, ?)', args: [number, note],
    }))])
    await putLines(log.db, rows)
    return [...new Set(damage.map(({ kind }) => kind))]
  }

  it('is a changed line, and nothing else, where one column was changed', async () => {
    expect(await kindsAfter(() => putLines(log.db, [{ ...rows[5]!, effective_at: 0 }]))).toEqual(['changed'])
  })

  it('is a missing number and fewer lines where a tail was cut', async () => {
    expect(await kindsAfter(() => takeOut(log.db, [streams[0]!.at(-1)!]))).toEqual(['missing-number', 'fewer-than-checkpointed'])
  })

  it('is fewer lines where the very end of the log was cut', async () => {
    expect(await kindsAfter(() => takeOut(log.db, [rows.at(-1)!]))).toEqual(['fewer-than-checkpointed'])
  })

  it('is another state than was signed where a chain was computed anew, at every checkpoint since', async () => {
    expect(await kindsAfter(() => putLines(log.db, rechained(streams[0]!.map(row => ({ ...row, body: row.body.replace('R-22', 'R-32') })))))).toEqual(['not-as-checkpointed'])
  })

  it('is a missing line where one was taken out of the middle', async () => {
    expect(await kindsAfter(() => takeOut(log.db, [streams[0]![1]!]))).toEqual(['missing-number', 'missing-before', 'fewer-than-checkpointed'])
  })

  it('is a forged checkpoint where its text was changed', async () => {
    expect(await kindsAfter(async () => {
      await log.db.write([{ sql: 'UPDATE checkpoints SET note = ? WHERE number = 2', args: [checkpoints[1]!.note.replace('events ', 'events 1')] }])
    })).toContain('checkpoint-forged')
  })

  it('is a checkpoint by another key where the attacker signed what the log had been made into', async () => {
    expect(await kindsAfter(async () => {
      const forged = signerOf(seal.origin, Buffer.alloc(32, 9)).sign(checkpointText(checkpoints[1]!.says!))
      await log.db.write([{ sql: 'UPDATE checkpoints SET note = ? WHERE number = 2', args: [forged] }])
    })).toEqual(['checkpoint-other-key', 'checkpoint-missing'])
  })

  it.each([1, 2])('is a missing checkpoint where number %s was taken out', async (number) => {
    expect(await kindsAfter(async () => {
      await log.db.write([`DELETE FROM checkpoints WHERE number = ${number}`])
    })).toEqual(['checkpoint-missing'])
  })

  it('is a missing checkpoint where all were taken out with what they showed', async () => {
    expect(await kindsAfter(async () => {
      await log.db.write(['DELETE FROM checkpoints'])
      await takeOut(log.db, [rows.at(-1)!])
    })).toEqual(['checkpoint-missing'])
  })
})

describe('a chain that was computed anew', () => {
  it('is found after the server has signed it too, for the checkpoints before stay', async () => {
    await putLines(log.db, rechained(streams[0]!.map(row => ({ ...row, occurred_at: row.occurred_at + 1 }))))
    await makeCheckpoint(log.db, seal, NOW + 2 * DAY, null)
    const { damage } = await verify()
    expect(damage.map(({ kind, checkpoint }) => [kind, checkpoint])).toEqual([['not-as-checkpointed', 1], ['not-as-checkpointed', 2]])
    await log.db.write(['DELETE FROM checkpoints WHERE number = 3', 'DELETE FROM custody_events'])
    await putLines(log.db, rows)
    expect(await verify()).toMatchObject({ ok: false, firstBad: { kind: 'checkpoint-missing', checkpoint: 3 } })
    renameSync(seal.copies, `${seal.copies}.old`)
    writeFileSync(seal.copies, checkpoints.map(({ note }) => `${JSON.stringify(note)}\n`).join(''))
    expect(await verify()).toMatchObject({ ok: true })
  })
})
