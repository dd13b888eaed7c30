import type { Database } from '../database/database'

const AT_ONCE = 500

/**
 * Every photo with the hash of its file, and every event that one was put to after it was recorded, for the export of
 * the log: whoever has a copy of the files can tell by it whether they are those that were kept.
 */
export async function* exportedPhotos(db: Database): AsyncGenerator<object[]> {
  const photos = 'SELECT id, subject, taken_at AS takenAt, sent_by AS sentBy, arrived_at AS arrivedAt, source_hash AS sourceHash, content_hash AS contentHash, bytes, width, height, rowid FROM attachments'
  const put = 'SELECT attachment_id AS photoId, event_id AS eventId, put_by AS putBy, put_at AS putAt, rowid FROM attachment_events'
  for await (const rows of pages(db, photos)) yield rows.map(photo => ({ photo }))
  for await (const rows of pages(db, put)) yield rows.map(photoPut => ({ photoPut }))
}

/** The rows of an append-only table, in the order in which they were written. */
async function* pages(db: Database, select: string): AsyncGenerator<Record<string, unknown>[]> {
  for (let last = 0; ;) {
    const { rows } = await db.readClient.execute({ sql: `${select} WHERE rowid > ? ORDER BY rowid LIMIT ${AT_ONCE}`, args: [last] })
    if (rows.length === 0) return
    last = Number(rows.at(-1)!.rowid)
    yield rows.map(({ rowid: _, ...row }) => row)
  }
}
