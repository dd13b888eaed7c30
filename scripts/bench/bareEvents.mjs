// A server that inserts what it is sent and nothing else: what `bench:log` holds the recording of events to.
//
// POST /one writes a row with the columns of the custody log; all that comes in one turn of the loop is one commit.
// POST /many writes the rows that were given beforehand over the process's own channel, as one commit.
import { createServer } from 'node:http'
import process from 'node:process'
import { setImmediate as nextTurn } from 'node:timers/promises'
import { createClient } from '@libsql/client'
import { createApp, createRouter, eventHandler, readBody, toNodeListener } from 'h3'

const [file, logColumns] = process.argv.slice(2)
const columns = JSON.parse(logColumns).filter(column => column !== 'seq')
const client = createClient({ url: `file:${file}`, concurrency: 1 })
const insertOne = `INSERT INTO custody_events (${columns.join(', ')}) VALUES (${columns.map(() => '?').join(', ')})`
const HASH = 'a'.repeat(64)

let waiting = []

function commitTogether(row) {
  return new Promise((done, failed) => {
    waiting.push({ row, done, failed })
    if (waiting.length === 1) void drain()
  })
}

async function drain() {
  await nextTurn()
  const taken = waiting
  waiting = []
  try {
    await client.batch(taken.map(({ row }) => ({ sql: insertOne, args: row })), 'write')
    for (const { done } of taken) done()
  }
  catch (error) {
    for (const { failed } of taken) failed(error)
  }
}

function rowOf(event, text, now) {
  const at = Date.parse(event.occurredAt)
  const given = {
    id: event.id, cylinder_id: event.cylinderId, version: event.deviceSeq, device_id: event.deviceId, device_seq: event.deviceSeq, kind: event.kind,
    occurred_at: at, occurred_offset_minutes: 0, clock_skew_seconds: 0, effective_at: at, recorded_at: now, actor_id: event.cylinderId, posted_by: event.cylinderId,
    supervisor_id: null, trainee: 0, place_id: null, body: text, content_hash: HASH, prev_hash: HASH, hash: HASH,
  }
  return columns.map(column => given[column])
}

const prepared = new Map()
process.on('message', ({ key, statements }) => {
  if (!statements) return
  prepared.set(key, statements)
  process.send({ prepared: key })
})

const router = createRouter()
router.post('/one', eventHandler(async (event) => {
  const { events: [posted] } = await readBody(event)
  await commitTogether(rowOf(posted, JSON.stringify(posted), Date.now()))
  return { results: [{ id: posted.id, outcome: 'accepted' }] }
}))
router.post('/many', eventHandler(async (event) => {
  const { events } = await readBody(event)
  const key = events[0].id
  await client.batch(prepared.get(key), 'write')
  prepared.delete(key)
  return { results: events.map(({ id }) => ({ id, outcome: 'accepted' })) }
}))

await client.execute('PRAGMA journal_mode = WAL')
await client.execute('DROP TRIGGER IF EXISTS custody_events_no_replace')
const server = createServer(toNodeListener(createApp().use(router)))
server.listen(0, '127.0.0.1', () => process.send({ port: server.address().port }))
