import { openDB, type DBSchema, type IDBPDatabase, type IDBPTransaction } from 'idb'
import type { DockAnswer, DockResult } from '~~/utils/contract/dock'
import type { ProblemDetails } from '~~/utils/contract/problem'
import type { DockEntry } from '~~/utils/dock/entry'

/** An entry of this phone that is not known to be recorded. */
export interface KeptDockEntry {
  id: string
  /** A new link to the same shipment sends what was said over the one before. */
  shipmentId: string
  entry: DockEntry
  /** Why the server does not take it; null while it waits. */
  problem: ProblemDetails | null
}

/** A photo of this phone that has not arrived; it goes once its entry is recorded. */
export interface KeptDockPhoto {
  id: string
  shipmentId: string
  entryId: string
  takenAt: string
  bytes: Uint8Array<ArrayBuffer>
  problem: ProblemDetails | null
}

/** The shipment as a link last showed it, so that its page opens without a network; without it once the link opens nothing. */
export interface KeptDockCopy { linkId: string, shipmentId: string, answer: DockAnswer | null }

interface Box extends DBSchema {
  copies: { key: string, value: KeptDockCopy }
  entries: { key: string, value: KeptDockEntry, indexes: { shipment: string } }
  photos: { key: string, value: KeptDockPhoto, indexes: { shipment: string } }
}

type Open = IDBPDatabase<Box>
type Writing = IDBPTransaction<Box, ('entries' | 'photos')[], 'readwrite'>

const NAME = 'collarbook-dock'
/** What a connection says that the system has closed. */
const CLOSED = ['InvalidStateError', 'UnknownError', 'AbortError']

/**
 * What a phone at a dock keeps over a closed page and a lost network.
 *
 * Errors: those of the browser's storage; then nothing is kept of the call.
 */
export function dockBox() {
  let opened: Promise<Open> | null = null

  function open(): Promise<Open> {
    opened ??= openDB<Box>(NAME, 1, {
      upgrade(database) {
        database.createObjectStore('copies', { keyPath: 'linkId' })
        database.createObjectStore('entries', { keyPath: 'id' }).createIndex('shipment', 'shipmentId')
        database.createObjectStore('photos', { keyPath: 'id' }).createIndex('shipment', 'shipmentId')
      },
      // A page of a newer version may go on while this one stands open.
      blocking: close,
      terminated: close,
    })
    return opened
  }

  function close() {
    void opened?.then(database => database.close(), () => {})
    opened = null
  }

  /** Tried once more where the connection was closed. */
  async function within<T>(work: (database: Open) => Promise<T>): Promise<T> {
    try {
      return await work(await open())
    }
    catch (error) {
      close()
      if (!CLOSED.includes(String(Object(error).name))) throw error
      return work(await open())
    }
  }

  const writing = <T>(work: (transaction: Writing) => Promise<T>) => within(async (database) => {
    const transaction = database.transaction(['entries', 'photos'], 'readwrite', { durability: 'strict' })
    const [result] = await Promise.all([work(transaction), transaction.done])
    return result
  })

  return {
    copy: (linkId: string) => within(database => database.get('copies', linkId)),
    keepCopy: (copy: KeptDockCopy) => within(database => database.put('copies', copy)),
    /** In the order in which they were made: their ids count up. */
    entries: (shipmentId: string) => within(database => database.getAllFromIndex('entries', 'shipment', shipmentId)),
    photos: (shipmentId: string) => within(database => database.getAllFromIndex('photos', 'shipment', shipmentId)),

    /** Done once an entry and its photos are on the disk. */
    put: (entry: KeptDockEntry, photos: readonly KeptDockPhoto[]) => writing(async (transaction) => {
      await Promise.all([transaction.objectStore('entries').put(entry), ...photos.map(photo => transaction.objectStore('photos').put(photo))])
    }),

    /** Takes out what is recorded, and keeps beside the rest why it is not. */
    settle: (results: readonly DockResult[]) => writing(async (transaction) => {
      const entries = transaction.objectStore('entries')
      for (const result of results) {
        const kept = await entries.get(result.id)
        if (!kept) continue
        if (result.outcome === 'refused') await entries.put({ ...kept, problem: result.problem })
        else await entries.delete(result.id)
      }
    }),

    /** Gives an entry up, and its photos with it. */
    drop: (id: string) => writing(async (transaction) => {
      const photos = transaction.objectStore('photos')
      for (const photo of await photos.getAll()) if (photo.entryId === id) await photos.delete(photo.id)
      await transaction.objectStore('entries').delete(id)
    }),

    removePhoto: (id: string) => within(database => database.delete('photos', id)),
    putPhoto: (photo: KeptDockPhoto) => within(database => database.put('photos', photo)),
    close,
  }
}

export type DockBox = ReturnType<typeof dockBox>
