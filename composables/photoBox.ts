import { openDB, type DBSchema } from 'idb'
import type { PhotoSubject } from '~~/utils/photo/subject'

/** A photo that is on this device and has not arrived at the server. */
export interface HeldPhoto {
  id: string
  /** Whose it is: nobody else who signs in on this device sends it. */
  personId: string
  /** The form that it was taken for, until that is recorded; null once it may go. */
  form: string | null
  /** The event that it is put to, where that does not name it. */
  eventId: string | null
  subject: PhotoSubject
  takenAt: string
  bytes: Uint8Array<ArrayBuffer>
  /** Why the server does not take it; null while nothing speaks against it. */
  refusal: string | null
}

interface Box extends DBSchema {
  photos: { key: string, value: HeldPhoto, indexes: { person: string } }
}

/** A form that was given up leaves its photos behind: how long they wait for it. */
const FORM_WAITS_MS = 24 * 60 * 60 * 1000

/** The photos of this device, kept over a closed page and a lost network until they have arrived. */
export async function openPhotoBox() {
  const box = await openDB<Box>('collarbook-photos', 1, {
    upgrade(database) {
      database.createObjectStore('photos', { keyPath: 'id' }).createIndex('person', 'personId')
    },
  })
  return {
    /** A person's photos in the order in which they were taken; `named` are those that an event of this device speaks of. */
    async of(personId: string, nowMs: number, named: ReadonlySet<string> = new Set()): Promise<HeldPhoto[]> {
      const all = await box.getAllFromIndex('photos', 'person', personId)
      const forgotten = all.filter(({ id, form, takenAt }) => form !== null && !named.has(id) && nowMs - Date.parse(takenAt) > FORM_WAITS_MS)
      await Promise.all(forgotten.map(({ id }) => box.delete('photos', id)))
      return all.filter(photo => !forgotten.includes(photo)).sort((a, b) => a.id.localeCompare(b.id))
    },
    put: (photo: HeldPhoto) => box.put('photos', photo),
    remove: (id: string) => box.delete('photos', id),
    close: () => box.close(),
  }
}
