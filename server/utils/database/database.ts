import { accessSync, constants, mkdirSync, statSync } from 'node:fs'
import { dirname } from 'node:path'
import { setTimeout as wait } from 'node:timers/promises'
import { createClient, type Client, type InStatement, type ResultSet } from '@libsql/client'
import { drizzle, type LibSQLDatabase } from 'drizzle-orm/libsql'
import * as schema from '../../../drizzle/schema'
import { localPath } from './localPath'
import { StorageUnavailable, storageFailure } from './storageFailure'

/** The custody database: any number of readers, one writer. */
export interface Database {
  /** For reads only. */
  read: LibSQLDatabase<typeof schema>
  readClient: Client
  /**
   * Runs the statements in one write transaction, after every write that was asked for before.
   * Resolves only when they are durable; rejects with nothing of them stored.
   */
  write: (statements: InStatement[]) => Promise<ResultSet[]>
  /** How many writes were tried so far: while it stays, nothing of ours has changed. */
  writes: () => number
  /** Holds the writer's queue while work runs: for a read that a write depends on. */
  exclusive: <T>(work: (commit: Database['write']) => Promise<T>) => Promise<T>
  migrate: (folder: string) => Promise<void>
  /** Resolves where it can be read and, as far as the last write tells, written; rejects where not. */
  probe: () => Promise<void>
  close: () => void
  /** The database file, or null on a server. */
  file: string | null
}

/** A busy wait stops the whole process, so it stays short and most of the waiting happens outside the driver. */
const BUSY_WAIT_MS = 50
const LONGEST_BETWEEN_TRIES_MS = 400
const BUSY_PATIENCE_MS = 6_000

/** Where the disk is full a small write may still fit: only after this does a probe's own write speak against a failure. */
const FAILURE_COUNTS_MS = 10_000

/** A drizzle query as a statement for {@link Database.write}. */
export function statement(query: { toSQL: () => { sql: string, params: unknown[] } }): InStatement {
  const { sql, params } = query.toSQL()
  return { sql, args: params as never[] }
}

/**
 * Opens a database by URL: `file:` for a local file, `libsql:` or `http(s):` for a server.
 *
 * The local driver acknowledges writes that it then loses when a statement met SQLITE_BUSY before them on the same
 * connection. So writes go only through one queue, on a client with one connection, as one batch in write mode,
 * and after any BUSY the connection is thrown away before anything else is done with it.
 */
export async function openDatabase(url: string, authToken?: string): Promise<Database> {
  const file = url.startsWith('file:') ? localPath(url) : null
  if (file) mkdirSync(dirname(file), { recursive: true })
  const options = { url, authToken: authToken || undefined }
  const writer = createClient({ ...options, concurrency: 1, timeout: BUSY_WAIT_MS })
  const readClient = createClient({ ...options, concurrency: 4, timeout: BUSY_WAIT_MS })
  if (file) await writer.execute('PRAGMA journal_mode = WAL')

  let tail: Promise<unknown> = Promise.resolve()
  function enqueue<T>(work: () => Promise<T>): Promise<T> {
    const next = tail.then(work, work)
    tail = next.catch(() => undefined)
    return next
  }

  const refuseIfGone = file ? sameFile(file) : () => undefined
  let failedAt: number | null = null
  let writes = 0

  async function commit(statements: InStatement[]): Promise<ResultSet[]> {
    if (statements.length === 0) return []
    try {
      refuseIfGone()
      const results = await insist(statements)
      // What was written into a file that has lost its name is gone with the process.
      refuseIfGone()
      failedAt = null
      return results
    }
    catch (error) {
      if (storageFailure(error)) failedAt = Date.now()
      throw error
    }
    finally {
      writes++
    }
  }

  async function insist(statements: InStatement[]): Promise<ResultSet[]> {
    const until = Date.now() + BUSY_PATIENCE_MS
    // Each connection thrown away may keep its file open: so fewer tries the longer it takes.
    for (let attempt = 1; ; attempt++) {
      try {
        return await writer.batch(statements, 'write')
      }
      catch (error) {
        if (attempt === 1 && mayWriteAgain(error, file)) {
          await writer.reconnect()
          continue
        }
        if (!isBusy(error)) throw error
        await writer.reconnect()
        if (Date.now() >= until) throw error
        await wait(Math.min(LONGEST_BETWEEN_TRIES_MS, 50 * attempt))
      }
    }
  }

  async function probe(): Promise<void> {
    refuseIfGone()
    await readClient.batch(['SELECT count(*) FROM firm', 'SELECT id FROM custody_events ORDER BY seq DESC LIMIT 1'], 'read')
    if (failedAt === null) return
    if (Date.now() - failedAt < FAILURE_COUNTS_MS) throw new StorageUnavailable('A write has failed just now')
    await enqueue(() => commit(['UPDATE firm SET name = name']))
  }

  return {
    read: drizzle(readClient, { schema }),
    readClient,
    write: statements => enqueue(() => commit(statements)),
    writes: () => writes,
    exclusive: work => enqueue(() => work(commit)),
    migrate: folder => enqueue(() => migrateTo(writer, folder)),
    probe,
    close() {
      writer.close()
      readClient.close()
    },
    file,
  }
}

/** Throws where a file is no longer the one that it is now: moved, removed, or another in its place. */
function sameFile(file: string): () => void {
  const { dev, ino } = statSync(file)
  return () => {
    const now = statSync(file, { throwIfNoEntry: false })
    if (now?.dev !== dev || now.ino !== ino) throw new StorageUnavailable(`The database file ${file} was moved, removed or replaced`)
  }
}

async function migrateTo(client: Client, migrationsFolder: string): Promise<void> {
  const { migrate } = await import('drizzle-orm/libsql/migrator')
  await migrate(drizzle(client), { migrationsFolder })
}

/** Whether a connection was made while its file was read-only, which it stays, and the file is no longer. */
function mayWriteAgain(error: unknown, file: string | null): boolean {
  if (file === null || !(error as { code?: string }).code?.startsWith('SQLITE_READONLY')) return false
  try {
    accessSync(file, constants.W_OK)
    return true
  }
  catch {
    return false
  }
}

/** Whether another holder of the file's write lock was in the way. */
function isBusy(error: unknown): boolean {
  const { code, message } = error as { code?: string, message?: string }
  return code === 'SQLITE_BUSY' || code === 'SQLITE_LOCKED'
    || /database is locked|statements in progress/.test(message ?? '')
}
