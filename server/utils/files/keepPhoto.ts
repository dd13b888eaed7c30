import type { InStatement } from '@libsql/client'
import { eq } from 'drizzle-orm'
import { attachments } from '../../../drizzle/schema'
import type { Access } from '../../../utils/access/roles'
import { can } from '../../../utils/access/permissions'
import type { Upload, UploadAnswer } from '../../../utils/contract/uploads'
import { pictureKind, type PictureKind } from '../../../utils/photo/pictureKind'
import { takenAtOf } from '../../../utils/photo/takenAt'
import { HEIC_ADVICE } from '../../../utils/photo/words'
import { statement, type Database } from '../database/database'
import { problem } from '../http/problem'
import { hashOf, pictureName, thumbName } from './names'
import type { PhotoFiles } from './photoFiles'
import { redrawPhoto } from './redrawPhoto'

type Attachment = typeof attachments.$inferSelect

/**
 * Keeps a photo, and puts it to an event where one is named. Sent again it is answered as before; the files are safe
 * before the row that names them is.
 *
 * Errors: 403 where the event is another's, 409 where the id has another photo, 413, 415 and 422 for what is no picture
 * that is taken, 422 for an event that nobody knows, 503 where the store does not answer. Then nothing is kept.
 */
export async function keepPhoto(db: Database, files: PhotoFiles, upload: Upload, access: Access, now: number): Promise<UploadAnswer> {
  const kind = takenKind(upload.file)
  const sourceHash = hashOf(upload.file)
  if (upload.eventId) await insistOnEvent(db, upload.eventId, access)
  const known = await sameAs(db, upload, sourceHash, access)
  const row = known ?? await draw(files, upload, kind, sourceHash, access, now)
  await db.write([
    ...(known ? [] : [statement(db.read.insert(attachments).values(row).onConflictDoNothing())]),
    ...(upload.eventId ? [putTo(upload.eventId, row, access, now)] : []),
  ])
  // Of two that were sent at once, only one was written: the other must be the same.
  const kept = known ?? await sameAs(db, upload, sourceHash, access)
  return answerOf(kept ?? row)
}

function takenKind(file: Uint8Array): PictureKind {
  const kind = pictureKind(file)
  if (kind === 'heic') throw problem(415, 'Not a picture that can be shown everywhere', HEIC_ADVICE, undefined, { type: 'heic' })
  if (!kind) throw problem(415, 'Not a picture', 'A photo is taken as JPEG, PNG or WebP.', undefined, { type: 'not-a-picture' })
  return kind
}

/** Only where this photo, and no other under its id, is the one that is kept. */
function putTo(eventId: string, { id, sourceHash, sentBy }: Attachment, access: Access, now: number): InStatement {
  return {
    sql: `INSERT INTO attachment_events (attachment_id, event_id, put_by, put_at) SELECT ?, ?, ?, ?
      WHERE EXISTS (SELECT 1 FROM attachments WHERE id = ? AND source_hash = ? AND sent_by = ?) ON CONFLICT DO NOTHING`,
    args: [id, eventId, access.personId, now, id, sourceHash, sentBy],
  }
}

async function insistOnEvent(db: Database, eventId: string, access: Access): Promise<void> {
  const { rows } = await db.readClient.execute({ sql: 'SELECT actor_id FROM custody_events WHERE id = ?', args: [eventId] })
  const author = rows[0]?.[0]
  if (author === undefined) throw problem(422, 'It names what nobody knows', 'There is no such event.', [{ path: 'eventId', message: 'no such event' }])
  if (author !== access.personId && !can(access, 'events:correct-any')) {
    throw problem(403, 'Not yours to add to', 'Its author may put a photo to it, or a manager.')
  }
}

/** The photo that is kept under this id; null where there is none yet. */
async function sameAs(db: Database, upload: Upload, sourceHash: string, access: Access): Promise<Attachment | null> {
  const [row] = await db.read.select().from(attachments).where(eq(attachments.id, upload.id)).limit(1)
  if (!row) return null
  const isSame = row.sourceHash === sourceHash && row.subject === upload.subject && row.sentBy === access.personId
  if (!isSame) throw problem(409, 'Another photo has this id', 'What was kept first stays. Send this as a new photo.', undefined, { type: 'other-photo' })
  return row
}

async function draw(files: PhotoFiles, upload: Upload, kind: PictureKind, sourceHash: string, access: Access, now: number): Promise<Attachment> {
  const { picture, thumb, width, height } = await redrawPhoto({ bytes: upload.file, kind })
  const contentHash = hashOf(picture)
  await files.keep(thumbName(contentHash), thumb)
  await files.keep(pictureName(contentHash), picture)
  return {
    id: upload.id, subject: upload.subject,
    takenAt: takenAtOf(upload.takenAt, now),
    sentBy: access.personId, arrivedAt: now, sourceHash, contentHash, bytes: picture.length, width, height,
  }
}

function answerOf({ id, contentHash, bytes, width, height }: Attachment): UploadAnswer {
  return { id, contentHash, bytes, width, height }
}
