import { createHash } from 'node:crypto'
import { rmSync } from 'node:fs'
import { connect, createServer, type Server } from 'node:net'
import { tmpdir } from 'node:os'
import { join, resolve } from 'node:path'
import { setTimeout as wait } from 'node:timers/promises'

/** A server that is being restarted may still be on its way out: how long, and how often, it is looked for again. */
const PATIENCE_MS = 2_000
const LOOK_EVERY_MS = 100

/** A longer socket path is refused by the system (108 bytes on Linux). */
const LONGEST_SOCKET_PATH = 100

/**
 * Makes sure that this is the only process serving a database file, for as long as it lives.
 * A listening socket is the lock: it ends with its process, so that a killed server leaves no stale one.
 *
 * Errors: rejects when another process holds the file.
 */
export async function holdDatabaseFile(file: string): Promise<Server> {
  const path = socketPath(file)
  if (await staysHeld(path)) throw new Error(`Another process is serving ${file}. Stop it first: a local database file has one server.`)
  rmSync(path, { force: true })
  const server = createServer(socket => socket.end())
  await new Promise<void>((done, failed) => {
    server.once('error', failed)
    server.listen(path, done)
  })
  server.unref()
  return server
}

/** Whether a process serves a database file just now. */
export function isFileHeld(file: string): Promise<boolean> {
  return staysHeld(socketPath(file))
}

async function staysHeld(path: string): Promise<boolean> {
  for (let waited = 0; await answers(path); waited += LOOK_EVERY_MS) {
    if (waited >= PATIENCE_MS) return true
    await wait(LOOK_EVERY_MS)
  }
  return false
}

function socketPath(file: string): string {
  const beside = `${resolve(file)}.lock`
  if (Buffer.byteLength(beside) <= LONGEST_SOCKET_PATH) return beside
  return join(tmpdir(), `collarbook-${createHash('sha256').update(beside).digest('hex').slice(0, 24)}.lock`)
}

function answers(path: string): Promise<boolean> {
  return new Promise((done) => {
    const socket = connect(path)
    socket.once('connect', () => {
      socket.destroy()
      done(true)
    })
    socket.once('error', () => done(false))
  })
}
