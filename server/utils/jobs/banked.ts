import type { Row } from '@libsql/client'
import type { BankedAnswer, BankedMovement, BankedShipped } from '~~/utils/contract/banked'
import type { EventKind } from '~~/utils/custody/kinds'
import type { MovementCause } from '~~/utils/custody/movement'
import { banked, creditOf } from '~~/utils/jobs/banked'
import { readingGrams, type MassReading } from '~~/utils/quantity/mass'
import { creditCents, type Rate } from '~~/utils/reclaim/price'
import { cylinderStates } from '../custody/cylinderViews'
import type { Database } from '../database/database'
import { firmById } from '../firms/firms'
import { problem } from '../http/problem'

const MOST_MOVEMENTS = 200

/** What of a customer's refrigerant is here, what moved of it, and what was shipped and credited. Errors: 404; 409 for a firm that is no customer. */
export async function bankedOf(db: Database, firmId: string): Promise<BankedAnswer> {
  const firm = await firmById(db, firmId)
  if (!firm) throw problem(404, 'No such firm', 'It may have been written wrongly.')
  if (firm.kind !== 'customer') throw problem(409, 'Not a customer', 'Only a customer has refrigerant banked here.')
  const [moves, holding, shipped] = await Promise.all([movementsOf(db, firmId), holdingCylinders(db, firmId), shippedOf(db, firmId)])
  const states = await cylinderStates(db, holding)
  return {
    held: banked(firmId, [...states.values()], moves.map(row => ({ cylinderId: row['cylinder_id'] as string, at: row['at'] as number, grams: row['grams'] as number }))),
    movements: moves.slice(-MOST_MOVEMENTS).reverse().map(movementOf),
    movementsInAll: moves.length,
    shipped,
  }
}

async function movementsOf({ readClient }: Database, firmId: string): Promise<Row[]> {
  const { rows } = await readClient.execute({
    sql: `SELECT m.event_id, m.ordinal, m.at, m.cause, m.refrigerant, m.grams, m.apart, m.cylinder_id, c.label_code, c.serial, e.kind
      FROM movements m JOIN custody_events e ON e.id = m.event_id LEFT JOIN cylinders c ON c.id = m.cylinder_id
      WHERE m.owner_id = ? ORDER BY m.at, e.seq, m.ordinal`,
    args: [firmId],
  })
  return rows
}

/** Cylinders that hold, or held, something of theirs: what is not weighed moves nothing, and counts among the changes of stock. */
async function holdingCylinders({ readClient }: Database, firmId: string): Promise<string[]> {
  const { rows } = await readClient.execute({ sql: 'SELECT DISTINCT cylinder_id FROM stock_changes WHERE owner_id = ? ORDER BY cylinder_id', args: [firmId] })
  return rows.map(row => row[0] as string)
}

async function shippedOf({ readClient }: Database, firmId: string): Promise<BankedShipped[]> {
  const { rows } = await readClient.execute({
    sql: `SELECT m.event_id, m.cylinder_id, m.refrigerant, m.at, -sum(m.grams) AS grams,
        -(SELECT sum(grams) FROM movements w WHERE w.cylinder_id = m.cylinder_id AND w.event_id = m.event_id AND w.cause = 'shipped') AS whole_grams,
        c.label_code, c.serial, s.id AS shipment_id, s.number, s.state, f.id AS firm_id, f.name AS firm_name,
        l.accepted_net, l.mills, l.per, l.stated_cents
      FROM movements m JOIN custody_events e ON e.id = m.event_id
      JOIN shipments s ON s.id = e.body ->> '$.details.shipmentId' JOIN firms f ON f.id = s.to_firm_id
      LEFT JOIN cylinders c ON c.id = m.cylinder_id
      LEFT JOIN settlement_lines l ON l.shipment_id = s.id AND l.cylinder_id = m.cylinder_id
      WHERE m.owner_id = ? AND m.cause = 'shipped' GROUP BY m.event_id, m.cylinder_id, m.refrigerant ORDER BY m.at DESC, m.event_id`,
    args: [firmId],
  })
  return rows.map(row => ({
    eventId: row['event_id'] as string,
    shipment: { id: row['shipment_id'] as string, number: row['number'] as number },
    to: { id: row['firm_id'] as string, name: row['firm_name'] as string },
    cylinder: cylinderOf(row),
    refrigerant: row['refrigerant'] as string | null,
    at: new Date(row['at'] as number).toISOString(),
    grams: row['grams'] as number,
    wholeGrams: row['whole_grams'] as number,
    isSettled: isSettled(row),
    creditCents: creditFor(row),
  }))
}

function isSettled(row: Row): boolean {
  return row['state'] === 'settled' || row['state'] === 'closed'
}

// Only what is settled is credited; what the statement says goes before what weight and price come to.
function creditFor(row: Row): number | null {
  if (!isSettled(row)) return null
  const lineCents = (row['stated_cents'] as number | null) ?? reckonedCents(row)
  return lineCents === null ? null : creditOf(lineCents, { grams: row['grams'] as number, wholeGrams: row['whole_grams'] as number })
}

function reckonedCents(row: Row): number | null {
  const [accepted, mills, per] = [row['accepted_net'], row['mills'], row['per']] as [string | null, number | null, Rate['per'] | null]
  if (accepted === null || mills === null || per === null) return null
  return creditCents({ mills, per }, readingGrams(JSON.parse(accepted) as MassReading))
}

function movementOf(row: Row): BankedMovement {
  return {
    eventId: row['event_id'] as string,
    ordinal: row['ordinal'] as number,
    cylinder: cylinderOf(row),
    at: new Date(row['at'] as number).toISOString(),
    kind: row['kind'] as EventKind,
    cause: row['cause'] as MovementCause,
    refrigerant: row['refrigerant'] as string | null,
    grams: row['grams'] as number,
    apart: row['apart'] === 1,
  }
}

function cylinderOf(row: Row): BankedMovement['cylinder'] {
  return { id: row['cylinder_id'] as string, labelCode: row['label_code'] as string | null, serial: row['serial'] as string | null }
}
