// What verifying the custody log costs over reading its columns by the same client and hashing them: `npm run bench:log`.
import { createHash, randomUUID } from 'node:crypto'
import { mkdir, mkdtemp, rm, writeFile } from 'node:fs/promises'
import { availableParallelism, cpus, tmpdir } from 'node:os'
import { join } from 'node:path'
import process from 'node:process'
import { fileURLToPath, pathToFileURL } from 'node:url'
import { build } from 'vite'

const EVENTS = Number(process.env.BENCH_EVENTS ?? 1_000_000)
const EVENTS_A_CYLINDER = 10
const CHECKPOINTS = 30
const ROUNDS = 5
const VERIFY_BOUND = 2
const PAGE = 1_000

const here = fileURLToPath(new URL('.', import.meta.url))
const { LOG_COLUMNS, hashEvent, makeCheckpoint, openDatabase, sha256, testSealing, verifyLog } = await parts()

/** Our own modules as the server has them, in one bundle that finds its packages beside it. */
async function parts() {
  const bundle = await build({
    configFile: false, logLevel: 'warn', root: here, resolve: { alias: { '~~': fileURLToPath(new URL('../..', import.meta.url)) } },
    build: { ssr: 'logParts.mjs', write: false, minify: false, target: 'node20', rollupOptions: { output: { inlineDynamicImports: true } } },
  })
  const folder = fileURLToPath(new URL('../../node_modules/.cache/collarbook-bench', import.meta.url))
  await mkdir(folder, { recursive: true })
  const path = join(folder, 'logParts.mjs')
  await writeFile(path, bundle.output[0].code)
  return import(pathToFileURL(path).href)
}

/** Writes a log of so many weighings, cylinder after cylinder in turn, with a checkpoint now and then. */
async function fillLog(db, sealing) {
  const heads = Array.from({ length: Math.ceil(EVENTS / EVENTS_A_CYLINDER) }, () => ({ cylinderId: randomUUID(), version: 0, hash: '' }))
  const actor = randomUUID()
  const begin = Date.UTC(2025, 0, 1)
  for (let seq = 1; seq <= EVENTS;) {
    const statements = []
    for (; statements.length < PAGE && seq <= EVENTS; seq++) {
      const head = heads[seq % heads.length]
      const at = begin + seq * 1_000
      const row = {
        seq, id: randomUUID(), cylinder_id: head.cylinderId, version: head.version + 1, device_id: 'phone-1', device_seq: seq, kind: 'weighed', occurred_at: at,
        occurred_offset_minutes: -300, clock_skew_seconds: 0, effective_at: at, recorded_at: at, actor_id: actor, posted_by: actor, supervisor_id: null,
        trainee: 0, place_id: null, body: JSON.stringify({ details: { gross: { unit: 'lb', value: 30 + seq % 300 / 10 } }, note: 'plant room, third floor' }),
        content_hash: sha256(String(seq)), prev_hash: head.hash,
      }
      row.hash = hashEvent(row, sha256)
      Object.assign(head, { version: row.version, hash: row.hash })
      statements.push({ sql: `INSERT INTO custody_events (${LOG_COLUMNS.join(', ')}) VALUES (${LOG_COLUMNS.map(() => '?').join(', ')})`, args: LOG_COLUMNS.map(column => row[column]) })
    }
    await db.write(statements)
    if (Math.floor(seq / EVENTS * CHECKPOINTS) > Math.floor((seq - PAGE) / EVENTS * CHECKPOINTS)) await makeCheckpoint(db, sealing, begin + seq * 1_000, null)
  }
}

/** Reads the same columns in the same order by the same client, and hashes each row: what no verifying can do without. */
async function readAndHash(db) {
  let after = ['', 0]
  let kept = 0
  for (;;) {
    const { rows } = await db.readClient.execute({
      sql: `SELECT ${LOG_COLUMNS.join(', ')} FROM custody_events WHERE (cylinder_id, version) > (?, ?) ORDER BY cylinder_id, version LIMIT ${PAGE}`, args: after,
    })
    for (const row of rows) kept += createHash('sha256').update(JSON.stringify(Array.from({ length: LOG_COLUMNS.length }, (_, index) => row[index]))).digest()[0]
    if (rows.length < PAGE) return kept
    after = [rows.at(-1)[2], rows.at(-1)[3]]
  }
}

/** Units: seconds of the processor. */
async function cpuOf(work) {
  const begin = process.cpuUsage()
  const result = await work()
  const { user, system } = process.cpuUsage(begin)
  return { seconds: (user + system) / 1e6, result }
}

function median(values) {
  return [...values].sort((a, b) => a - b)[Math.floor(values.length / 2)]
}

const folder = await mkdtemp(join(tmpdir(), 'collarbook-bench-'))
try {
  const db = await openDatabase(`file:${join(folder, 'log.db')}`)
  await db.migrate(fileURLToPath(new URL('../../drizzle/migrations', import.meta.url)))
  await db.write(['INSERT INTO firm (id, name, telephone, time_zone, units, created_at) VALUES (\'0198f000-0000-7000-8000-0000000000f1\', \'Bench\', \'555-0100\', \'UTC\', \'lb\', 0)'])
  const sealing = await testSealing(db)
  await fillLog(db, sealing)
  const floors = []
  const times = []
  let found
  for (let round = 0; round < ROUNDS; round++) {
    const floor = await cpuOf(() => readAndHash(db))
    if (!Number.isFinite(floor.result)) throw new Error('Nothing was hashed')
    floors.push(floor.seconds)
    const verified = await cpuOf(() => verifyLog(db, { now: 0, sealing }))
    if (!verified.result.ok || verified.result.checked !== EVENTS) throw new Error(`The log is not whole: ${JSON.stringify(verified.result)}`)
    times.push(verified.seconds)
    found = verified.result
  }
  const perEvent = seconds => `${(seconds / EVENTS * 1e6).toFixed(2)} µs`
  const ratio = median(times) / median(floors)
  console.info(`CPU: ${cpus()[0]?.model ?? 'not known'}, ${availableParallelism()} cores; Node ${process.version}`)
  console.info(`${found.checked.toLocaleString('en-US')} events of ${found.cylinders.toLocaleString('en-US')} cylinders, ${found.checkpoints} checkpoints; medians of ${ROUNDS} rounds in turn, processor time an event`)
  console.info(`Reading the columns and hashing them: ${perEvent(median(floors))}`)
  console.info(`Verifying chains, numbers, signatures, and the root at every checkpoint: ${perEvent(median(times))}`)
  console.info(`Ratio: ${ratio.toFixed(2)}, at most ${VERIFY_BOUND}`)
  db.close()
  process.exitCode = ratio <= VERIFY_BOUND ? 0 : 1
}
finally {
  await rm(folder, { recursive: true, force: true })
}
