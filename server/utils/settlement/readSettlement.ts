import type { Shipment } from '~~/utils/contract/shipments'
import { dockLines, unexpectedCylinders, type DockLine, type UnexpectedCylinder } from '~~/utils/dock/dockLines'
import { DOCK_KINDS } from '~~/utils/dock/entry'
import { dayOfInstant } from '~~/utils/quantity/day'
import { priceOn } from '~~/utils/reclaim/price'
import type { LineFigures, LineOutcome, OtherAmount, SettlementFigures, StatementFigures } from '~~/utils/settlement/figures'
import { prefilled } from '~~/utils/settlement/prefilled'
import type { ActKind } from '~~/utils/shipment/acts'
import type { Database } from '../database/database'
import { directory } from '../directory/directory'
import { dockEntries } from '../dock/linkEntries'
import { problem } from '../http/problem'
import { pricesOf } from '../reclaim/terms'
import { shipmentLines, type StoredLine } from '../shipments/shipmentLines'
import { theShipment } from '../shipments/shipments'
import { reclaimedEvents, reclaimedFigures } from './reclaimedEvents'

/** Acts by which our people change a settlement's figures. */
export const FIGURE_ACTS: readonly ActKind[] = ['figures-set', 'statement-taken', 'settled']

/** These, and what the dock says: whatever changes a settlement as it is shown. */
export const SHOWN_ACTS: readonly ActKind[] = [...FIGURE_ACTS, ...DOCK_KINDS.map((kind): ActKind => `dock-${kind}`)]

/** A line with its figures: those entered, else what its log says where it was taken over, else what the dock said and the price of the day it left. */
export interface ReadLine extends Pick<StoredLine, 'cylinderId' | 'sent' | 'returnedAt'> {
  figures: LineFigures
  isEntered: boolean
  dock: DockLine | null
}

/** A settlement as it is stored and prefilled. */
export interface ReadSettlement {
  shipment: Shipment
  /** The newest act that changes what is shown. */
  revision: number
  /** The newest of our own changes of its figures. */
  figuresRevision: number
  lines: ReadLine[]
  statement: StatementFigures
  unexpected: UnexpectedCylinder[]
}

/** Reads a shipment's settlement. Errors: 404; 409 where it has not left. */
export async function readSettlement(db: Database, shipmentId: string): Promise<ReadSettlement> {
  const shipment = await theShipment(db, shipmentId)
  if (shipment.dispatchedAt === null) throw problem(409, 'There is nothing to settle', `Shipment ${shipment.number} has not left.`)
  // Read first: what changes while the rest is read is not taken for looked at.
  const revisions = await revisionsOf(db, shipmentId)
  const [stored, entries, prices, { timeZone }, logged, [lineRows, heads]] = await Promise.all([
    shipmentLines(db, shipmentId), dockEntries(db, shipmentId), pricesOf(db, shipment.to.id), directory(db), reclaimedEvents(db, shipmentId),
    db.readClient.batch([
      { sql: 'SELECT cylinder_id, their_gross, accepted_net, grade, mills, per, stated_cents, outcome FROM settlement_lines WHERE shipment_id = ?', args: [shipmentId] },
      { sql: 'SELECT statement_number, statement_day, others, stated_total_cents FROM settlements WHERE shipment_id = ?', args: [shipmentId] },
    ], 'read'),
  ])
  const entered = new Map(lineRows!.rows.map(row => [row['cylinder_id'] as string, figuresOf(row)]))
  const said = dockLines(entries)
  const day = dayOfInstant(Date.parse(shipment.dispatchedAt), timeZone)
  const head = heads!.rows[0]
  return {
    shipment,
    ...revisions,
    lines: stored.map(({ cylinderId, sent, returnedAt }) => {
      const dock = said.get(cylinderId) ?? null
      const price = sent && priceOn(prices, { refrigerant: sent.refrigerant, condition: sent.condition, day })
      const event = logged.get(cylinderId)
      const figures = entered.get(cylinderId) ?? (event ? reclaimedFigures(event.details) : null) ?? prefilled(dock ?? undefined, price?.rate ?? null)
      // One that has come back was not taken over, whatever was typed before.
      return { cylinderId, sent, returnedAt, dock, isEntered: entered.has(cylinderId), figures: returnedAt === null ? figures : { ...figures, outcome: 'sent-back' } }
    }),
    statement: {
      number: (head?.['statement_number'] ?? null) as string | null,
      day: (head?.['statement_day'] ?? null) as string | null,
      others: head ? JSON.parse(head['others'] as string) as OtherAmount[] : [],
      totalCents: (head?.['stated_total_cents'] ?? null) as number | null,
    },
    unexpected: unexpectedCylinders(entries),
  }
}

async function revisionsOf(db: Database, shipmentId: string): Promise<Pick<ReadSettlement, 'revision' | 'figuresRevision'>> {
  const newest = (kinds: readonly ActKind[]) => ({
    sql: 'SELECT coalesce(max(seq), 0) FROM shipment_acts WHERE shipment_id = ? AND kind IN (SELECT value FROM json_each(?))', args: [shipmentId, JSON.stringify(kinds)],
  })
  const [shown, ours] = await db.readClient.batch([newest(SHOWN_ACTS), newest(FIGURE_ACTS)], 'read')
  return { revision: shown!.rows[0]![0] as number, figuresRevision: ours!.rows[0]![0] as number }
}

/** The same as its figures alone, to reckon with. */
export function figuresIn({ lines, statement, unexpected }: ReadSettlement): SettlementFigures {
  return { lines, statement, unexpected: unexpected.map(({ serial }) => serial) }
}

function figuresOf(row: Record<string, unknown>): LineFigures {
  const read = <T>(json: unknown) => json === null ? null : JSON.parse(json as string) as T
  return {
    theirGross: read(row['their_gross']),
    acceptedNet: read(row['accepted_net']),
    grade: row['grade'] as string | null,
    rate: row['mills'] === null ? null : { mills: row['mills'] as number, per: row['per'] as 'lb' | 'kg' },
    statedCents: row['stated_cents'] as number | null,
    outcome: row['outcome'] as LineOutcome | null,
  }
}
