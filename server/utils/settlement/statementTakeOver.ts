import type { Access } from '~~/utils/access/roles'
import type { CsvPreviewAnswer, CsvReading, CsvTakeOver } from '~~/utils/contract/settlement'
import { statementPreview, withChanges } from '~~/utils/settlement/statementCsv'
import { cylinderRows } from '../custody/fleet'
import type { Database } from '../database/database'
import { hashOf } from '../files/names'
import { problem } from '../http/problem'
import { claimedAt, isKept } from '../shipments/acts'
import { readSettlement, type ReadSettlement } from './readSettlement'
import { readTable } from './readTable'
import { setFigures } from './setFigures'

/** What a statement's table would change in a settlement, row by row; nothing is changed. Errors: 404; 409 where it has not left; 422 where it is no table. */
export async function previewStatement(db: Database, shipmentId: string, reading: CsvReading, now: number): Promise<CsvPreviewAnswer> {
  return previewOf(db, await readSettlement(db, shipmentId), reading, now)
}

/**
 * Takes over the rows of a statement in which nothing is wrong, as the preview that was looked at has them. Sent again
 * it changes nothing.
 *
 * Errors: 409 where the file, how it is read, or the settlement are not those of that preview; and as for the figures
 * themselves.
 */
export async function takeStatementOver(db: Database, shipmentId: string, form: CsvTakeOver, access: Access, now: number): Promise<void> {
  const { id, occurredAt, previewHash, ...reading } = form
  if (await isKept(db, { id, shipmentId, kind: 'statement-taken', by: { personId: access.personId }, occurredAt: claimedAt(occurredAt, now), recordedAt: now })) return
  const settlement = await readSettlement(db, shipmentId)
  const preview = await previewOf(db, settlement, reading, now)
  if (preview.hash !== previewHash) {
    throw problem(409, 'This is not what was looked at', 'The figures or the file changed since. Look at the preview again; nothing was taken over.', undefined, { type: 'preview-changed' })
  }
  const before = new Map(settlement.lines.map(line => [line.cylinderId, line.figures]))
  const taken = preview.rows.filter(({ changes }) => changes.length > 0)
  if (taken.length === 0) throw problem(422, 'Nothing to take over', 'No row of the file changes a figure.')
  const lines = new Map(taken.map(({ cylinderId, changes }) => [cylinderId!, withChanges(before.get(cylinderId!)!, changes)]))
  const details = { fileHash: hashOf(reading.file), rows: preview.rows.length, taken: taken.length, wrong: preview.rows.filter(({ problems }) => problems.length > 0).length }
  await setFigures(db, shipmentId, { act: { id, occurredAt, kind: 'statement-taken', details }, revision: settlement.revision, lines }, access, now)
}

async function previewOf(db: Database, { revision, lines, shipment }: ReadSettlement, reading: CsvReading, now: number): Promise<CsvPreviewAnswer> {
  const { rows: table, delimiter } = readTable(reading)
  const rows = await cylinderRows(db, lines.map(line => line.cylinderId), now)
  const known = lines.map(({ cylinderId, figures }) => ({ cylinderId, figures, serial: rows.get(cylinderId)?.row.serial ?? null }))
  const preview = { delimiter, ...statementPreview(table, known, { decimal: reading.decimal, unit: reading.unit ?? null, columns: reading.columns }) }
  const looked = JSON.stringify([shipment.id, revision, hashOf(reading.file), preview])
  return { ...preview, hash: hashOf(Buffer.from(looked)) }
}
