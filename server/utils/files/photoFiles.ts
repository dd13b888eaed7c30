import { open } from 'node:fs/promises'
import { dirname, join } from 'node:path'
import { setTimeout as wait } from 'node:timers/promises'
import { createStorage } from 'unstorage'
import folderDriver from 'unstorage/drivers/fs-lite'
import bucketDriver from 'unstorage/drivers/s3'
import { useEnvironment } from '../environment'
import { problem } from '../http/problem'
import type { FilesPlace } from './filesUrl'

/** How long a store may be silent. */
const PATIENCE_MS = 15_000

/** The store of photos. A name is given by us, never by a sender. */
export interface PhotoFiles {
  /** Resolves when the file is safe. Errors: 503 where the store does not take it. */
  keep: (name: string, bytes: Uint8Array) => Promise<void>
  /** null where there is none. Errors: 503 where the store does not answer. */
  read: (name: string) => Promise<Buffer | null>
  /** Writes, reads and removes a file. Errors: what the store itself says. */
  probe: () => Promise<void>
}

/** The files of a place. */
export function photoFiles(place: FilesPlace): PhotoFiles {
  const storage = createStorage({ driver: place.kind === 'folder' ? folderDriver({ base: place.folder, noClear: true }) : bucketDriver(place) })

  /** What the driver is asked, given up where the store stays silent. */
  function patiently<T>(work: Promise<T>): Promise<T> {
    const late = wait(PATIENCE_MS, undefined, { ref: false }).then(() => Promise.reject(new Error('The store does not answer')))
    return Promise.race([work, late])
  }

  async function store(name: string, bytes: Uint8Array): Promise<void> {
    await storage.setItemRaw(name, Buffer.from(bytes))
    if (place.kind === 'folder') await settle(join(place.folder, name))
    // The driver takes a bucket that is not there for a success.
    else if (!await storage.hasItem(name)) throw new Error('404: there is no such bucket')
  }

  return {
    keep: (name, bytes) => patiently(store(name, bytes)).catch(unavailable),
    async read(name) {
      // A folder gives a Buffer, a bucket an ArrayBuffer.
      const raw = await patiently(storage.getItemRaw<Buffer | ArrayBuffer>(name)).catch(unavailable)
      return raw ? Buffer.from(raw as ArrayBuffer) : null
    },
    async probe() {
      const name = `start-check-${process.pid}`
      await patiently(store(name, Buffer.from('photos are kept here')).then(() => storage.removeItem(name)))
    },
  }
}

let current: PhotoFiles | null = null

/** The files of this process, where FILES_URL has them. */
export function useFiles(): PhotoFiles {
  current ??= photoFiles(useEnvironment().files)
  return current
}

/** Until here a power cut would take the file, though its row is safe. */
async function settle(path: string): Promise<void> {
  for (const each of [path, dirname(path)]) {
    const handle = await open(each, 'r')
    await handle.sync().finally(() => handle.close())
  }
}

function unavailable(error: unknown): never {
  console.error(`The store of photos failed: ${String(error)}`)
  throw problem(503, 'Photos cannot be stored or read', 'The store of photos does not answer just now. Nothing was lost; it will be tried again.', undefined, { type: 'files-unavailable', headers: { 'Retry-After': '30' } })
}
