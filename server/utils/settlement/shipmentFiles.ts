import type { FileLines, FileWithdrawal, NewShipmentFile, ShipmentFile } from '~~/utils/contract/shipmentFiles'
import { cleanFileName, FILE_KINDS, fileKind, type FileKind } from '~~/utils/settlement/fileKinds'
import { instantText } from '../cylinder-lists/paging'
import type { Database } from '../database/database'
import { hashOf } from '../files/names'
import type { PhotoFiles } from '../files/photoFiles'
import { redrawPhoto } from '../files/redrawPhoto'
import { problem } from '../http/problem'
import { actStatement, claimedAt, isKept, isKeptNow, type NewAct } from '../shipments/acts'
import { shipmentLines } from '../shipments/shipmentLines'
import { theShipment } from '../shipments/shipments'
import type { Acting } from './disputeActs'

/** Most files of one shipment: common practice, no source. */
const MOST_FILES = 50

/** The files of a shipment that were not withdrawn, in the order in which they were added. */
export async function filesOf(db: Database, shipmentId: string): Promise<ShipmentFile[]> {
  const { rows } = await db.readClient.execute({
    sql: `SELECT file.id, kind, file.name, media_type, bytes, content_hash, cylinder_ids, people.name AS by_name, uploaded_at
      FROM shipment_files AS file LEFT JOIN people ON people.id = uploaded_by WHERE shipment_id = ? ORDER BY uploaded_at, file.id`,
    args: [shipmentId],
  })
  return rows.map(row => ({
    id: row['id'] as string,
    kind: row['kind'] as ShipmentFile['kind'],
    name: row['name'] as string,
    mediaType: row['media_type'] as string,
    bytes: row['bytes'] as number,
    contentHash: row['content_hash'] as string,
    cylinderIds: JSON.parse(row['cylinder_ids'] as string) as string[],
    by: row['by_name'] as string | null,
    at: instantText(row['uploaded_at'])!,
  }))
}

/**
 * Keeps a file of a shipment: a picture drawn anew, everything else as it is. The file is safe before the row that names
 * it is. Sent again it changes nothing.
 *
 * Errors: 404; 409 where it has not left, or has too many files; 413, 415 and 422 for what is not taken; 422 for a line
 * that is none of it; 503 where the store does not answer.
 */
export async function addFile(db: Database, files: PhotoFiles, upload: NewShipmentFile, acting: Acting): Promise<void> {
  const { shipmentId, personId, now } = acting
  const act: NewAct = { id: upload.id, shipmentId, kind: 'file-added', by: { personId }, occurredAt: now, recordedAt: now }
  if (await isKept(db, act)) return
  const shipment = await theShipment(db, shipmentId)
  if (shipment.dispatchedAt === null) throw problem(409, 'It has not left', 'A statement or certificate comes after the shipment has left.')
  await refuseStrangeLines(db, shipmentId, upload.cylinderIds)
  if ((await filesOf(db, shipmentId)).length >= MOST_FILES) throw problem(409, 'Too many files', `A shipment has at most ${MOST_FILES} files.`)

  const kind = takenKind(upload.file)
  const bytes = await asKept(upload.file, kind)
  const contentHash = hashOf(bytes)
  await files.keep(storedName(contentHash), bytes)
  const name = cleanFileName(upload.name, kind)
  const isOurs = isKeptNow(act)
  await db.write([
    actStatement({ ...act, details: { name, kind: upload.kind, contentHash, cylinderIds: upload.cylinderIds } }),
    {
      sql: `INSERT INTO shipment_files (id, shipment_id, kind, name, media_type, bytes, content_hash, cylinder_ids, uploaded_by, uploaded_at)
        SELECT ?, ?, ?, ?, ?, ?, ?, ?, ?, ? WHERE ${isOurs.sql} ON CONFLICT DO NOTHING`,
      args: [upload.id, shipmentId, upload.kind, name, FILE_KINDS[kind].mediaType, bytes.length, contentHash, JSON.stringify(upload.cylinderIds), personId, now, ...isOurs.args],
    },
  ])
}

