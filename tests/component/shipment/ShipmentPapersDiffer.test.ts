import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import ShipmentPapersDiffer from '~~/components/shipment/ShipmentPapersDiffer.vue'
import { cylinderRow } from '~~/tests/helpers/cylinderRow'
import type { PaperDifference } from '~~/utils/contract/shipments'

const sent = { gross: { unit: 'kg' as const, value: 20 }, grossGrams: 20_000, refrigerant: 'R-22', condition: 'clean', netGrams: 8_000 }
const line = (id: string, differs?: PaperDifference) => ({ cylinder: cylinderRow({ id }), version: 4, because: [], weighed: null, sent, received: null, returnedAt: null, ...differs && { differs } })

describe('papers that differ from the log', () => {
  it('stand beside what the log says now, line by line, and only where they differ', async () => {
    const card = await mountSuspended(ShipmentPapersDiffer, { props: { unit: 'kg', lines: [
      line('01900000-0000-7000-8000-000000000001'),
      line('01900000-0000-7000-8000-000000000002', { logged: { refrigerant: null, condition: 'mixed', netGrams: null } }),
      line('01900000-0000-7000-8000-000000000003', { logged: null }),
    ] } })
    expect(card.text()).toContain('changed 2 lines')
    const rows = card.findAll('tbody tr').map(row => row.text().replace(/\u00A0/g, ' '))
    expect(rows).toHaveLength(2)
    expect(rows[0]).toContain('R-22, clean, 8.00 kg net')
    expect(rows[0]).toContain('refrigerant not known, mixed, net not known')
    expect(rows[1]).toContain('It did not leave with this shipment')
  })
})
