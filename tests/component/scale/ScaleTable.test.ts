import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import ScaleTable from '~~/components/scale/ScaleTable.vue'
import type { ScaleLine } from '~~/utils/contract/scales'
import { allByRole, byRole } from '../../helpers/roles'

const scale = (id: string, changes: Partial<ScaleLine>): ScaleLine => ({
  id, name: `Scale ${id}`, accuracy: { unit: 'oz', value: 0.5 }, accuracyPercent: 0.5, lastCheckOn: null, active: true, ...changes,
})

describe('the list of scales', () => {
  it('says of each when it was last checked: over a year ago, or that nobody knows', async () => {
    const scales = [scale('a', { lastCheckOn: '2026-06-15' }), scale('b', { lastCheckOn: '2024-06-15' }), scale('c', {})]
    const table = await mountSuspended(ScaleTable, { props: { scales, today: '2026-12-01', mayManage: false } })
    const rows = table.findAll('tbody tr').map(row => row.text())
    expect(rows[0]).not.toContain('over a year ago')
    expect(rows[1]).toContain('15 Jun 2024, over a year ago')
    expect(rows[2]).toContain('not known')
    expect(allByRole(table.element, 'button')).toHaveLength(0)
  })

  it('lets who may change one and turn it off', async () => {
    const shop = scale('a', {})
    const table = await mountSuspended(ScaleTable, { props: { scales: [shop, scale('b', { active: false })], today: '2026-12-01', mayManage: true } })
    const [change, off, , again] = allByRole(byRole(table.element, 'table'), 'button')
    change!.click()
    off!.click()
    expect(again!.textContent).toContain('Use again')
    expect(table.emitted('edit')).toEqual([[shop]])
    expect(table.emitted('turn')).toEqual([[shop, false]])
  })
})
