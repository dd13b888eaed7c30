import { execFileSync, spawnSync } from 'node:child_process'
import { chmodSync, closeSync, openSync, readSync, rmSync, writeSync } from 'node:fs'
import { join } from 'node:path'
import type { TestServer } from './server'

// None of this needs root. What it runs (prlimit, setpriv, unshare) is util-linux, which every Linux has.

/** Starts a process so that a file's mode binds it, as it binds everybody but root. */
export const BOUND_BY_MODE: readonly string[] = process.getuid?.() === 0 ? ['setpriv', '--bounding-set=-dac_override,-dac_read_search', '--inh-caps=-all'] : []

/** Whether this machine lets people mount a disk in memory for a process of their own. */
export const MAY_MOUNT = spawnSync('unshare', ['-Urm', 'mount', '-t', 'tmpfs', 'tmpfs', '/tmp']).status === 0

/** Starts a process with a disk of so many megabytes in place of a folder, seen by it alone. */
export function withSmallDisk(folder: string, megabytes: number): readonly string[] {
  return ['unshare', '-Urm', 'sh', '-c', `mount -t tmpfs -o size=${megabytes}m tmpfs "$0" && exec "$@"`, folder]
}

/** Fills the small disk of a server to the last byte; answers what makes room again. */
export function fillDisk(server: TestServer): () => void {
  const ballast = join('/proc', String(server.pid()), 'root', server.folder, 'ballast')
  const file = openSync(ballast, 'w')
  try {
    for (const size of [65_536, 1]) writeUntilFull(file, Buffer.alloc(size))
  }
  finally {
    closeSync(file)
  }
  return () => rmSync(ballast)
}

function writeUntilFull(file: number, bytes: Buffer): void {
  try {
    for (;;) writeSync(file, bytes)
  }
  catch (error) {
    if ((error as NodeJS.ErrnoException).code !== 'ENOSPC') throw error
  }
}

/** Lets no file of a server grow or be written beyond its first byte; answers what lifts that. */
export function forbidWriting(server: TestServer): () => void {
  const limit = (soft: string) => void execFileSync('prlimit', ['--pid', String(server.pid()), `--fsize=${soft}:`])
  limit('1')
  return () => limit('unlimited')
}

/** Makes a file read-only; answers what makes it writable again. */
export function makeReadOnly(file: string): () => void {
  chmodSync(file, 0o444)
  return () => chmodSync(file, 0o644)
}

/** Overwrites a page of a database file, numbered from 1; answers what puts it back. */
export function ruinPage(file: string, page: number, pageSize: number): () => void {
  const at = (page - 1) * pageSize
  const before = Buffer.alloc(pageSize)
  const write = (bytes: Buffer) => {
    const opened = openSync(file, 'r+')
    writeSync(opened, bytes, 0, pageSize, at)
    closeSync(opened)
  }
  const opened = openSync(file, 'r')
  readSync(opened, before, 0, pageSize, at)
  closeSync(opened)
  write(Buffer.alloc(pageSize, 0xff))
  return () => write(before)
}
