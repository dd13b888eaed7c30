// What recording events, making the caches again and verifying cost over the barest way to the same: `npm run bench:log`.
//
// The log is made once and kept in the system's temporary folder. `--small` makes a small one for a quick look; further
// words choose what is measured: verify, rebuild, split, single, large.
import { existsSync } from 'node:fs'
import { copyFile, mkdir, mkdtemp, rename, rm } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import process from 'node:process'
import { bundled } from './bundle.mjs'
import { rowsWritten } from './logRows.mjs'
import { eventMaker, largePosts, singlePosts } from './logPosts.mjs'
import { rebuilding } from './logRebuild.mjs'
import { stepsOfRecording } from './logSplit.mjs'
import { verifying } from './logVerify.mjs'
import { machine, quiet, startBare, startBuilt, stop, stopAll } from './measured.mjs'

const SINGLE_BOUND = 5
const LARGE_BOUND = 2.5
const HALF_THE_SPEED = 2

const words = process.argv.slice(2)
const isSmall = words.includes('--small')
const isWanted = what => words.every(word => word.startsWith('--')) || words.includes(what)
const CYLINDERS = isSmall ? 2_000 : 100_000
// Going through a million events takes minutes: BENCH_ROUNDS says how often each is done.
const POST_ROUNDS = Number(process.env.BENCH_ROUNDS ?? 9)
const WALK_ROUNDS = Number(process.env.BENCH_ROUNDS ?? (isSmall ? 5 : 3))

const parts = await bundled('logParts.mjs')
const { ADMIN, addMember, bringCachesToShape, EVENTS_A_CYLINDER, LOG_COLUMNS, makeLog, openDatabase, PASSWORD, setUpFirm, TestClient, testSealing } = parts
const EVENTS = CYLINDERS * EVENTS_A_CYLINDER

/** The file of a firm with a log of that size; made where it is not there yet. */
async function keptLog() {
  const folder = join(tmpdir(), 'collarbook-bench')
  const kept = join(folder, `log-${EVENTS}.db`)
  if (existsSync(kept)) return kept
  await mkdir(folder, { recursive: true })
  const making = await mkdtemp(join(folder, 'making-'))
  const file = join(making, 'log.db')
  const server = await startBuilt(file)
  const admin = await setUpFirm(server)
  await addMember(admin, 'Wren', ['warehouse'])
  for (const [name, kind] of [['Shop', 'shop'], ['Van 1', 'van']]) await admin.client.post('/api/places', { name, kind })
  await stop(server)
  const db = await openDatabase(`file:${file}`)
  await makeLog(db, CYLINDERS, { ...await setting(db), nowMs: Date.now() }, await testSealing(db), what => console.info(`Making the log: ${what}`))
  await db.readClient.execute('PRAGMA wal_checkpoint(TRUNCATE)')
  db.close()
  await rename(file, kept)
  await rm(making, { recursive: true })
  return kept
}

/** What an older version made beside the log is made again once, and not by each server that is measured. */
async function broughtToShape(file) {
  const db = await openDatabase(`file:${file}`)
  await db.migrate('drizzle/migrations')
  await bringCachesToShape(db)
  await db.readClient.execute('PRAGMA wal_checkpoint(TRUNCATE)')
  db.close()
}

/** Where things happen in the made log, and who records them. */
async function setting(db) {
  const { rows: places } = await db.readClient.execute('SELECT kind, id FROM places WHERE kind IN (\'shop\', \'van\')')
  const { rows: people } = await db.readClient.execute('SELECT id FROM people WHERE roles LIKE \'%warehouse%\'')
  return { ...Object.fromEntries(places.map(row => [row[0], row[1]])), access: { personId: people[0][0], roles: ['warehouse'], trainee: false } }
}

/** Every cylinder, neighbours far apart. */
async function scatteredCylinders(db) {
  const { rows } = await db.readClient.execute('SELECT id FROM cylinders ORDER BY id')
  return rows.map((_, index) => rows[index * 7_919 % rows.length][0])
}

function tell(what, { ours, bare }, unit, bound) {
  const ratio = ours / bare
  console.info(`${what}: ${unit(ours)} over ${unit(bare)}: ${ratio.toFixed(2)}, at most ${bound}`)
  if (ratio > bound) process.exitCode = 1
}

const microseconds = cost => `${cost.toFixed(0)} µs`
const anEvent = seconds => `${(seconds / EVENTS * 1e6).toFixed(1)} µs`

const kept = await keptLog()
await broughtToShape(kept)
const folder = await mkdtemp(join(tmpdir(), 'collarbook-bench-'))
try {
  const file = join(folder, 'ours.db')
  await copyFile(kept, file)
  const db = await openDatabase(`file:${file}`)
  const around = await setting(db)
  const nextEvent = eventMaker(parts, await scatteredCylinders(db), around)
  console.info(`CPU: ${machine()}`)
  console.info(`${CYLINDERS.toLocaleString('en-US')} cylinders, ${EVENTS.toLocaleString('en-US')} events; processor time, medians of ${POST_ROUNDS} rounds of posts and ${WALK_ROUNDS} of the walks, in turn`)

  if (isWanted('verify')) {
    const { found, ...costs } = await verifying({ db, parts, sealing: await testSealing(db), rounds: WALK_ROUNDS, events: EVENTS })
    tell(`Verifying with ${found.checkpoints} checkpoints over reading the columns and hashing them, an event`, costs, anEvent, HALF_THE_SPEED)
  }
  if (isWanted('rebuild')) {
    const costs = await rebuilding({ db, parts, rounds: WALK_ROUNDS, events: EVENTS })
    tell('Making the caches again over a plain loop that scans, parses, folds and writes the same rows, an event', costs, anEvent, HALF_THE_SPEED)
  }
  if (isWanted('split')) {
    const steps = await stepsOfRecording({ db, parts, nextEvent, access: around.access })
    console.info(`Recording by steps, an event in a commit of twenty: ${steps.map(({ step, cost }) => `${step} ${microseconds(cost)}`).join(', ')}`)
  }
  if (isWanted('single') || isWanted('large')) {
    const bareFile = join(folder, 'bare.db')
    await copyFile(kept, bareFile)
    const server = await startBuilt(file)
    const client = new TestClient(server.baseUrl)
    await client.signIn(`wren@${ADMIN.email.split('@')[1]}`, PASSWORD)
    const cookie = [...client.cookies].map(([name, value]) => `${name}=${value}`).join('; ')
    const ours = { ...server, path: '/api/events', headers: { cookie } }
    const bare = { ...await startBare('bareEvents.mjs', [bareFile, JSON.stringify(LOG_COLUMNS)]), headers: {} }
    await quiet(ours)
    if (isWanted('single')) {
      tell('POST /api/events over a bare insert, one event a post, twenty at once', await singlePosts({ ours, bare, nextEvent, rounds: POST_ROUNDS }), microseconds, SINGLE_BOUND)
    }
    if (isWanted('large')) {
      const { rows, ...costs } = await largePosts({ ours, bare, nextEvent, rowsWritten: since => rowsWritten(db, LOG_COLUMNS, since), rounds: POST_ROUNDS })
      tell(`A post of 50 events over a bare batch of the same ${rows} rows`, costs, microseconds, LARGE_BOUND)
    }
  }
  db.close()
}
finally {
  stopAll()
  await rm(folder, { recursive: true, force: true })
}
