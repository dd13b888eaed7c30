import type { MixingCostAnswer } from '~~/utils/contract/settlement'
import type { ShipmentLine } from '~~/utils/contract/shipments'
import type { AnyRecordedEvent } from '~~/utils/custody/event'
import { fold, type FoldContext } from '~~/utils/custody/fold'
import { dayOfInstant, firstInstantOfDay } from '~~/utils/quantity/day'
import type { MassReading } from '~~/utils/quantity/mass'
import { priceOn, type DatedPrice } from '~~/utils/reclaim/price'
import { mixingCost, type MixedLine } from '~~/utils/settlement/mixingCost'
import { foldContext } from '../custody/foldContext'
import { logsOf } from '../custody/logPages'
import type { Database } from '../database/database'
import { directory } from '../directory/directory'
import { pricesOf } from '../reclaim/terms'

/** What mixing cost in the shipments that were settled in a year of the firm's calendar. */
export async function mixingCostOf(db: Database, year: number): Promise<MixingCostAnswer> {
  const from = await directory(db)
  const { timeZone } = from
  const { rows } = await db.readClient.execute({
    sql: `SELECT shipments.id, shipments.number, shipments.to_firm_id, shipments.dispatched_at, line.cylinder_id, cylinders.serial, own.accepted_net, own.mills, own.per
      FROM shipments JOIN shipment_lines AS line ON line.shipment_id = shipments.id
      JOIN settlement_lines AS own ON own.shipment_id = line.shipment_id AND own.cylinder_id = line.cylinder_id
      LEFT JOIN cylinders ON cylinders.id = line.cylinder_id
      WHERE shipments.settled_at >= ? AND shipments.settled_at < ? AND own.outcome = 'taken-over' AND json_extract(line.sent, '$.condition') = ?
      ORDER BY shipments.number, line.position`,
    args: [firstInstantOfDay(`${year}-01-01`, timeZone), firstInstantOfDay(`${year + 1}-01-01`, timeZone), 'mixed' satisfies NonNullable<ShipmentLine['sent']>['condition']],
  })
  const firmIds = [...new Set(rows.map(row => row['to_firm_id'] as string))]
  const prices = new Map(await Promise.all(firmIds.map(async id => [id, await pricesOf(db, id)] as const)))
  const logs = await logsOf(db, rows.map(row => row['cylinder_id'] as string))
  const context = foldContext(from)

  const lines = rows.map((row): MixedLine => ({
    cylinderId: row['cylinder_id'] as string,
    shipmentId: row['id'] as string,
    acceptedNet: row['accepted_net'] === null ? null : JSON.parse(row['accepted_net'] as string) as MassReading,
    rate: row['mills'] === null ? null : { mills: row['mills'] as number, per: row['per'] as 'lb' | 'kg' },
    wentIn: wentIn(logs.get(row['cylinder_id'] as string) ?? [], row['id'] as string, context)
      .map(refrigerant => ({ refrigerant, cleanRate: cleanRate(prices.get(row['to_firm_id'] as string)!, refrigerant, dayOfInstant(row['dispatched_at'] as number, timeZone)) })),
  }))
  const cost = mixingCost(lines)
  return {
    ...cost,
    year,
    lines: cost.lines.map((line, index) => ({ ...line, shipmentNumber: rows[index]!['number'] as number, serial: rows[index]!['serial'] as string | null })),
  }
}

function cleanRate(prices: readonly DatedPrice[], refrigerant: string, day: string) {
  return priceOn(prices, { refrigerant, condition: 'clean', day })?.rate ?? null
}

/** The refrigerants that the log knows to have gone in since the last deep vacuum, as the cylinder left. */
function wentIn(events: readonly AnyRecordedEvent[], shipmentId: string, context: FoldContext): string[] {
  const left = events.find(event => event.kind === 'sent-for-reclaim' && event.details.shipmentId === shipmentId)
  if (!left) return []
  return fold(events.filter(event => event.kind === 'corrected' || event.effectiveAt <= left.effectiveAt), context).state.contents.knownSinceVacuum
}
