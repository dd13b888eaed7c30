import type { ShipmentState } from '../contract/shipments'
import type { StatusKind } from '../picture/status'

/** What each state of a shipment is called, and how it is drawn. */
export const STATE_WORDS: Readonly<Record<ShipmentState, { kind: StatusKind, text: string }>> = {
  draft: { kind: 'att', text: 'Draft' },
  ready: { kind: 'ok', text: 'Ready' },
  dispatched: { kind: 'away', text: 'Dispatched' },
  arrived: { kind: 'away', text: 'Arrived' },
  settled: { kind: 'att', text: 'Settled' },
  closed: { kind: 'ok', text: 'Closed' },
  cancelled: { kind: 'unk', text: 'Given up' },
}
