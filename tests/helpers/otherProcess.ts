import { execFileSync, spawn } from 'node:child_process'
import { once } from 'node:events'

// Locks of a file are a process's own: a second client in the test's process would break what is tested, so each of these is another one.

/** A process that holds the write lock of a database file, and lets it go, again and again. */
export interface Locker {
  /** Resolves once it holds the lock for the first time. */
  isHolding: Promise<unknown>
  /** Resolves when it has ended; answers how often it held the lock. */
  ended: Promise<number>
}

/** Takes the write lock for each of these times in turn, in milliseconds, with a pause between. */
export function takeWriteLock(file: string, holdsMs: readonly number[], pauseMs = 0): Locker {
  const child = spawn(process.execPath, ['--input-type=module', '-e', `
    import { setTimeout as wait } from 'node:timers/promises'
    import { createClient } from '@libsql/client'
    const [file, holds, pause] = process.argv.slice(1)
    const client = createClient({ url: 'file:' + file, timeout: 10_000 })
    for (const hold of JSON.parse(holds)) {
      const transaction = await client.transaction('write')
      console.log('held')
      await wait(hold)
      await transaction.rollback()
      await wait(Number(pause))
    }
  `, file, JSON.stringify(holdsMs), String(pauseMs)], { stdio: ['ignore', 'pipe', 'inherit'] })
  let printed = ''
  child.stdout.on('data', data => printed += data)
  return {
    isHolding: once(child.stdout, 'data'),
    ended: once(child, 'close').then(() => printed.split('held').length - 1),
  }
}

/** The ids of all events that another process finds in a database file. */
export function idsSeenOutside(file: string): string[] {
  return JSON.parse(execFileSync(process.execPath, ['--input-type=module', '-e', `
    import { createClient } from '@libsql/client'
    const client = createClient({ url: 'file:' + process.argv[1], timeout: 10_000 })
    const { rows } = await client.execute('SELECT id FROM custody_events')
    process.stdout.write(JSON.stringify(rows.map(row => row[0])))
  `, file], { encoding: 'utf8', maxBuffer: 64 * 1024 * 1024 })) as string[]
}
