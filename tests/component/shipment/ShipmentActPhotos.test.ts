import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import ShipmentHistory from '~~/components/shipment/ShipmentHistory.vue'
import type { ShipmentAct } from '~~/utils/shipment/acts'

const DAMAGED: ShipmentAct = {
  id: 'act-1', kind: 'dock-damaged', cylinderId: 'c1', cylinder: { id: 'c1', labelCode: null, serial: 'K-4821' },
  details: { what: 'Collar bent', photoIds: ['p1', 'p2'] }, by: 'Dana', isTheirs: true, occurredAt: '2026-12-01T15:00:00Z', recordedAt: '2026-12-01T15:00:00Z',
}

describe('the photos of what was said at the dock', () => {
  it('stand by it in the history, and say so while they are still on the phone', async () => {
    const history = await mountSuspended(ShipmentHistory, { props: { acts: [DAMAGED], timeZone: 'America/Chicago', now: Date.UTC(2026, 11, 2) } })
    expect(history.text()).toContain('Collar bent')
    expect(history.text()).toContain('Dana, at the dock')
    expect(history.findAll('img').map(img => img.attributes('src'))).toEqual(['/api/uploads/p1?size=thumb', '/api/uploads/p2?size=thumb'])
    await history.findAll('img')[1]!.trigger('error')
    expect(history.findAll('img')).toHaveLength(1)
    expect(history.text()).toContain('Photo on its way')
  })
})
