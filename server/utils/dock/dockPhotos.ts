import { and, count, eq, sum } from 'drizzle-orm'
import { attachments } from '../../../drizzle/schema'
import type { Upload, UploadAnswer } from '../../../utils/contract/uploads'
import type { Database } from '../database/database'
import { keepPhoto } from '../files/keepPhoto'
import { photoFile } from '../files/photoFile'
import type { PhotoFiles } from '../files/photoFiles'
import { problem } from '../http/problem'
import { closedBecause } from './dockAnswer'
import { dockEntries } from './linkEntries'
import type { DockLinkRow } from './openedLink'
import { theShipment } from '../shipments/shipments'

/** What one link may send: photos as they are kept. */
const MOST_PHOTOS = 120
const MOST_BYTES = 80 * 1024 * 1024
/** How many of one link are drawn at once: the rest wait on their phones. */
const AT_ONCE = 2

const drawing = new Map<string, number>()

/**
 * Keeps a photo that an entry of this link names, drawn anew. Sent again it is answered as before.
 *
 * Errors: those of {@link keepPhoto}; 409 where the shipment takes nothing more down or the link has sent its share, 422
 * for a photo that no entry of this link names, 429 while others of this link are being drawn.
 */
export async function keepDockPhoto(db: Database, files: PhotoFiles, link: DockLinkRow, photo: Omit<Upload, 'eventId'>, now: number): Promise<UploadAnswer> {
  const [{ state }, entries] = await Promise.all([theShipment(db, link.shipmentId), dockEntries(db, link.shipmentId)])
  const closed = closedBecause(state)
  if (closed) throw problem(409, 'No more is taken down', closed, undefined, { type: 'dock-closed' })
  const isNamed = entries.some(({ linkId, said }) => linkId === link.id && 'photoIds' in said && said.photoIds.includes(photo.id))
  if (!isNamed) throw problem(422, 'It belongs to nothing', 'A photo is taken once the entry that names it is.', [{ path: 'id', message: 'is named by no entry of this link' }])
  const inHand = drawing.get(link.id) ?? 0
  if (inHand >= AT_ONCE) throw problem(429, 'Too much at once', 'Other photos of this link are being looked at. It will be sent again.', undefined, { headers: { 'Retry-After': '3' } })
  drawing.set(link.id, inHand + 1)
  try {
    await insistOnShare(db, link.id, photo.id)
    return await keepPhoto(db, files, { ...photo, eventId: undefined }, { personId: link.id, roles: [], trainee: false }, now)
  }
  finally {
    const left = (drawing.get(link.id) ?? 1) - 1
    if (left > 0) drawing.set(link.id, left)
    else drawing.delete(link.id)
  }
}

/** A photo that came over a link. Errors: 404 for every other one. */
export async function dockPhoto(db: Database, files: PhotoFiles, link: DockLinkRow, id: string, size: 'whole' | 'thumb'): Promise<Buffer> {
  if (!await isOfLink(db, link.id, id)) throw problem(404, 'Not known', 'There is no such photo.')
  return photoFile(db, files, id, size)
}

async function isOfLink(db: Database, linkId: string, id: string): Promise<boolean> {
  const rows = await db.read.select({ id: attachments.id }).from(attachments).where(and(eq(attachments.id, id), eq(attachments.sentBy, linkId)))
  return rows.length > 0
}

async function insistOnShare(db: Database, linkId: string, id: string): Promise<void> {
  if (await isOfLink(db, linkId, id)) return
  const [sent] = await db.read.select({ photos: count(), bytes: sum(attachments.bytes) }).from(attachments).where(eq(attachments.sentBy, linkId))
  if (sent && (sent.photos >= MOST_PHOTOS || Number(sent.bytes ?? 0) >= MOST_BYTES)) {
    throw problem(409, 'No more photos', 'This link has sent as many photos as it may. Ask the sender for another link.', undefined, { type: 'dock-closed' })
  }
}
