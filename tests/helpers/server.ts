import { spawn, type ChildProcess } from 'node:child_process'
import { existsSync, mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join, resolve } from 'node:path'
import { setTimeout as wait } from 'node:timers/promises'
import { getPort } from 'get-port-please'

const BUILT = resolve('.output/server/index.mjs')
const START_PATIENCE_MS = 60_000
const SESSION_PASSWORD = 'b7e1c94a5d20f3886a4e0c17d95f2b63'
/** In use one password takes most of a second of a core, which every person of every test would pay. */
const CHEAP_PASSWORDS = { NUXT_HASH_SCRYPT_COST: '1024' }

/** A built server that runs for a test, with a database of its own. */
export interface TestServer {
  baseUrl: string
  folder: string
  databaseFile: string
  /** What it has printed so far. */
  output: () => string
  /** The first set-up link it printed. */
  setUpToken: () => string
  /** The id of its process. */
  pid: () => number
  /** Ends it at once (SIGKILL), and leaves its folder. */
  kill: () => Promise<void>
  stop: () => Promise<void>
  /** Starts it again on the same database. */
  restart: () => Promise<void>
}

export interface StartOptions {
  env?: Record<string, string>
  /** An existing folder with its database, to go on with. */
  folder?: string
  /** A command that it is started by, with its arguments: one that takes rights away. */
  by?: readonly string[]
  /** Passwords cost what they cost in use: for tests of that cost, and of the time that it takes. */
  dearPasswords?: boolean
}

/** Starts the built server on a free port and waits until it answers. */
export async function startServer({ env = {}, folder = mkdtempSync(join(tmpdir(), 'collarbook-')), by = [], dearPasswords = false }: StartOptions = {}): Promise<TestServer> {
  const port = await getPort({ host: '127.0.0.1', random: true })
  const baseUrl = `http://localhost:${port}`
  const databaseFile = join(folder, 'collarbook.db')
  const settings = serverSettings({ PORT: String(port), HOST: 'localhost', DATABASE_URL: `file:${databaseFile}`, PUBLIC_URL: baseUrl, ...(!dearPasswords && CHEAP_PASSWORDS), ...env })
  let printed = ''
  let child: ChildProcess

  async function launch(): Promise<void> {
    child = spawnServer(settings, by)
    child.stdout?.on('data', data => printed += data)
    child.stderr?.on('data', data => printed += data)
    await answering(baseUrl, child, () => printed)
  }
  async function end(): Promise<void> {
    if (child.exitCode !== null || child.signalCode !== null) return
    const ended = new Promise(done => child.once('exit', done))
    child.kill('SIGKILL')
    await ended
  }

  await launch()
  return {
    baseUrl,
    folder,
    databaseFile,
    output: () => printed,
    pid: () => child.pid ?? 0,
    kill: end,
    setUpToken: () => /setup\?token=([\w-]{43})/.exec(printed)?.[1] ?? '',
    async stop() {
      await end()
      rmSync(folder, { recursive: true, force: true })
    },
    async restart() {
      await end()
      await launch()
    },
  }
}

/** Starts the built server with settings that must be refused; answers how it ended and what it said. */
export function refusedStart(env: Record<string, string>): Promise<{ code: number | null, output: string }> {
  const child = spawnServer(serverSettings(env))
  let output = ''
  child.stdout?.on('data', data => output += data)
  child.stderr?.on('data', data => output += data)
  const late = setTimeout(() => child.kill('SIGKILL'), START_PATIENCE_MS)
  return new Promise(done => child.once('exit', (code) => {
    clearTimeout(late)
    done({ code, output })
  }))
}

function serverSettings(env: Record<string, string>): NodeJS.ProcessEnv {
  // Nothing of the surroundings but what a process needs to run: a developer's own settings must not decide a test.
  return { PATH: process.env.PATH, HOME: process.env.HOME, NODE_ENV: 'production', NUXT_SESSION_PASSWORD: SESSION_PASSWORD, ...env } as NodeJS.ProcessEnv
}

function spawnServer(env: NodeJS.ProcessEnv, by: readonly string[] = []): ChildProcess {
  if (!existsSync(BUILT)) throw new Error('There is no built server in .output: run `npm run build` first.')
  const [command = process.execPath, ...args] = [...by, process.execPath, BUILT]
  return spawn(command, args, { env, stdio: ['ignore', 'pipe', 'pipe'] })
}

async function answering(baseUrl: string, child: ChildProcess, printed: () => string): Promise<void> {
  const until = Date.now() + START_PATIENCE_MS
  while (Date.now() < until) {
    if (child.exitCode !== null) throw new Error(`The server ended with code ${child.exitCode}:\n${printed()}`)
    if (await fetch(`${baseUrl}/api/health`).catch(() => null)) return
    await wait(50)
  }
  child.kill('SIGKILL')
  throw new Error(`The server did not answer in ${START_PATIENCE_MS / 1000} s:\n${printed()}`)
}
