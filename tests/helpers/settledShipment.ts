import { randomUUID } from 'node:crypto'
import type { SettlementAnswer } from '../../utils/contract/settlement'
import { NOTHING_SAID, type LineFigures } from '../../utils/settlement/figures'
import type { TestClient } from './client'

/** Settles a shipment: every line is taken over with these figures. */
export async function settledWith(client: TestClient, shipmentId: string, figures: Partial<LineFigures>): Promise<SettlementAnswer> {
  const path = `/api/shipments/${shipmentId}/settlement`
  const act = () => ({ id: randomUUID(), occurredAt: new Date().toISOString() })
  const { body: before } = await client.get<SettlementAnswer>(path)
  const lines = before.lines.map(({ cylinder }) => ({ cylinderId: cylinder.id, ...NOTHING_SAID, ...figures, outcome: 'taken-over' }))
  const { body: entered } = await client.put<SettlementAnswer>(`${path}/lines`, { ...act(), revision: before.revision, lines })
  const settling = entered.lines.map(({ cylinder, version }) => ({ cylinderId: cylinder.id, eventId: randomUUID(), expects: version }))
  const { status, body } = await client.post<SettlementAnswer>(`${path}/settle`, { ...act(), revision: entered.revision, lines: settling })
  if (status !== 200) throw new Error(`Settling answered ${status}: ${JSON.stringify(body)}`)
  return body
}
