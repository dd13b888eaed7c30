import { existsSync, readFileSync, statSync, writeFileSync } from 'node:fs'
import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest'
import { allCheckpoints, listCheckpoints, makeCheckpoint } from '../../../server/utils/proof/checkpoints'
import { isCheckpointDue, tellWhetherSigned } from '../../../server/utils/proof/dailyCheckpoints'
import { sealing, type Sealing } from '../../../server/utils/proof/sealing'
import { judgeSignature } from '../../../server/utils/proof/signingKey'
import { verifyLog } from '../../../server/utils/proof/verifyLog'
import { newCylinder, openLogDatabase, record, sent, type LogDatabase } from '../../helpers/logDatabase'
import { testSealing, TEST_KEY } from '../../helpers/sealing'
import { lb } from '../../helpers/stamps'

const NOW = Date.parse('2026-07-01T17:00:00Z')
const DAY = 86_400_000

let log: LogDatabase
let seal: Sealing
let cylinderId: string
beforeAll(async () => {
  log = await openLogDatabase()
  seal = await testSealing(log.db)
  cylinderId = await newCylinder(log)
  await newCylinder(log)
})
afterAll(() => log.close())

function weigh(pounds: number) {
  return record(log.db, log.warehouse, [sent(cylinderId, 'weighed', { gross: lb(pounds) })])
}

describe('a checkpoint', () => {
  it('is due where the log holds something and none was made for a day', async () => {
    const empty = await openLogDatabase()
    expect(await isCheckpointDue(empty.db, NOW)).toBe(false)
    empty.close()
    expect(await isCheckpointDue(log.db, NOW)).toBe(true)
  })

  it('says how far the log has come, is signed, and names none before the first', async () => {
    const made = await makeCheckpoint(log.db, seal, NOW, null)
    expect(made.says).toMatchObject({ number: 1, at: NOW, seq: 2, events: 2, cylinders: 2, previous: '' })
    expect(judgeSignature(made.note, seal.trusted)).toBe('good')
    expect(await isCheckpointDue(log.db, NOW + DAY - 1)).toBe(false)
    expect(await isCheckpointDue(log.db, NOW + DAY)).toBe(true)
  })

  it('names the one before it by the hash of its note', async () => {
    await weigh(40)
    const [first] = await allCheckpoints(log.db)
    const second = await makeCheckpoint(log.db, seal, NOW + DAY, log.warehouse.personId)
    expect(second.says).toMatchObject({ number: 2, events: 3, previous: first!.hash })
    expect(second.askedBy).toBe(log.warehouse.personId)
  })

  it('is listed newest first, a page at a time, with the public key', async () => {
    const page = await listCheckpoints(log.db, seal, { limit: 1 })
    expect(page.items.map(({ number, askedBy }) => [number, askedBy?.name])).toEqual([[2, 'Person 0']])
    expect(page.publicKey).toBe(seal.signer.publicKey)
    const next = await listCheckpoints(log.db, seal, { limit: 1, cursor: page.nextCursor! })
    expect(next.items.map(({ number, askedBy }) => [number, askedBy])).toEqual([[1, null]])
    expect(next.nextCursor).toBeNull()
  })

  it('cannot be changed, taken out or written over in its table', async () => {
    await expect(log.db.write(['UPDATE checkpoints SET note = \'x\' WHERE number = 1'])).rejects.toThrow('append-only')
    await expect(log.db.write(['DELETE FROM checkpoints WHERE number = 1'])).rejects.toThrow('append-only')
    await log.db.write(['INSERT OR REPLACE INTO checkpoints (number, note) VALUES (1, \'x\')'])
    expect((await allCheckpoints(log.db))[0]!.says).not.toBeNull()
  })

  it('is made in turn where several are asked for at once, while events go on', async () => {
    const [one, two] = await Promise.all([
      makeCheckpoint(log.db, seal, NOW + 2 * DAY, null), makeCheckpoint(log.db, seal, NOW + 2 * DAY, null), weigh(41), weigh(42),
    ])
    expect([one.number, two.number]).toEqual([3, 4])
    expect(two.says?.previous).toBe(one.hash)
    expect(await verifyLog(log.db, { now: NOW, sealing: seal })).toMatchObject({ ok: true, checkpoints: 4, upTo: 4, checked: 5 })
  })

  it('is kept as a copy outside the database', () => {
    const copies = readFileSync(seal.copies, 'utf8').trimEnd().split('\n').map(line => JSON.parse(line) as string)
    expect(copies).toHaveLength(4)
    expect(copies[0]).toContain('\nnumber 1\n')
  })
})

