import type { InStatement } from '@libsql/client'
import type { DisputeEnd, DisputeMessage, DisputeReopening, NewDispute } from '~~/utils/contract/settlement'
import { differencesOf } from '~~/utils/settlement/dispute'
import type { Guard } from '../custody/posting'
import type { Database } from '../database/database'
import { problem } from '../http/problem'
import { actStatement, claimedAt, isKept, isKeptNow, type NewAct } from '../shipments/acts'
import { theShipment } from '../shipments/shipments'
import type { DisputeDetails } from './disputes'
import { endStatement, reopenStatement } from './disputeStatements'
import { figuresIn, readSettlement } from './readSettlement'
import { refuseStrangePhotos } from './disputePhotos'

/** Who acts on which shipment. */
export interface Acting { shipmentId: string, personId: string, now: number }

interface Found { id: string, cylinderId: string | null, about: string, isOpen: boolean }

/** Opens a dispute by a person. Sent again it changes nothing. Errors: 404; 409 where it has not left or is closed, or one about the same is open; 422. */
export async function openDispute(db: Database, { disputeId, about, cylinderId, text, photoIds, ...sent }: NewDispute, acting: Acting): Promise<void> {
  const act = actOf(sent, acting, 'dispute-opened', cylinderId)
  if (await isKept(db, act)) return
  const settlement = await readSettlement(db, acting.shipmentId)
  if (settlement.shipment.state === 'closed') throw closed()
  if (cylinderId !== null && !settlement.lines.some(line => line.cylinderId === cylinderId)) {
    throw problem(422, 'It names what is not on the shipment', 'Choose among its lines.', [{ path: 'cylinderId', message: 'does not stand on it' }])
  }
  await refuseStrangePhotos(db, acting, photoIds)
  const isNew: Guard = {
    sql: 'NOT EXISTS (SELECT 1 FROM disputes WHERE id = ? OR (shipment_id = ? AND about = ? AND cylinder_id IS ? AND ended_at IS NULL))',
    args: [disputeId, acting.shipmentId, about, cylinderId],
  }
  const isOurs = isKeptNow(act)
  const details: DisputeDetails = { disputeId, text, photoIds }
  const [kept] = await db.write([
    actStatement({ ...act, details: { ...details } }, both(isNew, isNotClosed(acting.shipmentId))),
    {
      sql: `INSERT INTO disputes (id, shipment_id, cylinder_id, about, opened_by, opened_at) SELECT ?, ?, ?, ?, ?, ? WHERE ${isOurs.sql}`,
      args: [disputeId, acting.shipmentId, cylinderId, about, acting.personId, acting.now, ...isOurs.args],
    },
  ])
  if (kept?.rows.length !== 1) throw problem(409, 'A dispute about this is open', 'Say it there.')
}

/** Says something in a dispute. Sent again it changes nothing. Errors: 404; 409 where it has ended; 422 for a photo that is not to be seen here. */
export async function addMessage(db: Database, disputeId: string, { text, photoIds, ...sent }: DisputeMessage, acting: Acting): Promise<void> {
  const dispute = await theDispute(db, disputeId, acting.shipmentId)
  const act = actOf(sent, acting, 'dispute-message', dispute.cylinderId)
  if (await isKept(db, act)) return
  await refuseStrangePhotos(db, acting, photoIds)
  await writeWhere(db, { ...act, details: { disputeId, text, photoIds } }, isOpen(disputeId), () => [], ended)
}

/** Ends a dispute with its outcome. Sent again it changes nothing. Errors: 404; 409 where it has ended. */
export async function endDispute(db: Database, disputeId: string, { outcome, reason, ...sent }: DisputeEnd, acting: Acting): Promise<void> {
  const dispute = await theDispute(db, disputeId, acting.shipmentId)
  const act = actOf(sent, acting, 'dispute-ended', dispute.cylinderId)
  if (await isKept(db, act)) return
  const difference = differencesOf(figuresIn(await readSettlement(db, acting.shipmentId))).find(one => one.about === dispute.about && one.cylinderId === dispute.cylinderId)
  const details: DisputeDetails = { disputeId, outcome, text: reason, measure: difference?.measure ?? null }
  const end = { outcome, reason, personId: acting.personId, at: acting.now }
  await writeWhere(db, { ...act, details: { ...details } }, isOpen(disputeId), isOurs => [endStatement(disputeId, end, isOurs)], ended)
}

/** Opens an ended dispute again. Sent again it changes nothing. Errors: 404; 409 where it is open, or the shipment closed. */
export async function reopenDispute(db: Database, disputeId: string, { reason, ...sent }: DisputeReopening, acting: Acting): Promise<void> {
  const dispute = await theDispute(db, disputeId, acting.shipmentId)
  const act = actOf(sent, acting, 'dispute-reopened', dispute.cylinderId)
  if (await isKept(db, act)) return
  if ((await theShipment(db, acting.shipmentId)).state === 'closed') throw closed()
  const isEnded: Guard = { sql: 'EXISTS (SELECT 1 FROM disputes WHERE id = ? AND ended_at IS NOT NULL)', args: [disputeId] }
  await writeWhere(db, { ...act, details: { disputeId, text: reason } }, both(isEnded, isNotClosed(acting.shipmentId)),
    isOurs => [reopenStatement(disputeId, isOurs)], () => problem(409, 'The dispute is open', 'Say it there.'))
}

async function writeWhere(db: Database, act: NewAct, where: Guard, more: (isOurs: Guard) => InStatement[], refusal: () => Error): Promise<void> {
  const [kept] = await db.write([actStatement(act, where), ...more(isKeptNow(act))])
  if (kept?.rows.length !== 1 && !await isKept(db, act)) throw refusal()
}

async function theDispute(db: Database, disputeId: string, shipmentId: string): Promise<Found> {
  const { rows } = await db.readClient.execute({ sql: 'SELECT cylinder_id, about, ended_at FROM disputes WHERE id = ? AND shipment_id = ?', args: [disputeId, shipmentId] })
  const row = rows[0]
  if (!row) throw problem(404, 'No such dispute', 'It may have been written wrongly.')
  return { id: disputeId, cylinderId: row[0] as string | null, about: row[1] as string, isOpen: row[2] === null }
}

function actOf(sent: { id: string, occurredAt: string }, { shipmentId, personId, now }: Acting, kind: NewAct['kind'], cylinderId: string | null): NewAct {
  return { id: sent.id, shipmentId, kind, cylinderId, by: { personId }, occurredAt: claimedAt(sent.occurredAt, now), recordedAt: now }
}

function isOpen(disputeId: string): Guard {
  return { sql: 'EXISTS (SELECT 1 FROM disputes WHERE id = ? AND ended_at IS NULL)', args: [disputeId] }
}

function isNotClosed(shipmentId: string): Guard {
  return { sql: `EXISTS (SELECT 1 FROM shipments WHERE id = ? AND state IN ('dispatched', 'arrived', 'settled'))`, args: [shipmentId] }
}

function both(a: Guard, b: Guard): Guard {
  return { sql: `${a.sql} AND ${b.sql}`, args: [...a.args, ...b.args] }
}

function ended() {
  return problem(409, 'The dispute has ended', 'Open it again to say more.')
}

function closed() {
  return problem(409, 'The shipment is closed', 'Nothing is argued about any more.')
}
