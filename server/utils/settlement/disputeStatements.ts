import type { InStatement } from '@libsql/client'
import { v7 as uuid } from 'uuid'
import { differencesOf, disputeChanges, type DisputeState } from '~~/utils/settlement/dispute'
import type { SettlementFigures } from '~~/utils/settlement/figures'
import type { Guard } from '../custody/posting'
import { actStatement, type NewAct } from '../shipments/acts'
import type { DisputeDetails } from './disputes'

/** When and with whose act the figures changed. */
export type DisputeCause = Pick<NewAct, 'shipmentId' | 'by' | 'occurredAt' | 'recordedAt'>

/** Opens, opens again and ends the disputes of a shipment as its new figures have it, where a condition holds. */
export function disputeStatements(disputes: readonly DisputeState[], figures: SettlementFigures, cause: DisputeCause, where: Guard): InStatement[] {
  const { open, reopen, end } = disputeChanges(disputes, differencesOf(figures))
  const cylinderOf = new Map(disputes.map(({ id, cylinderId }) => [id, cylinderId]))
  const act = (kind: NewAct['kind'], cylinderId: string | null, details: DisputeDetails) =>
    actStatement({ ...cause, id: uuid(), kind, cylinderId, details: { ...details, byFigures: true } }, where)
  return [
    ...open.flatMap(({ about, cylinderId, measure }) => {
      const id = uuid()
      return [
        {
          sql: `INSERT INTO disputes (id, shipment_id, cylinder_id, about, opened_at) SELECT ?, ?, ?, ?, ? WHERE ${where.sql}`,
          args: [id, cause.shipmentId, cylinderId, about, cause.recordedAt, ...where.args],
        },
        act('dispute-opened', cylinderId, { disputeId: id, measure }),
      ]
    }),
    ...reopen.flatMap(({ id, difference: { cylinderId, measure } }) => [reopenStatement(id, where), act('dispute-reopened', cylinderId, { disputeId: id, measure })]),
    ...end.flatMap(id => [
      endStatement(id, { outcome: 'no-difference', reason: 'The figures do not differ any more.', personId: null, at: cause.recordedAt }, where),
      act('dispute-ended', cylinderOf.get(id) ?? null, { disputeId: id, outcome: 'no-difference', text: 'The figures do not differ any more.', measure: null }),
    ]),
  ]
}

/** Opens an ended dispute again, where a condition holds. */
export function reopenStatement(id: string, where: Guard): InStatement {
  return { sql: `UPDATE disputes SET outcome = NULL, reason = NULL, ended_by = NULL, ended_at = NULL WHERE id = ? AND ${where.sql}`, args: [id, ...where.args] }
}

/** Ends an open dispute, where a condition holds. */
export function endStatement(id: string, end: { outcome: string, reason: string, personId: string | null, at: number }, where: Guard): InStatement {
  return {
    sql: `UPDATE disputes SET outcome = ?, reason = ?, ended_by = ?, ended_at = ? WHERE id = ? AND ended_at IS NULL AND ${where.sql}`,
    args: [end.outcome, end.reason, end.personId, end.at, id, ...where.args],
  }
}
