import { execFile } from 'node:child_process'
import { createWriteStream, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join, resolve } from 'node:path'
import { Readable } from 'node:stream'
import { pipeline } from 'node:stream/promises'
import fc from 'fast-check'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { LOG_COLUMNS } from '../../../server/utils/custody/logRow'
import { openDatabase, type Database } from '../../../server/utils/database/database'
import { fillDemo } from '../../../server/utils/demo/fillDemo'
import { directory } from '../../../server/utils/directory/directory'
import { makeCheckpoint } from '../../../server/utils/proof/checkpoints'
import { exportedLog } from '../../../server/utils/proof/exportLog'
import type { Sealing } from '../../../server/utils/proof/sealing'
import { signerOf } from '../../../server/utils/proof/signingKey'
import { DAY, did, HOUR, idOf, kg, recorded, registered, REQUALIFIER, SHOP, START, SUPPLIER, type Told } from '../../helpers/custody'
import { anyStory } from '../../helpers/custodyArbitraries'
import { openLogDatabase } from '../../helpers/logDatabase'
import { logRowsOf } from '../../helpers/logRows'
import { testSealing } from '../../helpers/sealing'
import { putLines, rechained } from '../../helpers/tampering'

const NOW = Date.parse('2026-12-01T17:00:00Z')
const CHECKER = resolve('public/check-custody-log.mjs')

const reading = fc.integer({ min: 1100, max: 4500 }).map(hundredths => kg(hundredths / 100))
/** One half of what happens between two cylinders. */
const pairHalf: fc.Arbitrary<Told> = fc.oneof(
  fc.record({ direction: fc.constantFrom('out' as const, 'in' as const), before: fc.option(reading, { nil: undefined }), after: reading, hour: fc.nat(6) })
    .map(({ direction, before, after, hour }) => did('transferred', {
      direction, counterpartId: idOf(0), transferId: idOf(0), refrigerant: 'R-22', condition: 'clean', grossBefore: before, grossAfter: after,
    }, { occurredAt: START + hour * HOUR, recordedAt: START + DAY })),
  fc.record({ direction: fc.constantFrom('out' as const, 'in' as const), hour: fc.nat(6) })
    .map(({ direction, hour }) => did('exchanged', { direction, otherCylinderId: idOf(0), exchangeId: idOf(0), firmId: SUPPLIER }, {
      placeId: SHOP, occurredAt: START + hour * HOUR, recordedAt: START + DAY,
    })),
)

const COARSE_SCALE = '0198f000-0000-7000-8000-00000000005c'
const EDGES: Told[][] = [
  // 100 g below the new tare is more than a scale is off at 12 kg (60 g): nobody knows what is in it.
  [
    registered({ contents: { refrigerant: 'R-22', condition: 'clean' }, gross: kg(12) }),
    did('retested', { month: '2026-07', requalifierId: REQUALIFIER, method: 'visual', result: 'passed', newTare: kg(12.1) }),
  ],
  // 300 g above the tare tell nothing on a scale that is good to 500 g.
  [registered({ contents: 'evacuated' }), did('weighed', { gross: kg(12.3), scaleId: COARSE_SCALE })],
  // Corrections that came before what they correct, so that nobody could say that they do not fit it: they do nothing.
  ...([
    ['drawn', { grossAfter: kg(15), purpose: 'other' }, { grossAfter: kg(14), purpose: 'other', phase: 'gas' }],
    ['filled', { refrigerant: 'R-22', grossAfter: kg(18) }, { refrigerant: 'WATER', grossAfter: kg(17) }],
    ['emptied', { grossAfter: kg(15) }, { grossAfter: kg(14), vacuum: { torr: 1 } }],
    ['emptied', {}, { vacuum: { microns: -4 } }],
    ['received', {}, { gross: kg(14), paper: 5 }],
    ['weighed', { gross: kg(15) }, { gross: kg(14), scaleId: 'the one by the door' }],
    ['checked', { method: 'pressure', pressureKPa: 500, temperatureC: 20 }, { method: 'laboratory' }],
  ] as const).map(([kind, details, instead]): Told[] => [
    registered({ contents: { refrigerant: 'R-22', condition: 'clean' }, gross: kg(16) }),
    did('corrected', { eventId: idOf(2), reason: 'a slip', instead }),
    { kind, details, more: { placeId: SHOP } },
  ]),
]

