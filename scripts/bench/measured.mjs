// Servers that are measured: their starting, and the processor time that each takes.
import { fork } from 'node:child_process'
import { randomBytes } from 'node:crypto'
import { once } from 'node:events'
import { existsSync } from 'node:fs'
import { createServer } from 'node:net'
import { availableParallelism, cpus } from 'node:os'
import { join } from 'node:path'
import process from 'node:process'
import { fileURLToPath, pathToFileURL } from 'node:url'

const here = fileURLToPath(new URL('.', import.meta.url))
const builtServer = fileURLToPath(new URL('../../.output/server/index.mjs', import.meta.url))

/** A log of this size may be brought to another shape at the start, so ten minutes; looked at each tenth of a second. */
const HEALTH_TRIES = 6_000
/** What an idle server takes in a second at most. */
const QUIET_MICROSECONDS = 50_000

const running = []

/** A process that tells its processor time when asked. */
function start(module, args = [], env = {}) {
  const child = fork(module, args, { env: { PATH: process.env.PATH, NODE_ENV: 'production', ...env }, execArgv: ['--import', pathToFileURL(join(here, 'cpuMeter.mjs')).href], silent: true })
  running.push(child)
  return child
}

/** The built server on a database file, once it is healthy. */
export async function startBuilt(file) {
  if (!existsSync(builtServer)) throw new Error('There is no built server in .output: run `npm run build` first.')
  const port = await freePort()
  const baseUrl = `http://127.0.0.1:${port}`
  const child = start(builtServer, [], {
    PORT: String(port), HOST: '127.0.0.1', PUBLIC_URL: baseUrl, DATABASE_URL: `file:${file}`, NUXT_SESSION_PASSWORD: randomBytes(32).toString('hex'),
  })
  let printed = ''
  child.stdout.on('data', text => printed += text)
  child.stderr.on('data', text => printed += text)
  await healthy(child, baseUrl, () => printed)
  return { child, baseUrl, setUpToken: () => /setup\?token=([\w-]{43})/.exec(printed)?.[1] ?? '' }
}

/** A bare server of this folder, once it says at which port it listens. */
export async function startBare(name, args) {
  const child = start(join(here, name), args)
  let printed = ''
  child.stderr.on('data', text => printed += text)
  const ended = once(child, 'exit').then(() => {
    throw new Error(`${name} ended:\n${printed}`)
  })
  const [{ port }] = await Promise.race([once(child, 'message'), ended])
  ended.catch(() => undefined)
  return { child, baseUrl: `http://127.0.0.1:${port}` }
}

export async function stop({ child }) {
  if (child.exitCode !== null) return
  child.kill()
  await once(child, 'exit')
}

/** Ends whatever still runs. */
export function stopAll() {
  for (const child of running) child.kill()
}

/** Processor time that a process has taken. Units: µs. */
export async function cpuOf({ child }) {
  child.send('cpu')
  const [{ cpuMicroseconds }] = await once(child, 'message')
  return cpuMicroseconds
}

/** Waits until a server has done with what it does at its start. */
export async function quiet(server) {
  for (let before = await cpuOf(server); ;) {
    await new Promise(done => setTimeout(done, 1_000))
    const now = await cpuOf(server)
    if (now - before < QUIET_MICROSECONDS) return
    before = now
  }
}

/** The machine, as every figure names it. */
export function machine() {
  return `${cpus()[0]?.model ?? 'not known'}, ${availableParallelism()} cores; Node ${process.version}`
}

export function median(values) {
  return [...values].sort((a, b) => a - b)[Math.floor(values.length / 2)]
}

async function healthy(child, baseUrl, printed) {
  for (let tries = 0; tries < HEALTH_TRIES && child.exitCode === null; tries++) {
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
