// What recording costs a server: one event to a post, and fifty, over a bare insert of the same rows.
import { once } from 'node:events'
import { Agent, request } from 'node:http'
import { cpuOf, median } from './measured.mjs'

const CLIENTS = 20
const POSTS_A_ROUND = 400
const EVENTS_A_POST = 50
const LARGE_POSTS_A_ROUND = 10
const WARM_UP_ROUNDS = 2

/** Events as a phone would send them, each on another cylinder of those given: weighings, moves, fills and draws in turn. */
export function eventMaker({ lb, madeId }, cylinderIds, { shop, van }) {
  let made = 0
  return () => {
    const number = made++
    const now = Date.now()
    const gross = lb(46 + number % 30 / 10)
    const happening = [
      { kind: 'weighed', details: { gross } },
      { kind: 'moved', details: { toPlaceId: number % 8 < 4 ? van : shop } },
      { kind: 'filled', details: { refrigerant: 'R-410A', condition: 'clean', grossAfter: gross, looked: true } },
      { kind: 'drawn', details: { grossAfter: gross, purpose: 'same-system' } },
    ][number % 4]
    return {
      id: madeId(now, `posted ${now} ${number}`), cylinderId: cylinderIds[number % cylinderIds.length], occurredAt: new Date(now).toISOString(),
      deviceId: 'phone-2', deviceSeq: 10_000_000 + number, note: 'plant room, third floor', ...happening,
    }
  }
}

/**
 * Processor time of a server for one event posted alone, by twenty at once; ours and the bare one's in turn.
 *
 * @returns medians in µs.
 */
export async function singlePosts({ ours, bare, nextEvent, rounds }) {
  const costs = { ours: [], bare: [] }
  for (let round = -WARM_UP_ROUNDS; round < rounds; round++) {
    for (const [name, server] of [['ours', ours], ['bare', bare]]) {
      const posts = Array.from({ length: POSTS_A_ROUND }, () => JSON.stringify({ events: [nextEvent()] }))
      const before = await cpuOf(server)
      await together(posts, text => posted(server, server.path ?? '/one', text))
      const cost = (await cpuOf(server) - before) / POSTS_A_ROUND
      if (round >= 0) costs[name].push(cost)
    }
  }
  return { ours: median(costs.ours), bare: median(costs.bare) }
}

/**
 * Processor time of a server for a post of fifty events on fifty cylinders. The bare one writes the very rows that ours
 * wrote, of the log and of every cache; it has them beforehand, so that only their writing counts.
 *
 * @param rowsWritten what ours has written after a number of the log, as statements for the bare one.
 * @returns medians in µs, and how many rows a post wrote.
 */
export async function largePosts({ ours, bare, nextEvent, rowsWritten, rounds }) {
  const costs = { ours: [], bare: [] }
  let rows = 0
  for (let round = -WARM_UP_ROUNDS; round < rounds; round++) {
    const posts = Array.from({ length: LARGE_POSTS_A_ROUND }, () => Array.from({ length: EVENTS_A_POST }, nextEvent))
    const written = []
    let taken = 0
    for (const events of posts) {
      const before = await cpuOf(ours)
      const { results } = JSON.parse(await posted(ours, ours.path, JSON.stringify({ events })))
      taken += await cpuOf(ours) - before
      written.push(await rowsWritten(results[0].seq - 1))
    }
    for (const [index, statements] of written.entries()) {
      bare.child.send({ key: posts[index][0].id, statements })
      await once(bare.child, 'message')
    }
    const before = await cpuOf(bare)
    for (const events of posts) await posted(bare, '/many', JSON.stringify({ events }))
    const bareTaken = await cpuOf(bare) - before
    if (round < 0) continue
    costs.ours.push(taken / LARGE_POSTS_A_ROUND)
    costs.bare.push(bareTaken / LARGE_POSTS_A_ROUND)
    rows = written.at(-1).length
  }
  return { ours: median(costs.ours), bare: median(costs.bare), rows }
}

/** Runs the work on each item, some at once. */
async function together(items, work) {
  const left = items.values()
  await Promise.all(Array.from({ length: CLIENTS }, async () => {
    for (const item of left) await work(item)
  }))
}

const agents = new WeakMap()

/** Posts and answers the text. Errors: rejects for anything but 200, and for an event that was not accepted. */
function posted(server, path, text) {
  if (!agents.has(server)) agents.set(server, new Agent({ keepAlive: true, maxSockets: CLIENTS }))
  return new Promise((done, failed) => {
    const sending = request(`${server.baseUrl}${path}`, {
      method: 'POST', agent: agents.get(server),
      headers: { 'content-type': 'application/json', 'content-length': Buffer.byteLength(text), 'sec-fetch-site': 'same-origin', ...server.headers },
    }, (response) => {
      let answer = ''
      response.setEncoding('utf8')
      response.on('data', part => answer += part)
      response.on('end', () => {
        if (response.statusCode === 200 && !answer.includes('"outcome":"refused"')) done(answer)
        else failed(new Error(`${path} answered ${response.statusCode}: ${answer.slice(0, 500)}`))
      })
    })
    // A server may close a connection that was idle for some seconds just as it is taken up again.
    sending.on('error', error => sending.reusedSocket && error.code === 'ECONNRESET' ? posted(server, path, text).then(done, failed) : failed(error))
    sending.end(text)
  })
}