/** The same events with a good part of the weights moved to where a scale can hardly tell the cylinder from an empty one. */
function nearTheTare(events: string): string {
  return events.replaceAll('"newTare":{"unit":"kg","value":11}', '"newTare":{"unit":"kg","value":12.1}').replaceAll(/"unit":"kg","value":([\d.]+)/g, (whole, text: string) => {
    const hundredths = Math.round(Number(text) * 100)
    // Even ones stay, and with them the stamp.
    return hundredths % 2 === 0 ? whole : `"unit":"kg","value":${(1185 + hundredths % 30) / 100}`
  })
}

let folder: string
let db: Database
let seal: Sealing
let whole: string[]

beforeAll(async () => {
  folder = mkdtempSync(join(tmpdir(), 'collarbook-export-'))
  db = await openDatabase(`file:${join(folder, 'demo.db')}`)
  await db.migrate(resolve('drizzle/migrations'))
  await fillDemo(db, 'no password', NOW)
  seal = await testSealing(db)
  await makeCheckpoint(db, seal, NOW, null)
  await makeCheckpoint(db, seal, NOW + DAY, null)
  whole = await exportedLines(db, seal)
}, 300_000)
afterAll(() => {
  db.close()
  rmSync(folder, { recursive: true, force: true })
})

async function exportedLines(from: Database, sealing: Sealing): Promise<string[]> {
  const file = join(folder, 'export.ndjson')
  await pipeline(Readable.from(exportedLog(from, sealing, await directory(from, true), NOW), { objectMode: false }), createWriteStream(file))
  return readFileSync(file, 'utf8').trimEnd().split('\n')
}

/** Runs the checker on an export; answers how it ended and the lines that it printed. */
function check(lines: readonly string[], keys: readonly string[] = [seal.signer.publicKey]): Promise<{ code: number, printed: string[] }> {
  const file = join(folder, 'checked.ndjson')
  writeFileSync(file, `${lines.join('\n')}\n`)
  return new Promise(done => execFile(process.execPath, [CHECKER, file, ...keys.flatMap(key => ['--key', key])], { maxBuffer: 1 << 26 }, (error, stdout, stderr) =>
    done({ code: error ? Number(error.code) : 0, printed: (stdout + stderr).trimEnd().split('\n') })))
}

/** The export with one of its lines made into another, or into none. */
function changed(at: number, change: (line: never) => object | null): string[] {
  const made = change(JSON.parse(whole[at]!) as never)
  return made ? whole.with(at, JSON.stringify(made)) : whole.toSpliced(at, 1)
}

/** The place of the nth line of a sort. */
function placeOf(sort: 'event' | 'cylinder' | 'checkpoint' | 'end', nth = 0): number {
  return whole.flatMap((line, at) => line.startsWith(`{"${sort}":`) ? [at] : [])[nth]!
}

