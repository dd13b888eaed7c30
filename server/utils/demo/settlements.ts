import type { InStatement } from '@libsql/client'
import { dayOfInstant } from '../../../utils/quantity/day'
import { lineCreditCents, settlementCredit } from '../../../utils/settlement/credit'
import { differencesOf, type Difference } from '../../../utils/settlement/dispute'
import type { SettledLine, SettlementFigures } from '../../../utils/settlement/figures'
import type { ActKind } from '../../../utils/shipment/acts'
import type { Database } from '../database/database'
import { actStatement } from '../shipments/acts'
import type { DisputeDetails } from '../settlement/disputes'
import { headStatement, lineStatement } from '../settlement/figureStatements'
import { readSettlement } from '../settlement/readSettlement'
import { DAY, HOUR, MINUTE } from './calendar'
import { DEMO_TIME_ZONE, type Cast } from './cast'
import { seededRandom } from './random'

const SEED = 20_261_219
const PICK_UP_CENTS = -85_00
/** What the newest statement credits too little on its first line. */
const SHORT_CENTS = -12_00
const ALWAYS = { sql: '1', args: [] }

/**
 * The settlements of the shipments that were taken over, by what the log says of each line. The newest statement credits
 * one line too little, which is argued about; whatever else differs was settled between the two.
 */
export async function settlementStatements(db: Database, { people: { manager } }: Cast, now: number): Promise<InStatement[]> {
  const { uuid } = seededRandom(SEED)
  const { rows } = await db.readClient.execute(`SELECT id FROM shipments WHERE settled_at IS NOT NULL ORDER BY number DESC`)
  const all = await Promise.all(rows.map(async ({ id }, index) => ({ id: id as string, isNewest: index === 0, ...await settledFigures(db, id as string, index === 0) })))
  return all.flatMap(({ id, isNewest, figures, settledAt }) => {
    const act = (kind: ActKind, difference: Difference, details: DisputeDetails, at: number) => actStatement({
      id: uuid(at), shipmentId: id, kind, cylinderId: difference.cylinderId, details: { ...details }, by: { personId: manager.id }, occurredAt: at, recordedAt: at,
    })
    return [
      ...figures.lines.map(line => lineStatement(id, line.cylinderId, line.figures, ALWAYS)),
      headStatement(id, figures.statement, ALWAYS),
      ...differencesOf(figures).flatMap((difference): InStatement[] => {
        const disputeId = uuid(settledAt)
        const { about, cylinderId, measure } = difference
        const endedAt = isNewest ? null : settledAt + HOUR
        const end = { outcome: 'agreed' as const, text: 'Weighed once more by both; agreed on the telephone.' }
        return [
          {
            sql: 'INSERT INTO disputes (id, shipment_id, cylinder_id, about, opened_at, outcome, reason, ended_by, ended_at) VALUES (?, ?, ?, ?, ?, ?, ?, ?, ?)',
            args: [disputeId, id, cylinderId, about, settledAt, endedAt && end.outcome, endedAt && end.text, endedAt && manager.id, endedAt],
          },
          act('dispute-opened', difference, { disputeId, measure, byFigures: true }, settledAt),
          ...endedAt !== null
            ? [act('dispute-ended', difference, { disputeId, measure, ...end }, endedAt)]
            : about === 'credit' ? [act('dispute-message', difference, { disputeId, text: 'Asked for the price list this line was reckoned by.' }, Math.min(settledAt + DAY + MINUTE, now))] : [],
        ]
      }),
    ]
  })
}

async function settledFigures(db: Database, shipmentId: string, isShort: boolean): Promise<{ figures: SettlementFigures, settledAt: number }> {
  const { shipment, lines } = await readSettlement(db, shipmentId)
  const settledAt = Date.parse(shipment.settledAt!)
  const settled = lines.map(({ cylinderId, sent, figures: logged }, index): SettledLine => {
    const figures = { ...logged, outcome: 'taken-over' as const }
    const cents = lineCreditCents(figures)
    return { cylinderId, sent, figures: { ...figures, statedCents: cents === null ? null : cents + (isShort && index === 0 ? SHORT_CENTS : 0) } }
  })
  const others = [{ what: 'Pick-up', cents: PICK_UP_CENTS }]
  const { linesCents } = settlementCredit({ lines: settled, statement: { number: null, day: null, others: [], totalCents: null }, unexpected: [] })
  const statement = { number: `ST-${1_000 + shipment.number}`, day: dayOfInstant(settledAt, DEMO_TIME_ZONE), others, totalCents: (linesCents ?? 0) + PICK_UP_CENTS + (isShort ? SHORT_CENTS : 0) }
  return { figures: { lines: settled, statement, unexpected: [] }, settledAt }
}
