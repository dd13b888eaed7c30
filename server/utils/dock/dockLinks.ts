import type { Row } from '@libsql/client'
import { v7 as uuid } from 'uuid'
import { dockLinks } from '../../../drizzle/schema'
import type { Access } from '../../../utils/access/roles'
import type { DockLink, NewDockLink, NewDockLinkAnswer } from '../../../utils/contract/dock'
import { MS_PER_DAY } from '../../../utils/quantity/instant'
import { instantText } from '../cylinder-lists/paging'
import { statement, type Database } from '../database/database'
import { useEnvironment } from '../environment'
import { ownFirm } from '../firm'
import { problem } from '../http/problem'
import { sendMail } from '../mail/mail'
import { actStatement } from '../shipments/acts'
import { theShipment } from '../shipments/shipments'
import { dockLetter } from './dockLetter'
import { DOCK_ACT } from './linkEntries'
import { sealedToken } from './sealedToken'

const SELECT_LINKS = `SELECT link.id, link.for_whom, link.created_at, maker.name AS created_by_name, link.expires_at, link.revoked_at,
    revoker.name AS revoked_by_name, link.first_used_at, max(act.recorded_at) AS last_entry_at, count(act.id) AS entry_count
  FROM dock_links AS link
  LEFT JOIN people AS maker ON maker.id = link.created_by
  LEFT JOIN people AS revoker ON revoker.id = link.revoked_by
  LEFT JOIN shipment_acts AS act ON act.link_id = link.id AND act.kind LIKE '${DOCK_ACT}%'`

/** The links of a shipment, the newest first. Errors: 404 for a shipment that nobody knows. */
export async function linksOf(db: Database, shipmentId: string, now: number): Promise<DockLink[]> {
  await theShipment(db, shipmentId)
  const { rows } = await db.readClient.execute({
    sql: `${SELECT_LINKS} WHERE link.shipment_id = ? GROUP BY link.id ORDER BY link.created_at DESC, link.id DESC`, args: [shipmentId],
  })
  return rows.map(row => linkOf(row, now))
}

/**
 * Makes a link that opens a shipment to its reclaimer's dock, and mails it where an address is given. The same one sent
 * again is answered as before, and mailed no second time.
 *
 * Errors: 404; 409 where the shipment opens to nobody, or the id is that of another link.
 */
export async function createLink(db: Database, shipmentId: string, body: NewDockLink, by: Access, now: number): Promise<NewDockLinkAnswer> {
  const shipment = await theShipment(db, shipmentId)
  if (OPENS_TO_NOBODY.has(shipment.state)) throw problem(409, 'No link is made for it now', `The shipment is ${shipment.state}. A link is made for one that is ready to leave, or has left.`)
  // A token holds whole seconds.
  const expiresAt = Math.floor((now + body.days * MS_PER_DAY) / 1000) * 1000
  const row = { id: body.id, shipmentId, forWhom: body.forWhom, createdBy: by.personId, createdAt: now, expiresAt }
  const [made] = await db.write([
    statement(db.read.insert(dockLinks).values(row).onConflictDoNothing().returning({ id: dockLinks.id })),
    actStatement({
      id: uuid(), shipmentId, kind: 'link-made', details: { linkId: body.id, forWhom: body.forWhom, expiresAt: new Date(expiresAt).toISOString() },
      by: { personId: by.personId }, occurredAt: now, recordedAt: now,
    }, { sql: 'changes() = 1', args: [] }),
  ])
  const link = (await linksOf(db, shipmentId, now)).find(({ id }) => id === body.id)
  if (link?.forWhom !== body.forWhom) throw problem(409, 'Another link has this id', 'Make the link again.')
  const url = `${useEnvironment().publicUrl}/d/${sealedToken({ linkId: link.id, expiresAt: Date.parse(link.expiresAt) })}`
  const isNew = made?.rows.length === 1
  const letter = body.email && dockLetter({ recipient: body.email, firm: await ownFirm(), shipment, link, url })
  return { link, url, mail: letter && isNew ? await sendMail(letter, now) : null }
}

/** Withdraws a link: from then on it opens nothing. A link that is withdrawn stays so. Errors: 404. */
export async function revokeLink(db: Database, shipmentId: string, linkId: string, by: Access, now: number): Promise<void> {
  const known = (await linksOf(db, shipmentId, now)).some(({ id }) => id === linkId)
  if (!known) throw problem(404, 'No such link', 'This shipment has no such link.')
  await db.write([
    { sql: 'UPDATE dock_links SET revoked_at = ?, revoked_by = ? WHERE id = ? AND revoked_at IS NULL', args: [now, by.personId, linkId] },
    actStatement({
      id: uuid(), shipmentId, kind: 'link-revoked', details: { linkId }, by: { personId: by.personId }, occurredAt: now, recordedAt: now,
    }, { sql: 'changes() = 1', args: [] }),
  ])
}

/** What nobody at a dock has to do with yet, or any more. */
const OPENS_TO_NOBODY: ReadonlySet<string> = new Set(['draft', 'cancelled', 'closed'])

function linkOf(row: Row, now: number): DockLink {
  const isRevoked = row['revoked_at'] !== null
  return {
    id: row['id'] as string,
    forWhom: row['for_whom'] as string,
    createdAt: instantText(row['created_at'])!,
    createdBy: row['created_by_name'] as string | null,
    expiresAt: instantText(row['expires_at'])!,
    revokedAt: instantText(row['revoked_at']),
    revokedBy: row['revoked_by_name'] as string | null,
    state: isRevoked ? 'revoked' : (row['expires_at'] as number) <= now ? 'expired' : 'open',
    firstUsedAt: instantText(row['first_used_at']),
    lastEntryAt: instantText(row['last_entry_at']),
    entries: row['entry_count'] as number,
  }
}