describe('the checker of exports', { timeout: 120_000 }, () => {
  it('finds no fault in the demo firm\'s, and every cylinder\'s net by its own reckoning', async () => {
    const { code, printed } = await check(whole)
    expect(printed.at(-1)).toMatch(/^[\d,]+ events of \d+ cylinders, 2 checkpoints: no fault found\.$/)
    expect(printed).toHaveLength(1)
    expect(code).toBe(0)
    const nets = whole.filter(line => line.startsWith('{"cylinder":')).map(line => (JSON.parse(line) as { cylinder: { netGrams: number | null } }).cylinder.netGrams)
    expect(nets.filter(net => net === null).length).toBeGreaterThan(3)
    expect(nets.filter(net => net !== null && net > 0).length).toBeGreaterThan(50)
  })

  it('says so where the key came with the export', async () => {
    const { code, printed } = await check(whole, [])
    expect(code).toBe(0)
    expect(printed.join('\n')).toContain(seal.signer.publicKey)
  })

  it('agrees with the log\'s own fold in any story of any kind of event', async () => {
    const log = await openLogDatabase()
    const sealing = await testSealing(log.db)
    const stories = fc.sample(fc.tuple(anyStory, pairHalf, fc.nat(12)), { seed: 20_261_201, numRuns: 600 })
      .map(([story, half, at]): Told[] => story.toSpliced(at, 0, { ...half, more: { ...half.more, id: idOf(99), deviceId: 'phone-2', trainee: false } }))
    await log.db.write([{ sql: 'INSERT INTO scales (id, name, accuracy_grams, accuracy_basis_points) VALUES (?, \'Coarse\', 500, 0)', args: [COARSE_SCALE] }])
    let seq = 1
    for (const [index, story] of [...stories, ...EDGES].entries()) {
      // Each story has a cylinder and ids of its own.
      const own = `0198f000-${index.toString(16).padStart(4, '0')}-`
      const text = nearTheTare(JSON.stringify(recorded(...story))).replaceAll(/0198f000-0000-(?=7000-9000-|7000-8000-0000000000c1)/g, own)
      const events = JSON.parse(text) as ReturnType<typeof recorded>
      await putLines(log.db, logRowsOf(events, seq))
      seq += events.length
    }
    await makeCheckpoint(log.db, sealing, NOW, null)
    const { code, printed } = await check(await exportedLines(log.db, sealing), [sealing.signer.publicKey])
    log.close()
    expect(printed).toEqual([`${seq - 1} events of ${600 + EDGES.length} cylinders, 1 checkpoints: no fault found.`])
    expect(code).toBe(0)
  })

  it.each([
    ['a column was changed', () => changed(placeOf('event', 7), ({ event }: { event: unknown[] }) => ({ event: event.with(LOG_COLUMNS.indexOf('effective_at'), 0) })), 'one of its columns was changed'],
    ['a line is missing', () => changed(placeOf('event', 7), () => null), 'is missing'],
    ['a net was changed', () => changed(placeOf('cylinder', 3), ({ cylinder }: { cylinder: object }) => ({ cylinder: { ...cylinder, netGrams: 123_456 } })), 'the firm\'s list says 123456 g'],
    ['a checkpoint\'s figure was changed', () => changed(placeOf('checkpoint', 1), ({ checkpoint }: { checkpoint: string }) => ({ checkpoint: checkpoint.replace(/events \d+/, 'events 5') })), 'its text is not what was signed'],
    ['the first checkpoint is missing', () => changed(placeOf('checkpoint', 0), () => null), 'the one before it is missing'],
    ['the file breaks off', () => whole.slice(0, -1), 'breaks off'],
    ['a line says nothing', () => whole.toSpliced(placeOf('event', 3), 0, 'null'), 'says nothing'],
    ['a line of the log is none', () => whole.with(placeOf('event', 3), '{"event":[[]]}'), 'does not have its columns'],
    ['a checkpoint is no text', () => whole.with(placeOf('checkpoint', 0), '{"checkpoint":5}'), 'is no text'],
    ['a line is half', () => whole.with(placeOf('event', 3), whole[placeOf('event', 3)]!.slice(0, 40)), 'no JSON'],
  ])('tells where %s', async (_, lines, words) => {
    const { code, printed } = await check(lines())
    expect(code).toBe(1)
    expect(printed.join('\n')).toContain(words)
  })

  it('tells of a chain that was computed anew, by the checkpoints alone', async () => {
    const first = JSON.parse(whole[placeOf('event')]!) as { event: unknown[] }
    const id = first.event[LOG_COLUMNS.indexOf('cylinder_id')]
    const at = whole.flatMap((line, index) => line.startsWith('{"event":') && line.includes(`"${String(id)}",`) ? [index] : [])
    const rows = at.map(index => Object.fromEntries(LOG_COLUMNS.map((column, of) => [column, (JSON.parse(whole[index]!) as { event: unknown[] }).event[of]])))
    const anew = rechained(rows.map(row => ({ ...row, actor_id: 'somebody else' })) as never)
    const lines = anew.reduce((made, row, index) => made.with(at[index]!, JSON.stringify({ event: LOG_COLUMNS.map(column => row[column]) })), whole)
    const { code, printed } = await check(lines)
    expect(code).toBe(1)
    expect(printed).toEqual([
      'checkpoint 1: the log up to there is not what was signed', 'checkpoint 2: the log up to there is not what was signed',
      expect.stringContaining('2 faults found'),
    ])
  })

  it('tells of checkpoints by another key than the one that was named', async () => {
    const other = signerOf(seal.origin, Buffer.alloc(32, 3)).publicKey
    const { code, printed } = await check(whole, [other])
    expect(code).toBe(1)
    expect(printed[0]).toBe('checkpoint 1: it is signed by another key, and not by a key that you trust')
  })

  it.each([
    ['no key', whole => whole, ['nonsense']],
    ['no export', () => ['{"format":"something else","version":1}'], []],
    ['an export without its columns', (lines: string[]) => lines.with(0, lines[0]!.replace('"columns"', '"rows"')), []],
    ['an export without its former keys', (lines: string[]) => lines.with(0, lines[0]!.replace('"formerKeys"', '"keys"')), []],
    ['an export of another version', (lines: string[]) => lines.with(0, lines[0]!.replace('"version":1', '"version":2')), []],
  ] as [string, (lines: string[]) => string[], string[]][])('cannot tell of %s, and says so', async (_, made, keys) => {
    expect((await check(made(whole), keys)).code).toBe(2)
  })
})