describe('verifying since a checkpoint', () => {
  it('computes only what has come since', async () => {
    await makeCheckpoint(log.db, seal, NOW + 3 * DAY, null)
    await weigh(43)
    await newCylinder(log)
    const verdict = await verifyLog(log.db, { now: NOW, sealing: seal, since: 5 })
    expect(verdict).toMatchObject({ ok: true, scope: 'since', since: 5, checked: 2, cylinders: 3, upTo: 5 })
  })

  it('agrees with verifying all, from whichever checkpoint it begins', async () => {
    for (const since of [1, 2, 3, 4, 5]) {
      expect(await verifyLog(log.db, { now: NOW, sealing: seal, since })).toMatchObject({ ok: true, since, found: 0 })
    }
    expect(await verifyLog(log.db, { now: NOW, sealing: seal })).toMatchObject({ ok: true, scope: 'all', since: null, found: 0 })
  })

  it('begins at the beginning where there is no such checkpoint', async () => {
    expect(await verifyLog(log.db, { now: NOW, sealing: seal, since: 99 })).toMatchObject({ ok: true, scope: 'all', since: null })
  })
})

describe('the key', () => {
  it('is made once, beside the database and for its owner alone, where none is set', async () => {
    const first = await sealing(log.db, { checkpointKey: undefined, formerCheckpointKeys: [] })
    const file = `${log.file}.key`
    expect(existsSync(file)).toBe(true)
    expect(statSync(file).mode & 0o777).toBe(0o600)
    const again = await sealing(log.db, { checkpointKey: undefined, formerCheckpointKeys: [] })
    expect(again!.signer.publicKey).toBe(first!.signer.publicKey)
    const secret = readFileSync(file, 'utf8').trim()
    expect(readFileSync(log.file).includes(secret)).toBe(false)
  })

  it('that is no key is named at the start, and to who asks for what it signs', async () => {
    const file = `${log.file}.key`
    const settings = { checkpointKey: undefined, formerCheckpointKeys: [] }
    const good = readFileSync(file)
    const said = vi.spyOn(console, 'error').mockImplementation(() => undefined)
    try {
      await tellWhetherSigned(log.db, settings)
      expect(said).not.toHaveBeenCalled()
      writeFileSync(file, 'a photograph of the key')
      const detail = expect.stringMatching(/^The file collarbook\.db\.key does not hold a key/)
      await expect(sealing(log.db, settings)).rejects.toMatchObject({ details: { status: 500, detail } })
      await tellWhetherSigned(log.db, settings)
      expect(said).toHaveBeenCalledExactlyOnceWith('The log cannot be signed:', detail)
    }
    finally {
      writeFileSync(file, good)
      said.mockRestore()
    }
  })

  it('may be exchanged where the former one is named, and not in silence', async () => {
    const other = 'TM0Imyj/ltqdtsNG7BFOD1uKMZ81q6Yk2oz27U+4pvs='
    expect(other).not.toBe(TEST_KEY)
    const alone = await sealing(log.db, { checkpointKey: other, formerCheckpointKeys: [] })
    const verdict = await verifyLog(log.db, { now: NOW, sealing: alone })
    expect(verdict).toMatchObject({ ok: false, firstBad: { kind: 'checkpoint-other-key', checkpoint: 1 } })
    const named = await sealing(log.db, { checkpointKey: other, formerCheckpointKeys: [seal.signer.publicKey] })
    expect(await verifyLog(log.db, { now: NOW, sealing: named })).toMatchObject({ ok: true })
  })
})
