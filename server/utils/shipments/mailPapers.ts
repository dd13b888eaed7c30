import type { Access } from '~~/utils/access/roles'
import type { PapersMail, PapersMailAnswer } from '~~/utils/contract/papers'
import { shipmentWord } from '~~/utils/document/shipmentPaper'
import type { ShippingPapers } from '~~/utils/transport/shippingPapers'
import type { Database } from '../database/database'
import { firmById } from '../firms/firms'
import { problem } from '../http/problem'
import { keptAs, sendMail, type Letter } from '../mail/mail'
import { actStatement, claimedAt, isKept, type NewAct } from './acts'
import { papersOf } from './papersOf'
import { paperName, paperPdfOf, type PaperKind } from './printedPapers'
import { theShipment } from './shipments'

const KINDS: readonly PaperKind[] = ['bill-of-lading', 'packing-list']

/**
 * Mails a shipment's papers to its reclaimer or to another address, and notes that among what was done to it. Under the
 * same id they go out once.
 *
 * Errors: 404; 409 before it has left, and where another letter or act has this id; 422 where no address is known.
 */
export async function mailPapers(db: Database, shipmentId: string, { id, occurredAt, to, note }: PapersMail, { access, nowMs }: { access: Access, nowMs: number }): Promise<PapersMailAnswer> {
  const [{ papers, isDraft }, shipment] = await Promise.all([papersOf(db, shipmentId, { access, nowMs }), theShipment(db, shipmentId)])
  if (isDraft) throw problem(409, 'It has not left yet', 'Its papers are a draft until it leaves. Send them then.')
  const recipient = to ?? (await firmById(db, shipment.to.id))?.email
  if (!recipient) throw problem(422, 'No address', `No email address of ${shipment.to.name} is known. Type one.`, [{ path: 'to', message: 'is needed' }])
  const act: NewAct = { id, shipmentId, kind: 'papers-mailed', by: { personId: access.personId }, occurredAt: claimedAt(occurredAt, nowMs), recordedAt: nowMs }
  // The letter first: it is kept in one commit with its act.
  const before = await keptAs(id)
  if (!await isKept(db, act) && before) throw problem(409, 'Another letter has this id', 'Send it again under a new id.')
  if (before) return { mail: before.outcome, recipient: before.recipient }
  const attachments = await Promise.all(KINDS.map(async kind => ({
    name: paperName(kind, papers), mediaType: 'application/pdf', content: await paperPdfOf(kind, papers, false),
  })))
  const mail = await sendMail({ ...papersLetter(papers, note ?? null), recipient, attachments }, nowMs, {
    id,
    alongside: [actStatement({
      ...act, details: { to: recipient, papers: attachments.map(({ name }) => name), what: `to ${recipient}`, ...note !== undefined && { text: note } },
    })],
  })
  return { mail, recipient }
}

function papersLetter(papers: ShippingPapers, note: string | null): Pick<Letter, 'subject' | 'body'> {
  const { shipper, totals, carriage, day } = papers
  const cylinders = totals.cylinders === 1 ? '1 cylinder' : `${totals.cylinders} cylinders`
  return {
    subject: `${shipper.name}: papers of ${shipmentWord(papers)}, ${cylinders}`,
    body: [
      'Hello,', '',
      `${shipper.name} has sent ${shipmentWord(papers)} with ${cylinders} to you on ${day}${carriage.by === 'carrier' ? `, carried by ${carriage.carrier.name}` : ''}.`,
      'Its bill of lading and its packing list come with this letter.',
      ...note === null ? [] : ['', note],
      '',
      ...shipper.telephone === null ? [] : [`${shipper.name}, telephone ${shipper.telephone}`, ''],
    ].join('\n'),
  }
}
