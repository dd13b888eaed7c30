import { v7 as uuidv7 } from 'uuid'

const ID_KEY = 'collarbook-device'
const COUNT_KEY = 'collarbook-device-seq'

interface Storage { getItem(key: string): string | null, setItem(key: string, value: string): void }

/**
 * This browser as a device: an id of its own and a count that goes up by one with each event.
 *
 * Where nothing may be stored it is another device at each visit, which the log can bear.
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
    nextSeq(): number {
      const next = Number(read(storage, COUNT_KEY) ?? 0) + 1
      write(storage, COUNT_KEY, String(next))
      return next
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
