import { openDB, type DBSchema, type IDBPDatabase } from 'idb'
import type { KitFirm } from '~~/utils/contract/kit'
import type { KitEntry } from '~~/utils/kit/kitEntry'

/** How far a phone's copy of the firm has come, and for whom it was made. */
export interface KitAbout {
  personId: string
  /** The number of the form that its cylinders are packed in. */
  form: number
  seq: number
  mark: string
  /** Where the first walk through the fleet goes on; null once the copy is whole. */
  next: string | null
  firmTag: string
  /** When it last was as the server has it (UTC milliseconds, by this device's clock). */
  followedAt: number
}

/** What a part of the server's answer changes in the copy. */
export interface KitChange {
  /** The cylinders that were there before go; the firm is known by a tag of its own. */
  anew: boolean
  /** How far the copy had come when the answer was asked for. */
  before: KitAbout | null
  about: KitAbout
  entries: readonly KitEntry[]
  firm: KitFirm | null
}

interface Box extends DBSchema {
  cylinders: { key: string, value: KitEntry, indexes: { codes: string, tail: string, placeId: string, holderId: string, names: string } }
  about: { key: 'kit', value: KitAbout }
  firm: { key: 'firm', value: KitFirm }
}

type Index = 'codes' | 'placeId' | 'holderId' | 'names'

const NAME = 'collarbook-kit'
/** Above every character that a serial has. */
const LAST = '\uFFFF'

/**
 * The copy of the firm that this device keeps. Whatever is asked of it is asked again once on a new connection where the
 * browser has closed the one before, as some do in the background.
 */
export function kitBox() {
  let opening: Promise<IDBPDatabase<Box>> | null = null

  function open(): Promise<IDBPDatabase<Box>> {
    opening ??= openBox(() => {
      opening = null
    })
    opening.catch(() => {
      opening = null
    })
    return opening
  }

  async function using<T>(work: (box: IDBPDatabase<Box>) => Promise<T>): Promise<T> {
    try {
      return await work(await open())
    }
    catch (error) {
      if ((error as { name?: string } | null)?.name !== 'InvalidStateError') throw error
      opening = null
      return work(await open())
    }
  }

  return {
    about: () => using(async box => await box.get('about', 'kit') ?? null),
    firm: () => using(async box => await box.get('firm', 'firm') ?? null),
    count: () => using(box => box.count('cylinders')),

    /** Takes a part of the server's answer whole or not at all: not where the copy is no longer what was asked from, for another tab has cleared it or brought it further. */
    take: ({ anew, before, about, entries, firm }: KitChange) => using(async (box) => {
      const all = box.transaction(['cylinders', 'about', 'firm'], 'readwrite')
      const [cylinders, abouts, firms] = [all.objectStore('cylinders'), all.objectStore('about'), all.objectStore('firm')]
      const isAsAsked = JSON.stringify(await abouts.get('kit') ?? null) === JSON.stringify(before)
      // A request that fails ends the transaction, and `done` tells of it: nobody waits for each.
      const put = isAsAsked
        ? [
            ...anew ? [cylinders.clear()] : [],
            ...entries.map(entry => cylinders.put(entry)),
            ...firm === null ? [] : [firms.put(firm, 'firm')],
            abouts.put(about, 'kit'),
          ]
        : []
      await Promise.all([...put, all.done])
      return isAsAsked
    }),

    clear: () => using(async (box) => {
      const all = box.transaction(['cylinders', 'about', 'firm'], 'readwrite')
      await Promise.all([all.objectStore('cylinders').clear(), all.objectStore('about').clear(), all.objectStore('firm').clear(), all.done])
    }),

    byIds: (ids: readonly string[]) => using(async (box) => {
      const cylinders = box.transaction('cylinders').store
      return (await Promise.all(ids.map(id => cylinders.get(id)))).filter(entry => entry !== undefined)
    }),
    /** Cylinders by one of what they are looked up by. */
    having: (index: Index, value: string) => using(box => box.getAllFromIndex('cylinders', index, value)),
    countHaving: (index: Index, values: readonly string[]) => using(async (box) => {
      const by = box.transaction('cylinders').store.index(index)
      return Promise.all(values.map(value => by.count(value)))
    }),
    /** Cylinders whose serial ends so, from its end to its beginning; the first so many. */
    endingWith: (tail: string, most: number) => using(box => box.getAllFromIndex('cylinders', 'tail', IDBKeyRange.bound(tail, tail + LAST), most)),

    /** Codes that more than one cylinder has had. */
    codesHadByTwo: () => using(async (box) => {
      const found = new Set<string>()
      let before: string | null = null
      let cursor = await box.transaction('cylinders').store.index('codes').openKeyCursor()
      while (cursor) {
        if (cursor.key === before) found.add(cursor.key)
        before = cursor.key
        cursor = await cursor.continue()
      }
      return [...found]
    }),

    close: () => opening?.then(box => box.close(), () => undefined),
  }
}

export type KitBox = ReturnType<typeof kitBox>

function openBox(onGone: () => void): Promise<IDBPDatabase<Box>> {
  return openDB<Box>(NAME, 1, {
    upgrade(database) {
      const cylinders = database.createObjectStore('cylinders', { keyPath: 'id' })
      cylinders.createIndex('codes', 'codes', { multiEntry: true })
      cylinders.createIndex('names', 'names', { multiEntry: true })
      for (const index of ['tail', 'placeId', 'holderId'] as const) cylinders.createIndex(index, index)
      database.createObjectStore('about')
      database.createObjectStore('firm')
    },
    // A newer version of the application in another tab waits for this connection.
    blocking(_current, _blocked, event) {
      (event.target as IDBDatabase).close()
      onGone()
    },
    terminated: onGone,
  })
}
