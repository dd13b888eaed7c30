import { eq } from 'drizzle-orm'
import { attachments } from '../../../drizzle/schema'
import type { Database } from '../database/database'
import { problem } from '../http/problem'
import { hashOf, pictureName, thumbName } from './names'
import type { PhotoFiles } from './photoFiles'

/**
 * The file of a photo: the whole picture, which is checked against its hash, or its thumbnail.
 *
 * Errors: 404 where nobody knows the photo, or its file is gone; 500 where the file is not what was kept.
 */
export async function photoFile(db: Database, files: PhotoFiles, id: string, size: 'whole' | 'thumb'): Promise<Buffer> {
  const [row] = await db.read.select().from(attachments).where(eq(attachments.id, id)).limit(1)
  if (!row) throw problem(404, 'Not known', 'There is no such photo.')
  const bytes = await files.read(size === 'thumb' ? thumbName(row.contentHash) : pictureName(row.contentHash))
  if (!bytes) throw problem(404, 'Its file is gone', 'The photo is in the book, and its file is not in the store of photos.', undefined, { type: 'file-gone' })
  if (size === 'whole' && hashOf(bytes) !== row.contentHash) {
    throw problem(500, 'Its file was changed', 'The file in the store of photos is not the one that was kept.', undefined, { type: 'file-changed' })
  }
  return bytes
}