/** Ties a file to lines, or to the whole shipment. Sent again it changes nothing. Errors: 404; 422 for a line that is none of it. */
export async function tieFile(db: Database, fileId: string, { id, occurredAt, cylinderIds }: FileLines, { shipmentId, personId, now }: Acting): Promise<void> {
  const act: NewAct = { id, shipmentId, kind: 'file-tied', by: { personId }, occurredAt: claimedAt(occurredAt, now), recordedAt: now }
  if (await isKept(db, act)) return
  const { name } = await theFile(db, shipmentId, fileId)
  await refuseStrangeLines(db, shipmentId, cylinderIds)
  const isOurs = isKeptNow(act)
  await db.write([
    actStatement({ ...act, details: { fileId, name, cylinderIds } }),
    { sql: `UPDATE shipment_files SET cylinder_ids = ? WHERE id = ? AND ${isOurs.sql}`, args: [JSON.stringify(cylinderIds), fileId, ...isOurs.args] },
  ])
}

/** Withdraws a file from a shipment; that it was there stays in the history. Sent again it changes nothing. Errors: 404. */
export async function withdrawFile(db: Database, fileId: string, { id, occurredAt }: FileWithdrawal, { shipmentId, personId, now }: Acting): Promise<void> {
  const act: NewAct = { id, shipmentId, kind: 'file-withdrawn', by: { personId }, occurredAt: claimedAt(occurredAt, now), recordedAt: now }
  if (await isKept(db, act)) return
  const { name, contentHash } = await theFile(db, shipmentId, fileId)
  const isOurs = isKeptNow(act)
  await db.write([
    actStatement({ ...act, details: { fileId, name, contentHash } }),
    { sql: `DELETE FROM shipment_files WHERE id = ? AND ${isOurs.sql}`, args: [fileId, ...isOurs.args] },
  ])
}

/** A file of a shipment with its bytes, checked against their hash. Errors: 404 where nobody knows it, or it is gone; 500 where it is not what was kept. */
export async function readFile(db: Database, files: PhotoFiles, shipmentId: string, fileId: string): Promise<{ file: ShipmentFile, bytes: Buffer }> {
  const file = await theFile(db, shipmentId, fileId)
  const bytes = await files.read(storedName(file.contentHash))
  if (!bytes) throw problem(404, 'The file is gone', 'The shipment names it, and it is not in the store of files.', undefined, { type: 'file-gone' })
  if (hashOf(bytes) !== file.contentHash) throw problem(500, 'The file was changed', 'The file in the store is not the one that was kept.', undefined, { type: 'file-changed' })
  return { file, bytes }
}

async function theFile(db: Database, shipmentId: string, fileId: string): Promise<ShipmentFile> {
  const file = (await filesOf(db, shipmentId)).find(one => one.id === fileId)
  if (!file) throw problem(404, 'Not known', 'There is no such file on this shipment.')
  return file
}

function takenKind(file: Uint8Array): FileKind {
  const kind = fileKind(file)
  if (!kind) throw problem(415, 'Not a file that is taken', 'A statement or certificate is taken as PDF, JPEG, PNG or CSV, by what is in the file and not by its name.', undefined, { type: 'other-kind' })
  return kind
}

async function asKept(file: Uint8Array, kind: FileKind): Promise<Uint8Array> {
  return kind === 'jpeg' || kind === 'png' ? (await redrawPhoto({ bytes: file, kind })).picture : file
}

/** Apart from the photos, named by its content. */
function storedName(contentHash: string): string {
  return `shipment-files/${contentHash}`
}

async function refuseStrangeLines(db: Database, shipmentId: string, cylinderIds: readonly string[]): Promise<void> {
  const known = new Set((await shipmentLines(db, shipmentId)).map(line => line.cylinderId))
  const errors = cylinderIds.flatMap((id, index) => known.has(id) ? [] : [{ path: `cylinderIds.${index}`, message: 'does not stand on it' }])
  if (errors.length > 0) throw problem(422, 'It names what is not on the shipment', 'Choose among its lines.', errors)
}
