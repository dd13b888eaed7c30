import { and, eq } from 'drizzle-orm'
import { firm, shipmentActs, shipmentLines, shipments } from '~~/drizzle/schema'
import type { Access } from '~~/utils/access/roles'
import { isEmptyByScale } from '~~/utils/custody/plan'
import type { CylinderView } from '~~/utils/custody/cylinderView'
import type { CylinderState } from '~~/utils/custody/state'
import { tagDay } from '~~/utils/document/contentsTag'
import { exactGrams, type MassReading } from '~~/utils/quantity/mass'
import { formatMonth } from '~~/utils/quantity/month'
import { CATALOGUE } from '~~/utils/refrigerant/allRefrigerants'
import { contentsKey, shippedContents } from '~~/utils/transport/shippedContents'
import type { KeptClassification } from '~~/utils/transport/shipperEntries'
import { shippingPapers, type Carriage, type PapersLine, type Party, type ShippingPapers } from '~~/utils/transport/shippingPapers'
import { cylinderStates, cylinderViews } from '../custody/cylinderViews'
import type { Database } from '../database/database'
import { directory } from '../directory/directory'
import { problem } from '../http/problem'
import { tareReading } from '../labels/labelledStamp'

/** Who has the papers made, and when. */
export interface PapersAt { access: Access, nowMs: number }

/** A line as the papers take it: what the scale showed, and what is then in it. */
export interface PaperedLine {
  cylinderId: string
  sent: { gross: MassReading | null, refrigerant: string | null, condition: string, netGrams: number | null }
}

/**
 * What the papers of a shipment say with its lines as they are weighed; what is kept of it when it leaves.
 *
 * Errors: 404.
 */
export async function makePapers(db: Database, shipmentId: string, lines: readonly PaperedLine[], { access, nowMs }: PapersAt): Promise<ShippingPapers> {
  const ids = lines.map(({ cylinderId }) => cylinderId)
  const [head, from, [own], views, states, classifications] = await Promise.all([
    headOf(db, shipmentId), directory(db), db.read.select().from(firm).limit(1),
    cylinderViews(db, ids, { access, nowMs }), cylinderStates(db, ids), classificationsOf(db, shipmentId),
  ])
  const viewOf = new Map(views.map(view => [view.id, view]))
  const consignee = from.firms.get(head.toFirmId)
  return shippingPapers({
    number: head.number,
    day: tagDay(nowMs, from.timeZone),
    unit: own?.units ?? 'lb',
    shipper: { name: own?.name ?? '', address: own?.address ?? null, telephone: own?.telephone ?? null },
    emergency: { telephone: own?.emergencyTelephone ?? null, contract: own?.emergencyContract ?? null },
    consignee: partyOf(consignee),
    carriage: carriageOf(head, from.firms.get(head.carrierId ?? '')),
    note: head.note,
    lines: lines.flatMap(({ cylinderId, sent }) => {
      const [view, state] = [viewOf.get(cylinderId), states.get(cylinderId)]
      return view && state ? [paperedLine({ view, state, sent, classification: classifications.get(cylinderId) ?? null })] : []
    }),
  }, CATALOGUE)
}

interface Head { number: number, toFirmId: string, note: string | null, carrierId: string | null, isCarrierSaid: boolean }

async function headOf(db: Database, shipmentId: string): Promise<Head> {
  const [[row], said] = await Promise.all([
    db.read.select().from(shipments).where(eq(shipments.id, shipmentId)),
    db.read.select({ id: shipmentActs.id }).from(shipmentActs)
      .where(and(eq(shipmentActs.shipmentId, shipmentId), eq(shipmentActs.kind, 'carrier-chosen'))).limit(1),
  ])
  if (!row) throw problem(404, 'No such shipment', 'It may have been written wrongly.')
  return { ...row, isCarrierSaid: said.length > 0 }
}

async function classificationsOf(db: Database, shipmentId: string): Promise<Map<string, KeptClassification>> {
  const rows = await db.read.select({ cylinderId: shipmentLines.cylinderId, said: shipmentLines.classification }).from(shipmentLines)
    .where(eq(shipmentLines.shipmentId, shipmentId))
  return new Map(rows.flatMap(({ cylinderId, said }) => said === null ? [] : [[cylinderId, said as KeptClassification]]))
}

function carriageOf({ carrierId, isCarrierSaid }: Head, carrier: Parameters<typeof partyOf>[0]): Carriage {
  if (carrierId !== null) return { by: 'carrier', carrier: partyOf(carrier) }
  return isCarrierSaid ? { by: 'own-vehicle' } : { by: 'not-said' }
}

function partyOf(row: { name: string, address: string | null, telephone: string | null } | undefined): Party {
  return { name: row?.name ?? '', address: row?.address ?? null, telephone: row?.telephone ?? null }
}

interface ToBePapered { view: CylinderView, state: CylinderState, sent: PaperedLine['sent'], classification: KeptClassification | null }

function paperedLine({ view, state, sent, classification }: ToBePapered): PapersLine {
  const tareWeight = state.stamp && tareReading(state.stamp, state.tare)
  const contents = shippedContents({ ...state.contents, refrigerant: sent.refrigerant, condition: sent.condition as CylinderView['contents']['condition'] })
  return {
    cylinderId: view.id,
    labelCode: view.labelCode,
    serial: view.stamp?.serial ?? null,
    contents,
    isResidue: isEmptyByScale({ ...view, contents: { ...view.contents, netGrams: sent.netGrams } }),
    tareWeight,
    gross: sent.gross,
    netGrams: sent.netGrams ?? (sent.gross && tareWeight ? Math.round(exactGrams(sent.gross) - exactGrams(tareWeight)) : null),
    retest: retestInWords(view.requalification),
    notes: [
      ...contents.condition === 'mixed' ? ['mixed'] : [],
      ...view.contents.burnt ? ['burnt'] : [],
      ...view.requalification.state === 'overdue' ? ['retest overdue'] : [],
    ],
    // Of other contents the shipper has said nothing.
    classification: classification?.of === contentsKey(contents) ? classification : null,
  }
}

function retestInWords({ state, dueMonth }: CylinderView['requalification']): string {
  if (state === 'not-required') return 'not required'
  return dueMonth === null ? 'not known' : formatMonth(dueMonth)
}
