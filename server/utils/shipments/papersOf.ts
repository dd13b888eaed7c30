import { eq } from 'drizzle-orm'
import { shipments } from '~~/drizzle/schema'
import type { PapersAnswer } from '~~/utils/contract/papers'
import type { ShippingPapers } from '~~/utils/transport/shippingPapers'
import type { Database } from '../database/database'
import { problem } from '../http/problem'
import type { PapersAt } from './papers'
import { judgedShipment } from './shipmentWithLines'

/**
 * What the papers of a shipment say: as it left, or as a draft of how it stands now.
 *
 * Errors: 404; 409 where it was given up, or left before its papers were kept.
 */
export async function papersOf(db: Database, shipmentId: string, { access, nowMs }: PapersAt): Promise<PapersAnswer> {
  const [row] = await db.read.select({ papers: shipments.papers }).from(shipments).where(eq(shipments.id, shipmentId))
  if (row && row.papers !== null) return { papers: row.papers as ShippingPapers, isDraft: false }
  const { shipment, judged } = await judgedShipment(db, shipmentId, access, nowMs)
  if (judged) return { papers: judged.papers, isDraft: true }
  throw problem(409, 'No papers', shipment.dispatchedAt === null ? 'It was given up before it left.' : 'It left before its papers were kept here.')
}
