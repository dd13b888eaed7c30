import { z } from 'zod'
import type { Named } from '../custody/cylinderView'
import { LARGEST_PHOTO } from '../photo/limits'
import { PHOTO_SUBJECTS, type PhotoSubject } from '../photo/subject'
import { id } from './parts'

/**
 * POST /api/uploads: one photo, by the id that its phone gave it. The event that names it in its `photoIds` may have
 * been sent before; `eventId` puts it to one that does not name it.
 */
export const uploadForm = z.strictObject({
  id,
  subject: z.enum(PHOTO_SUBJECTS).default('other'),
  takenAt: z.iso.datetime({ offset: true, error: 'must be an instant with its offset' }).optional(),
  eventId: id.optional(),
  file: z.custom<Uint8Array>(value => value instanceof Uint8Array && value.length > 0 && value.length <= LARGEST_PHOTO, `must be a file of at most ${LARGEST_PHOTO / 1024 / 1024} MiB`)
    .meta({ type: 'string', contentEncoding: 'binary' }),
})
export type Upload = z.output<typeof uploadForm>

/** What POST /api/uploads answers: the photo as it is kept. */
export interface UploadAnswer { id: string, contentHash: string, bytes: number, width: number, height: number }

/** The query of GET /api/uploads/{id}. */
export const uploadQuery = z.strictObject({ size: z.enum(['whole', 'thumb']).default('whole') })

/** A photo that has arrived. */
export interface Photo {
  id: string
  subject: PhotoSubject
  /** As the phone's clock had it; null where it did not say. */
  takenAt: string | null
  arrivedAt: string
  by: Named
  /** It was put to the event after that was recorded, and then. */
  putAt: string | null
  width: number
  height: number
  /** SHA-256 of the picture as kept. */
  contentHash: string
}

/** The photos of one event of a cylinder's log. */
export interface EventPhotos {
  eventId: string
  photos: Photo[]
  /** How many the event names that have not arrived. */
  onTheWay: number
}

/** What GET /api/cylinders/{ref}/photos answers: the events that have photos. */
export interface CylinderPhotosAnswer { items: EventPhotos[] }
