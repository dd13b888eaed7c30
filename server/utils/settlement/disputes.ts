import type { Dispute, DisputeEntry } from '~~/utils/contract/settlement'
import type { DisputeOutcome, DisputeState, DisputeSubject } from '~~/utils/settlement/dispute'
import type { ShipmentAct } from '~~/utils/shipment/acts'
import type { Database } from '../database/database'
import { actsOf } from '../shipments/acts'

/** What the act of a dispute says. */
export interface DisputeDetails {
  disputeId: string
  /** The figures did it, not the person whose change of them it came with. */
  byFigures?: boolean
  /** By how much the figures differed then; null where they did not. */
  measure?: string | null
  text?: string
  outcome?: DisputeOutcome
  photoIds?: string[]
}

const ENTRIES = { 'dispute-opened': 'opened', 'dispute-message': 'message', 'dispute-ended': 'ended', 'dispute-reopened': 'reopened' } as const

/** The disputes of a shipment, in the order they were opened, each with all that was said in it. */
export async function disputesOf(db: Database, shipmentId: string): Promise<(Dispute & DisputeState)[]> {
  const [{ rows }, acts] = await Promise.all([
    db.readClient.execute({ sql: 'SELECT id, about, cylinder_id, opened_by, outcome, ended_at FROM disputes WHERE shipment_id = ? ORDER BY opened_at, id', args: [shipmentId] }),
    actsOf(db, shipmentId),
  ])
  const said = acts.filter(act => act.kind in ENTRIES)
  return rows.map((row) => {
    const id = row['id'] as string
    const own = said.filter(act => detailsOf(act).disputeId === id)
    const lastEnd = own.filter(act => act.kind === 'dispute-ended').at(-1)
    return {
      id,
      about: row['about'] as DisputeSubject,
      cylinderId: row['cylinder_id'] as string | null,
      isByFigures: row['opened_by'] === null,
      isOpen: row['ended_at'] === null,
      outcome: row['outcome'] as DisputeOutcome | null,
      endedMeasure: lastEnd ? detailsOf(lastEnd).measure ?? null : null,
      history: own.map(entryOf),
    }
  })
}

function entryOf(act: ShipmentAct): DisputeEntry {
  const { text, outcome, photoIds, byFigures } = detailsOf(act)
  return {
    id: act.id,
    kind: ENTRIES[act.kind as keyof typeof ENTRIES],
    text: text ?? null,
    outcome: outcome ?? null,
    photoIds: photoIds ?? [],
    by: byFigures ? null : act.by,
    at: act.occurredAt,
  }
}

function detailsOf(act: ShipmentAct): DisputeDetails {
  return act.details as unknown as DisputeDetails
}
