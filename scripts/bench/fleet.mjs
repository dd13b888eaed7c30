// What a page of the fleet costs over a bare route with the same SELECT, in a small fleet and a large one: `npm run bench:fleet`.
import { mkdtemp, rm } from 'node:fs/promises'
import { Agent, get } from 'node:http'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import process from 'node:process'
import { bundled } from './bundle.mjs'
import { cpuOf, machine, median, startBare, startBuilt, stopAll } from './measured.mjs'

const OVER_BARE_BOUND = 2
const FLAT_BOUND = 1.3
const SIZES = [1_000, 100_000]
const PAGE = 100
const ROUNDS = 25
const WARM_UP_ROUNDS = 5
const REQUESTS_A_ROUND = 40
const LIST = `/api/cylinders?limit=${PAGE}`

const { TestClient, dateBounds, directory, fillFleet, fleetPage, fleetQuery, openDatabase, rowColumns, setUpFirm } = await bundled('fleetParts.mjs')

/** A firm with so many cylinders, served by the built server and, from the same file, by the bare route. */
async function served(size, folder) {
  const file = join(folder, `${size}.db`)
  const ours = await startBuilt(file)
  const admin = await setUpFirm(ours)
  const client = new TestClient(ours.baseUrl)
  await client.signIn(admin.email, admin.password)
  const places = []
  for (let number = 1; number <= 40; number++) places.push((await admin.client.post('/api/places', { name: `Van ${number}`, kind: 'van' })).body.id)
  await fillFleet(file, size, { places, holders: [admin.id], owner: admin.id })
  const cookie = [...client.cookies].map(([name, value]) => `${name}=${value}`).join('; ')

  const bare = await startBare('bareRoute.mjs', [file, JSON.stringify(await sameSelect(file))])
  return {
    size,
    ours: { ...ours, agent: new Agent({ keepAlive: true, maxSockets: 1 }), url: `${ours.baseUrl}${LIST}`, headers: { cookie, accept: 'application/json' } },
    bare: { ...bare, agent: new Agent({ keepAlive: true, maxSockets: 1 }), url: `${bare.baseUrl}/`, headers: {} },
  }
}

/** The statement of the first page, as our own route makes it. */
async function sameSelect(file) {
  const db = await openDatabase(`file:${file}`)
  const from = await directory(db)
  const now = Date.now()
  const statement = fleetPage(fleetQuery.parse({ limit: PAGE }), null, dateBounds(from, now), rowColumns(from, now))
  db.close()
  return statement
}

/** One answer's length, read to its end. Errors: rejects for anything but 200. */
function answer({ agent, url, headers }) {
  return new Promise((done, failed) => {
    get(url, { agent, headers }, (response) => {
      let length = 0
      response.on('data', part => length += part.length)
      response.on('end', () => response.statusCode === 200 ? done(length) : failed(new Error(`${url} answered ${response.statusCode}`)))
    }).on('error', failed)
  })
}

/** CPU time of the serving process for one request. Units: µs. */
async function costOf(server) {
  const before = await cpuOf(server)
  for (let request = 0; request < REQUESTS_A_ROUND; request++) {
    // A page of a hundred rows is some twenty thousand bytes at the least.
    if (await answer(server) < 20_000) throw new Error('The answer is no page of the fleet')
  }
  return (await cpuOf(server) - before) / REQUESTS_A_ROUND
}

const folder = await mkdtemp(join(tmpdir(), 'collarbook-bench-'))
try {
  const fleets = []
  for (const size of SIZES) fleets.push(await served(size, folder))
  const costs = new Map(fleets.flatMap(({ ours, bare }) => [[ours, []], [bare, []]]))
  for (let round = -WARM_UP_ROUNDS; round < ROUNDS; round++) {
    for (const [server, measured] of costs) {
      const cost = await costOf(server)
      if (round >= 0) measured.push(cost)
    }
  }
  console.info(`CPU: ${machine()}`)
  console.info(`CPU time of the server for one page of ${PAGE}; medians of ${ROUNDS} rounds of ${REQUESTS_A_ROUND}, in turn`)
  const medians = fleets.map(({ size, ours, bare }) => ({ size, ours: median(costs.get(ours)), bare: median(costs.get(bare)) }))
  for (const { size, ours, bare } of medians) {
    console.info(`${size} cylinders: ${ours.toFixed(0)} µs over ${bare.toFixed(0)} µs: ${(ours / bare).toFixed(2)}, at most ${OVER_BARE_BOUND}`)
  }
  const flat = medians.at(-1).ours / medians[0].ours
  console.info(`From ${SIZES[0]} to ${SIZES.at(-1)} cylinders: ${flat.toFixed(2)}, at most ${FLAT_BOUND}`)
  process.exitCode = medians.every(({ ours, bare }) => ours / bare <= OVER_BARE_BOUND) && flat <= FLAT_BOUND ? 0 : 1
}
finally {
  stopAll()
  await rm(folder, { recursive: true, force: true })
}
