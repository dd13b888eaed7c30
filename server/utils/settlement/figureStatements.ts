import type { InStatement } from '@libsql/client'
import type { LineFigures, StatementFigures } from '~~/utils/settlement/figures'
import type { Guard } from '../custody/posting'
import type { ActKind } from '~~/utils/shipment/acts'

/** Keeps the figures of a line in place of those it had, where a condition holds. */
export function lineStatement(shipmentId: string, cylinderId: string, figures: LineFigures, where: Guard): InStatement {
  const { theirGross, acceptedNet, grade, rate, statedCents, outcome } = figures
  return {
    sql: `INSERT INTO settlement_lines (shipment_id, cylinder_id, their_gross, accepted_net, grade, mills, per, stated_cents, outcome)
      SELECT ?, ?, ?, ?, ?, ?, ?, ?, ? WHERE ${where.sql}
      ON CONFLICT (shipment_id, cylinder_id) DO UPDATE SET their_gross = excluded.their_gross, accepted_net = excluded.accepted_net,
        grade = excluded.grade, mills = excluded.mills, per = excluded.per, stated_cents = excluded.stated_cents, outcome = excluded.outcome`,
    args: [
      shipmentId, cylinderId, theirGross && JSON.stringify(theirGross), acceptedNet && JSON.stringify(acceptedNet), grade,
      rate?.mills ?? null, rate?.per ?? null, statedCents, outcome, ...where.args,
    ],
  }
}

/** Keeps what a statement says of the whole shipment in place of what it said, where a condition holds. */
export function headStatement(shipmentId: string, { number, day, others, totalCents }: StatementFigures, where: Guard): InStatement {
  return {
    sql: `INSERT INTO settlements (shipment_id, statement_number, statement_day, others, stated_total_cents) SELECT ?, ?, ?, ?, ? WHERE ${where.sql}
      ON CONFLICT (shipment_id) DO UPDATE SET statement_number = excluded.statement_number, statement_day = excluded.statement_day,
        others = excluded.others, stated_total_cents = excluded.stated_total_cents`,
    args: [shipmentId, number, day, JSON.stringify(others), totalCents, ...where.args],
  }
}

/** Holds while a shipment is in one of these states and none of these acts came after the settlement was looked at. */
export function isAt(shipmentId: string, states: readonly string[], seen: { revision: number, acts: readonly ActKind[] }): Guard {
  return {
    sql: `EXISTS (SELECT 1 FROM shipments WHERE id = ? AND state IN (${states.map(() => '?').join(', ')}))
      AND NOT EXISTS (SELECT 1 FROM shipment_acts WHERE shipment_id = ? AND seq > ? AND kind IN (SELECT value FROM json_each(?)))`,
    args: [shipmentId, ...states, shipmentId, seen.revision, JSON.stringify(seen.acts)],
  }
}
