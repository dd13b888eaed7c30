import { formatWholeDay } from '../../../utils/quantity/day'
import { formatReading } from '../../../utils/quantity/mass'
import { formatMoney, formatRate } from '../../../utils/reclaim/price'
import type { Paper } from '../../../utils/document/paper'
import type { Database } from '../database/database'
import type { PhotoFiles } from '../files/photoFiles'
import { paperPdf } from '../pdf/paperPdf'
import { settlementAnswer } from '../settlement/settlementAnswer'
import { addFile } from '../settlement/shipmentFiles'
import type { SettlementAnswer } from '../../../utils/contract/settlement'
import { HOUR } from './calendar'
import { seededRandom } from './random'

const SEED = 20_261_220

/** Adds the reclaimer's statement to the newest shipment that is closed, as its file. */
export async function keepDemoStatement(db: Database, files: PhotoFiles, print: typeof paperPdf = paperPdf): Promise<void> {
  const { rows: [row] } = await db.readClient.execute(`SELECT id, dispatched_by, settled_at FROM shipments WHERE state = 'closed' AND settled_at IS NOT NULL ORDER BY number DESC LIMIT 1`)
  if (!row) return
  const [shipmentId, personId, at] = [row[0] as string, row[1] as string, (row[2] as number) + HOUR]
  const settlement = await settlementAnswer(db, shipmentId, at)
  const name = `Statement ${settlement.statement.number}.pdf`
  const file = await print(statementPaper(settlement), name)
  await addFile(db, files, { id: seededRandom(SEED).uuid(at), kind: 'statement', name, cylinderIds: [], file }, { shipmentId, personId, now: at })
}

function statementPaper({ shipment, statement, lines, credit }: SettlementAnswer): Paper {
  const money = (cents: number | null) => cents === null ? '' : formatMoney(cents)
  const cents = new Map(credit.lines.map(line => [line.cylinderId, line.cents]))
  const rows = lines.map(({ cylinder, figures: { acceptedNet, grade, rate } }) => [
    cylinder.serial ?? '', acceptedNet ? formatReading(acceptedNet) : '', grade ?? '', rate ? formatRate(rate) : '', money(cents.get(cylinder.id) ?? null),
  ])
  return {
    sender: [shipment.to.name],
    blocks: [
      { kind: 'title', text: `Statement ${statement.number}` },
      { kind: 'facts', rows: [{ term: 'Day', value: formatWholeDay(statement.day!) }, { term: 'Your shipment', value: String(shipment.number) }] },
      {
        kind: 'table',
        columns: [{ head: 'Serial', share: 3, face: 'figures' }, { head: 'Accepted net', share: 3, align: 'right' }, { head: 'Grade', share: 2 }, { head: 'Price', share: 3, align: 'right' }, { head: 'Credit', share: 2, align: 'right' }],
        rows,
      },
      { kind: 'facts', rows: [...statement.others.map(({ what, cents }) => ({ term: what, value: money(cents) })), { term: 'Total', value: money(statement.totalCents) }] },
    ],
    foot: `Statement ${statement.number}`,
  }
}
