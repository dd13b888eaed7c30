import type { DetailsOf } from '~~/utils/custody/schema'
import type { DockLine } from '~~/utils/dock/dockLines'
import type { LineFigures } from '~~/utils/settlement/figures'
import { lineEvents } from '../cylinder-lists/lineEvents'
import type { Database } from '../database/database'

const MILLS_PER_WHOLE = 1_000

/** What the log keeps of a line that was taken over: the reclaimer's figures, and who at the dock said them. */
export function reclaimedDetails(shipmentId: string, { theirGross, acceptedNet, grade, rate }: LineFigures, dock: DockLine | null): DetailsOf<'reclaimed'> {
  return {
    shipmentId,
    ...theirGross && { theirGross },
    ...acceptedNet && { acceptedNet },
    ...grade !== null && { grade },
    ...rate && { price: rate.mills / MILLS_PER_WHOLE, pricePer: rate.per },
    ...dock && dock.by !== '' && { reported: { name: dock.by, at: dock.at } },
  }
}

/** The same back as figures: a shipment may have been taken over before settlements were kept. A price without its unit is no rate. */
export function reclaimedFigures({ theirGross, acceptedNet, grade, price, pricePer }: DetailsOf<'reclaimed'>): LineFigures {
  return {
    theirGross: theirGross ?? null, acceptedNet: acceptedNet ?? null, grade: grade ?? null,
    rate: price === undefined || pricePer === undefined ? null : { mills: Math.round(price * MILLS_PER_WHOLE), per: pricePer },
    statedCents: null, outcome: 'taken-over',
  }
}

/** The `reclaimed` event of each line of a shipment, by cylinder, as corrections have left it. */
export async function reclaimedEvents(db: Database, shipmentId: string): Promise<Map<string, { id: string, details: DetailsOf<'reclaimed'> }>> {
  const events = await lineEvents(db, { kind: 'shipment', id: shipmentId }, ['reclaimed'])
  return new Map([...events.values()].flat().flatMap(event => event.kind === 'reclaimed' && event.details.shipmentId === shipmentId
    ? [[event.cylinderId, { id: event.id, details: event.details }] as const]
    : []))
}
