import { v7 as uuidv7 } from 'uuid'

const ID_KEY = 'collarbook-device'
const COUNT_KEY = 'collarbook-device-seq'

interface Storage { getItem(key: string): string | null, setItem(key: string, value: string): void }

/**
 * This browser as a device: an id of its own, and how far its count of events is known to have come.
 *
 * The count itself is kept with the events (`outboxBox.ts`); what is noted here is what it begins with where that store
 * was lost. Where nothing may be stored it is another device at each visit, which the log can bear.
 */
export function useDevice(storage: Storage = localStorage) {
  return {
    id(): string {
      const known = read(storage, ID_KEY)
      if (known) return known
      const id = uuidv7()
      write(storage, ID_KEY, id)
      return id
    },
    counted(): number {
      return Number(read(storage, COUNT_KEY) ?? 0)
    },
    /** Notes that the count has come so far. */
    note(count: number) {
      if (count > this.counted()) write(storage, COUNT_KEY, String(count))
    },
  }
}

function read(storage: Storage, key: string): string | null {
  try {
    return storage.getItem(key)
  }
  catch {
    return null
  }
}

function write(storage: Storage, key: string, value: string) {
  try {
    storage.setItem(key, value)
  }
  catch {
    // A browser that stores nothing still records.
  }
}
