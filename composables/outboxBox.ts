import { openDB, type DBSchema, type IDBPDatabase, type IDBPTransaction, type StoreNames } from 'idb'
import { ApiError } from '~~/composables/useApi'
import type { CustodyEvent } from '~~/utils/custody/event'
import { newEntry, type DroppedEntry, type OutboxEntry, type RecordedEntry } from '~~/utils/outbox/entry'
import { sameContent } from '~~/utils/outbox/sameContent'
import type { Settlement } from '~~/utils/outbox/settlement'

interface Box extends DBSchema {
  entries: { key: string, value: OutboxEntry }
  recorded: { key: string, value: RecordedEntry }
  dropped: { key: string, value: DroppedEntry }
  device: { key: 'count', value: number }
}

type Stores = StoreNames<Box>
type Writing<Names extends Stores[]> = IDBPTransaction<Box, Names, 'readwrite'>

const NAME = 'collarbook-outbox'
/** How many recorded ones are remembered, so that the same entry again is known. */
const REMEMBERED = 200
/** What a connection says that the system has closed. */
const CLOSED = ['InvalidStateError', 'UnknownError', 'AbortError']

/**
 * The events of this device that are not known to be recorded, and its count of events.
 *
 * Errors: an {@link ApiError} that says so where the device keeps nothing; then nothing of the call is kept.
 */
export function outboxBox() {
  let opened: Promise<IDBPDatabase<Box>> | null = null

  function open(): Promise<IDBPDatabase<Box>> {
    const opening = opened ?? openDB<Box>(NAME, 1, {
      upgrade(database) {
        database.createObjectStore('entries', { keyPath: 'id' })
        database.createObjectStore('recorded', { keyPath: 'id' })
        database.createObjectStore('dropped', { keyPath: 'id' })
        database.createObjectStore('device')
      },
      // A page of a newer version may go on while this one stands open.
      blocking: forget,
      terminated: forget,
    })
    opened = opening
    return opening
  }

  function forget() {
    void opened?.then(database => database.close(), () => {})
    opened = null
  }

  /** Done once the transaction is complete and on the disk; tried once more where the connection was closed or the device is full. */
  async function within<Names extends Stores[], T>(stores: [...Names], work: (transaction: Writing<Names>) => Promise<T>): Promise<T> {
    try {
      return await once(stores, work)
    }
    catch (error) {
      if (isFull(error)) await makeRoom()
      else if (CLOSED.includes(nameOf(error))) forget()
      else throw told(error)
      return await once(stores, work).catch((again) => {
        throw told(again)
      })
    }
  }

  /** On a full device what is recorded makes room for what is not: it is only remembered. */
  async function makeRoom(): Promise<void> {
    await once(['recorded'], transaction => transaction.objectStore('recorded').clear()).catch(() => {})
  }

  async function once<Names extends Stores[], T>(stores: [...Names], work: (transaction: Writing<Names>) => Promise<T>): Promise<T> {
    const database = await open().catch((error) => {
      opened = null
      throw error
    })
    const transaction = database.transaction(stores, 'readwrite', { durability: 'strict' }) as Writing<Names>
    const done = transaction.done
    done.catch(() => {})
    try {
      const result = await work(transaction)
      await done
      return result
    }
    catch (error) {
      // What broke the transaction says more than the call that met it.
      const cause = transaction.error
      try {
        transaction.abort()
      }
      catch {
        // It had ended by itself.
      }
      throw cause ?? error
    }
  }

  return {
    all: () => within(['entries'], transaction => transaction.objectStore('entries').getAll()),

    /**
     * Keeps new events and gives each its place in the device's count; what is kept or recorded with the same content
     * stays as it is.
     *
     * @param counted the highest number that this device is known to have given before.
     */
    put: (events: readonly CustodyEvent[], personId: string, nowMs: number, counted: number) =>
      within(['entries', 'recorded', 'device'], async (transaction) => {
        const [entries, recorded] = [transaction.objectStore('entries'), transaction.objectStore('recorded')]
        const kept: CustodyEvent[] = []
        for (const event of events) {
          const before = await entries.get(event.id) ?? await recorded.get(event.id)
          const isSame = before !== undefined && sameContent(before.event, event)
          if (before && isSame && !isRefused(before)) {
            kept.push(before.event)
            continue
          }
          if (before && !isSame && 'state' in before && before.firstSentAt !== null && !isRefused(before)) throw new ApiError(SAVED_OTHERWISE)
          const deviceSeq = before && 'state' in before ? before.event.deviceSeq : await nextNumber(transaction.objectStore('device'), counted)
          const numbered = { ...event, deviceSeq }
          await entries.put(newEntry(numbered, personId, nowMs))
          kept.push(numbered)
        }
        return kept
      }),

    /** Numbers for events that are not kept here. */
    numbers: (many: number, counted: number) => within(['device'], async (transaction) => {
      const given: number[] = []
      for (let at = 0; at < many; at++) given.push(await nextNumber(transaction.objectStore('device'), counted))
      return given
    }),

    /** Marks entries as on their way; gives those that still are to go. */
    sending: (ids: readonly string[], nowMs: number) => within(['entries'], async (transaction) => {
      const entries = transaction.objectStore('entries')
      const going: OutboxEntry[] = []
      for (const id of ids) {
        const entry = await entries.get(id)
        if (!entry || isRefused(entry)) continue
        const next: OutboxEntry = { ...entry, state: 'sending', tries: entry.tries + 1, firstSentAt: entry.firstSentAt ?? nowMs }
        await entries.put(next)
        going.push(entry)
      }
      return going
    }),

    /**
     * Does with what was sent as it was answered.
     *
     * @param sent the entries as they were before this try.
     */
    settle: (sent: readonly OutboxEntry[], settlement: Settlement, nowMs: number) => within(['entries', 'recorded'], async (transaction) => {
      const [entries, recorded] = [transaction.objectStore('entries'), transaction.objectStore('recorded')]
      const tried = new Map(sent.map(entry => [entry.id, { ...entry, tries: entry.tries + 1 }]))
      for (const { id, version } of settlement.recorded) {
        const { personId, event } = tried.get(id)!
        await recorded.put({ id, personId, event, version, recordedAt: nowMs })
        await entries.delete(id)
      }
      for (const { id, problem } of settlement.refused) await entries.put({ ...tried.get(id)!, state: 'refused', problem })
      for (const { id, problem, mayHaveArrived } of settlement.kept) {
        const entry = tried.get(id)!
        await entries.put({ ...entry, state: 'queued', problem, firstSentAt: mayHaveArrived ? entry.firstSentAt ?? nowMs : entry.firstSentAt })
      }
      // Those of this answer stay: by a clock that was set back they are the oldest.
      const now = new Set(settlement.recorded.map(({ id }) => id))
      const before = (await recorded.getAll()).filter(({ id }) => !now.has(id)).sort((a, b) => b.recordedAt - a.recordedAt)
      for (const { id } of before.slice(Math.max(0, REMEMBERED - now.size))) await recorded.delete(id)
    }),

    /** Takes entries out that cannot have arrived: all of them, or none. */
    takeOut: (ids: readonly string[]) => within(['entries'], async (transaction) => {
      const entries = transaction.objectStore('entries')
      const found = await Promise.all(ids.map(id => entries.get(id)))
      if (!found.every(entry => entry && entry.state === 'queued' && entry.firstSentAt === null)) return false
      for (const id of ids) await entries.delete(id)
      return true
    }),

    /** Gives refused entries back to the form that still shows them. */
    giveBack: (ids: readonly string[]) => within(['entries'], async (transaction) => {
      const entries = transaction.objectStore('entries')
      for (const id of ids) {
        const entry = await entries.get(id)
        if (entry && isRefused(entry)) await entries.delete(id)
      }
    }),

    /** Gives a refused entry up. False where it is no longer here, or goes once more. */
    drop: (id: string, reason: string, nowMs: number) => within(['entries', 'dropped'], async (transaction) => {
      const entry = await transaction.objectStore('entries').get(id)
      if (!entry || !isRefused(entry)) return false
      await transaction.objectStore('dropped').put({ ...entry, droppedAt: nowMs, reason })
      await transaction.objectStore('entries').delete(id)
      return true
    }),

    recorded: () => within(['recorded'], transaction => transaction.objectStore('recorded').getAll()),
    dropped: () => within(['dropped'], transaction => transaction.objectStore('dropped').getAll()),
    close: forget,
  }
}

