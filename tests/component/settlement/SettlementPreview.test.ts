import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import SettlementPreview from '~~/components/settlement/SettlementPreview.vue'
import type { CsvPreviewAnswer } from '~~/utils/contract/settlement'
import type { ColumnMapping } from '~~/utils/settlement/statementColumns'
import { byRole } from '../../helpers/roles'
import { settlementLine } from '../../helpers/settlementLine'

const mapping: ColumnMapping = { serial: 0, gross: null, net: 1, unit: null, grade: null, price: null, per: null, credit: null }
const PREVIEW: CsvPreviewAnswer = {
  hash: 'x', delimiter: 'comma', header: { mapping, problems: [], notOurs: ['Remark'] }, notNamed: ['b'],
  rows: [
    { row: 2, serial: 'S-a', cylinderId: 'a', problems: [], changes: [{ field: 'acceptedNet', from: { unit: 'lb', value: 10.5 }, to: { unit: 'lb', value: 11 } }, { field: 'outcome', from: null, to: 'taken-over' }] },
    { row: 3, serial: 'S-x', cylinderId: null, problems: [{ column: 'serial', text: 'No line of this shipment has this serial' }], changes: [] },
  ],
}
const LINES = [settlementLine('a'), settlementLine('b')]

describe('the preview of a statement', () => {
  it('shows row by row what would change and what is wrong, and takes nothing over by itself', async () => {
    const preview = await mountSuspended(SettlementPreview, { props: { preview: PREVIEW, lines: LINES } })
    const rows = preview.findAll('tbody tr').map(row => row.text())
    expect(rows[0]).toContain('accepted net 11.0\u00A0lb, before 10.5\u00A0lb; what became of it taken over')
    expect(rows[1]).toContain('No line of this shipment has this serial')
    expect(preview.text()).toContain('2 rows read. 1 row would change a line. 1 row cannot be taken over and is left out.')
    expect(preview.text()).toContain('Not read: Remark.')
    expect(preview.text()).toContain('1 line of the shipment is not in the file')
    expect(preview.emitted('takeOver')).toBeUndefined()
    byRole(preview.element.parentElement!, 'button', 'Take over 1 row').click()
    expect(preview.emitted('takeOver')).toHaveLength(1)
  })

  it('offers nothing where nothing would change', async () => {
    const preview = await mountSuspended(SettlementPreview, { props: { preview: { ...PREVIEW, rows: PREVIEW.rows.slice(1) }, lines: LINES } })
    expect(byRole(preview.element.parentElement!, 'button', 'Nothing to take over')).toHaveProperty('disabled', true)
  })

  it('shows no rows under a header that cannot be read', async () => {
    const header = { mapping, problems: ['No column holds the serials: choose which one does.'], notOurs: ['a'] }
    const preview = await mountSuspended(SettlementPreview, { props: { preview: { ...PREVIEW, header, rows: [] }, lines: LINES } })
    expect(preview.text()).toContain('No column holds the serials')
    expect(preview.find('table').exists()).toBe(false)
  })
})
