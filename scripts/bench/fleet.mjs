// What a page of the fleet costs over a bare route with the same SELECT, in a small fleet and a large one: `npm run bench:fleet`.
import { fork } from 'node:child_process'
import { randomBytes } from 'node:crypto'
import { once } from 'node:events'
import { existsSync } from 'node:fs'
import { mkdir, mkdtemp, rm, writeFile } from 'node:fs/promises'
import { Agent, get } from 'node:http'
import { createServer } from 'node:net'
import { availableParallelism, cpus, tmpdir } from 'node:os'
import { join } from 'node:path'
import process from 'node:process'
import { fileURLToPath, pathToFileURL } from 'node:url'
import { build } from 'vite'

const OVER_BARE_BOUND = 2
const FLAT_BOUND = 1.3
const SIZES = [1_000, 100_000]
const PAGE = 100
const ROUNDS = 25
const WARM_UP_ROUNDS = 5
const REQUESTS_A_ROUND = 40
const LIST = `/api/cylinders?limit=${PAGE}`

const here = fileURLToPath(new URL('.', import.meta.url))
const builtServer = fileURLToPath(new URL('../../.output/server/index.mjs', import.meta.url))
if (!existsSync(builtServer)) throw new Error('There is no built server in .output: run `npm run build` first.')

const { TestClient, dateBounds, directory, fillFleet, fleetPage, fleetQuery, openDatabase, rowColumns, setUpFirm } = await parts()
const running = []

/** Our own modules as the server has them, in one bundle that finds its packages beside it. */
async function parts() {
  const bundle = await build({
    configFile: false, logLevel: 'warn', root: here, resolve: { alias: { '~~': fileURLToPath(new URL('../..', import.meta.url)) } },
    build: { ssr: 'fleetParts.mjs', write: false, minify: false, target: 'node20', rollupOptions: { output: { inlineDynamicImports: true } } },
  })
  const folder = fileURLToPath(new URL('../../node_modules/.cache/collarbook-bench', import.meta.url))
  await mkdir(folder, { recursive: true })
  const path = join(folder, 'fleetParts.mjs')
  await writeFile(path, bundle.output[0].code)
  return import(pathToFileURL(path).href)
}

function start(module, args = [], env = {}) {
  const child = fork(module, args, { env: { PATH: process.env.PATH, NODE_ENV: 'production', ...env }, execArgv: ['--import', pathToFileURL(join(here, 'cpuMeter.mjs')).href], silent: true })
  running.push(child)
  return child
}

/** A firm with so many cylinders, served by the built server and, from the same file, by the bare route. */
async function served(size, folder) {
  const port = await freePort()
  const baseUrl = `http://127.0.0.1:${port}`
  const file = join(folder, `${size}.db`)
  const child = start(builtServer, [], {
    PORT: String(port), HOST: '127.0.0.1', PUBLIC_URL: baseUrl, DATABASE_URL: `file:${file}`, NUXT_SESSION_PASSWORD: randomBytes(32).toString('hex'),
  })
  let printed = ''
  child.stdout.on('data', text => printed += text)
  child.stderr.on('data', text => printed += text)
  await healthy(child, baseUrl, () => printed)
  const admin = await setUpFirm({ baseUrl, setUpToken: () => /setup\?token=([\w-]{43})/.exec(printed)?.[1] ?? '' })
  const client = new TestClient(baseUrl)
  await client.signIn(admin.email, admin.password)
  const places = []
  for (let number = 1; number <= 40; number++) places.push((await admin.client.post('/api/places', { name: `Van ${number}`, kind: 'van' })).body.id)
  await fillFleet(file, size, { places, holders: [admin.id], owner: admin.id })
  const cookie = [...client.cookies].map(([name, value]) => `${name}=${value}`).join('; ')

  const bare = start(join(here, 'bareRoute.mjs'), [file, JSON.stringify(await sameSelect(file))])
  const [{ port: barePort }] = await once(bare, 'message')
  return {
    size,
    ours: { child, agent: new Agent({ keepAlive: true, maxSockets: 1 }), url: `${baseUrl}${LIST}`, headers: { cookie, accept: 'application/json' } },
    bare: { child: bare, agent: new Agent({ keepAlive: true, maxSockets: 1 }), url: `http://127.0.0.1:${barePort}/`, headers: {} },
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

async function healthy(child, baseUrl, printed) {
  for (let tries = 0; tries < 600 && child.exitCode === null; tries++) {
    if ((await fetch(`${baseUrl}/api/health`).catch(() => null))?.ok) return
    await new Promise(done => setTimeout(done, 100))
  }
  throw new Error(`The server did not come up:\n${printed()}`)
}

async function freePort() {
  const server = createServer().listen(0, '127.0.0.1')
  await once(server, 'listening')
  const { port } = server.address()
  server.close()
  await once(server, 'close')
  return port
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

async function cpuOf({ child }) {
  child.send('cpu')
  const [{ cpuMicroseconds }] = await once(child, 'message')
  return cpuMicroseconds
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

function median(values) {
  return [...values].sort((a, b) => a - b)[Math.floor(values.length / 2)]
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
  console.info(`CPU: ${cpus()[0]?.model ?? 'not known'}, ${availableParallelism()} cores; Node ${process.version}`)
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
  for (const child of running) child.kill()
  await rm(folder, { recursive: true, force: true })
}
