import type { PaperDifference, ShipmentLine } from '~~/utils/contract/shipments'
import type { AnyRecordedEvent } from '~~/utils/custody/event'
import { fold, type FoldContext } from '~~/utils/custody/fold'
import { MS_PER_DAY } from '~~/utils/quantity/instant'
import { foldContext } from '../custody/foldContext'
import { logsOf } from '../custody/logPages'
import type { Database } from '../database/database'
import { directory } from '../directory/directory'
import { shipmentLines } from './shipmentLines'

/** A shipment whose papers differ from the log. */
export interface DifferingShipment { id: string, number: number, lines: number }

type StoredLine = { cylinderId: string, sent: ShipmentLine['sent'] }

/** Beyond these nobody mends papers any more: common practice, no source. */
const LOOKED_BACK_DAYS = 365
const MOST_SHIPMENTS = 20

/** By cylinder, where the log now says something else of it as it left than the papers of a shipment. The papers stay as they are. */
export async function paperDifferences(db: Database, shipmentId: string, lines: readonly StoredLine[]): Promise<Map<string, PaperDifference>> {
  const [from, logs] = await Promise.all([directory(db), logsOf(db, lines.map(({ cylinderId }) => cylinderId))])
  return new Map(lines.flatMap(({ cylinderId, sent }): [string, PaperDifference][] => {
    if (sent === null) return []
    const logged = loggedAsItLeft(logs.get(cylinderId) ?? [], shipmentId, foldContext(from))
    const isSame = logged !== null && logged.refrigerant === sent.refrigerant && logged.condition === sent.condition && logged.netGrams === sent.netGrams
    return isSame ? [] : [[cylinderId, { logged }]]
  }))
}

/**
 * The newest shipments of the last year whose papers differ: only those are looked at of which something was recorded
 * after they left, and as many as it takes.
 */
export async function differingShipments(db: Database, nowMs: number): Promise<DifferingShipment[]> {
  const found: DifferingShipment[] = []
  let below = Number.MAX_SAFE_INTEGER
  while (found.length < MOST_SHIPMENTS) {
    const page = await touchedShipments(db, nowMs, below)
    for (const { id, number } of page) {
      const { size } = await paperDifferences(db, id, await shipmentLines(db, id))
      if (size > 0) found.push({ id, number, lines: size })
    }
    if (page.length < MOST_SHIPMENTS) break
    below = page.at(-1)!.number
  }
  return found.slice(0, MOST_SHIPMENTS)
}

/** Some shipments below a number, the newest first, of whose cylinders something was recorded that may contradict the papers. */
async function touchedShipments(db: Database, nowMs: number, below: number): Promise<{ id: string, number: number }[]> {
  const { rows } = await db.readClient.execute({
    sql: `SELECT s.id, s.number FROM shipments s WHERE s.state IN ('dispatched', 'arrived', 'settled', 'closed') AND s.dispatched_at >= ? AND s.number < ? AND EXISTS (
        SELECT 1 FROM shipment_lines l JOIN custody_events e ON e.cylinder_id = l.cylinder_id
        WHERE l.shipment_id = s.id AND e.recorded_at > s.dispatched_at AND (e.kind IN ('corrected', 'registered')
          OR e.effective_at <= s.dispatched_at AND NOT (e.kind = 'sent-for-reclaim' AND e.effective_at = s.dispatched_at)))
      ORDER BY s.number DESC LIMIT ?`,
    args: [nowMs - LOOKED_BACK_DAYS * MS_PER_DAY, below, MOST_SHIPMENTS],
  })
  return rows.map(row => ({ id: row[0] as string, number: row[1] as number }))
}

function loggedAsItLeft(events: readonly AnyRecordedEvent[], shipmentId: string, context: FoldContext): PaperDifference['logged'] {
  const left = events.find(event => event.kind === 'sent-for-reclaim' && event.details.shipmentId === shipmentId)
  const step = left && fold(events, context).steps.find(({ eventId }) => eventId === left.id)
  if (!step || step.correction?.takenOut) return null
  const { refrigerant, condition, netGrams } = step.after
  return { refrigerant, condition, netGrams }
}