export type OutboxBox = ReturnType<typeof outboxBox>

async function nextNumber(device: { get: (key: 'count') => Promise<number | undefined>, put: (value: number, key: 'count') => Promise<unknown> }, counted: number): Promise<number> {
  const next = Math.max(await device.get('count') ?? 0, counted) + 1
  await device.put(next, 'count')
  return next
}

function isRefused(entry: OutboxEntry | RecordedEntry): boolean {
  return 'state' in entry && entry.state === 'refused'
}

const SAVED_OTHERWISE = {
  type: 'about:blank', title: 'It is saved already', status: 409,
  detail: 'It was saved with other content and may have been recorded. Look at the cylinder’s log before you record it again.',
}

function nameOf(error: unknown): string {
  return String(Object(error).name)
}

function isFull(error: unknown): boolean {
  return nameOf(error) === 'QuotaExceededError'
}

function told(error: unknown): unknown {
  if (error instanceof ApiError) return error
  const lacksRoom = isFull(error)
  return new ApiError({
    type: 'storage', status: 507,
    title: lacksRoom ? 'This phone is full' : 'This phone could not save it',
    detail: lacksRoom
      ? 'Nothing was saved. Make room on the phone, then record it again; what you typed is still here.'
      : 'Nothing was saved: the browser’s storage did not answer. What you typed is still here; try again.',
  })
}
