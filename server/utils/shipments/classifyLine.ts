import type { Access } from '~~/utils/access/roles'
import type { LineClassification } from '~~/utils/contract/papers'
import { withTechnicalNames } from '~~/utils/refrigerant/unEntry'
import { NOT_A_GAS, type KeptClassification } from '~~/utils/transport/shipperEntries'
import { contentsKey } from '~~/utils/transport/shippedContents'
import type { Database } from '../database/database'
import { problem } from '../http/problem'
import { actStatement, claimedAt, isKept, isKeptNow, type NewAct } from './acts'
import { backToDraft } from './backToDraft'
import { papersOf } from './papersOf'

const OPEN_LINE = `EXISTS (SELECT 1 FROM shipment_lines AS line JOIN shipments ON shipments.id = line.shipment_id
  WHERE line.shipment_id = ? AND line.cylinder_id = ? AND shipments.state IN ('draft', 'ready'))`

/**
 * Keeps what the shipper says of how a line travels, or that nothing is said any more. The same request sent again changes nothing.
 *
 * Errors: 404 where it is not on the list; 409 once it has left, and where the id is another act's; 422 where a choice
 * other than what is proposed has no reason, and where an entry that asks for technical names has none.
 */
export async function classifyLine(db: Database, shipmentId: string, cylinderId: string, body: LineClassification, { access, nowMs }: { access: Access, nowMs: number }): Promise<void> {
  const { id, occurredAt, classification } = body
  const act: NewAct = {
    id, shipmentId, kind: 'classified', cylinderId, details: { classification, what: saidInWords(classification) },
    by: { personId: access.personId }, occurredAt: claimedAt(occurredAt, nowMs), recordedAt: nowMs,
  }
  if (await isKept(db, act)) return
  const { papers, isDraft } = await papersOf(db, shipmentId, { access, nowMs })
  const line = papers.lines.find(one => one.cylinderId === cylinderId)
  if (!line) throw problem(404, 'Not on this shipment', 'The cylinder is not on its list.')
  if (!isDraft) throw problem(409, 'It has left', 'Its papers stand as they are.')
  if (classification && classification.reason === null && classification.identification !== line.description.proposal?.identification) {
    throw problem(422, 'A reason is needed', 'Say why it travels otherwise than proposed.', [{ path: 'classification.reason', message: 'must say why' }])
  }
  const kept: KeptClassification | null = classification && { ...classification, of: contentsKey(line.contents) }
  await db.write([
    actStatement(act, { sql: OPEN_LINE, args: [shipmentId, cylinderId] }),
    {
      // Under an act that was recorded just now, so that a late repeat does not bring an earlier choice back.
      sql: `UPDATE shipment_lines SET classification = ? WHERE shipment_id = ? AND cylinder_id = ? AND ${OPEN_LINE}
        AND (SELECT id FROM shipment_acts WHERE shipment_id = ? AND cylinder_id = ? AND kind = 'classified' ORDER BY seq DESC LIMIT 1) = ?`,
      args: [kept && JSON.stringify(kept), shipmentId, cylinderId, shipmentId, cylinderId, shipmentId, cylinderId, id],
    },
    ...backToDraft(shipmentId, { why: 'A line was classified otherwise.', personId: access.personId, now: nowMs }, isKeptNow({ id, recordedAt: nowMs })),
  ])
}

/** What stands of it in the shipment's history. */
function saidInWords(classification: LineClassification['classification']): string {
  if (!classification) return 'taken back'
  const { identification, technicalNames, reason } = classification
  const travels = identification === NOT_A_GAS ? 'no gas of Class 2' : withTechnicalNames(identification, technicalNames)
  return reason === null ? `${travels}, as proposed` : `${travels}: ${reason}`
}
