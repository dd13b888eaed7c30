import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import FleetTable from '~~/components/fleet/FleetTable.vue'
import { FIRST_LAYOUT } from '~~/utils/contract/fleetLayout'
import type { CylinderRow } from '~~/utils/custody/cylinderView'
import { cylinderRow } from '../../helpers/cylinderRow'
import { allByRole, byRole } from '../../helpers/roles'

const NOW = Date.parse('2026-12-01T18:00:00Z')

const OVERFILLED = cylinderRow({
  id: 'over', labelCode: '0YHP9KRRT', netGrams: 17_600, roomGrams: -328,
  worstFinding: { code: 'overfill', severity: 'stop' }, findingCodes: ['overfill'],
})
const UNKNOWN = cylinderRow({
  id: 'unknown', labelCode: null, serial: 'P90144', refrigerant: null, netGrams: 5_715, fillLimitGrams: null, governingRule: null,
  roomGrams: null, stopWeightGrams: null, exactStopWeightGrams: null, dueMonth: null,
})

function mount(rows: CylinderRow[], change: Record<string, unknown> = {}) {
  return mountSuspended(FleetTable, {
    props: {
      rows, columns: FIRST_LAYOUT.columns, density: 'compact', unit: 'lb', now: NOW, timeZone: 'America/Phoenix', sort: { key: 'urgency', descending: false },
      linkOf: (row: CylinderRow) => `/?page=${row.id}`, stepLinkOf: (row: CylinderRow) => `/?step=${row.id}`, ...change,
    },
  })
}

function cellsOf(root: Element, name: string): string[] {
  const row = byRole(root, 'rowheader', name).closest('tr')!
  return [...row.querySelectorAll('th,td')].map(cell => cell.textContent!.replaceAll(/\s+/g, ' ').trim())
}

describe('the fleet', () => {
  it('says of each cylinder in words how it stands, and what to do next', async () => {
    const wrapper = await mount([OVERFILLED, cylinderRow()])
    const over = cellsOf(wrapper.element, '0YH P9K RRT')
    expect(over).toContain('Overfilled')
    expect(over.at(-1)).toBe('Draw it down')
    expect(cellsOf(wrapper.element, '7K3 M9Q 2TX')).toContain('Usable')
  })

  it('names another owner, and says where none is named', async () => {
    const theirs = cylinderRow({ id: 'theirs', labelCode: '0YHP9KRRT', owner: { id: 'd', name: 'Dunmarrow Dairy' } })
    const wrapper = await mount([theirs, cylinderRow()], { columns: ['code', 'verdict', 'owner'] })
    expect(cellsOf(wrapper.element, '0YH P9K RRT')).toContain('Dunmarrow Dairy')
    expect(cellsOf(wrapper.element, '7K3 M9Q 2TX')).toContain('no other')
  })

  // 10251 g are 22.6 lb; 17272 g are 38.08 lb; 29746.6 g are 65.58 lb, and 7021 g are 15.48 lb: the last three go down.
  it('writes weights under a head that names the unit, limits rounded down', async () => {
    const wrapper = await mount([cylinderRow()])
    expect(byRole(wrapper.element, 'columnheader', /^Stop, lb/)).toBeTruthy()
    const cells = cellsOf(wrapper.element, '7K3 M9Q 2TX')
    expect(cells).toContain('22.6 / 38.0')
    expect(cells).toContain('15.4')
    expect(cells).toContain('65.5')
  })

  it('shows an overfill as negative room', async () => {
    const wrapper = await mount([OVERFILLED])
    expect(cellsOf(wrapper.element, '0YH P9K RRT')).toContain('\u22120.8')
  })

  it('writes a dash for what is not known, never a nought', async () => {
    const wrapper = await mount([UNKNOWN])
    const cells = cellsOf(wrapper.element, 'P90144')
    expect(cells).toContain('Unknown, no limit')
    expect(cells).toContain('–not known')
    expect(cells).toContain('–none can be given')
    expect(cells.join(' ')).not.toMatch(/\b0\.0\b/)
  })

  it('marks the sorted column alone, and turns its order when it is pressed again', async () => {
    const wrapper = await mount([cylinderRow()], { sort: { key: 'net', descending: false } })
    const sorted = allByRole(wrapper.element, 'columnheader').filter(head => head.hasAttribute('aria-sort'))
    expect(sorted.map(head => head.getAttribute('aria-sort'))).toEqual(['ascending'])
    byRole(sorted[0]!, 'button').click()
    byRole(byRole(wrapper.element, 'columnheader', /^Retest/), 'button').click()
    expect(wrapper.emitted('sort')).toEqual([[{ key: 'net', descending: true }], [{ key: 'due', descending: false }]])
  })

  it('offers no sorting where the server has none', async () => {
    const wrapper = await mount([cylinderRow()])
    expect(allByRole(byRole(wrapper.element, 'columnheader', /^Limit by/), 'button')).toEqual([])
  })

  it('chooses one cylinder, and all of the page', async () => {
    const wrapper = await mount([OVERFILLED, UNKNOWN], { picked: [] })
    const table = byRole(wrapper.element, 'table')
    await wrapper.find('table input[aria-label="Choose 0YH P9K RRT"]').setValue(true)
    expect(wrapper.emitted('update:picked')).toEqual([[['over']]])
    await wrapper.find('table input[aria-label="Choose all on this page"]').setValue(true)
    expect(wrapper.emitted('update:picked')!.at(-1)).toEqual([['over', 'unknown']])
    expect(table).toBeTruthy()
  })

  it('chooses with the space bar on a code, and opens with Enter on a box', async () => {
    const wrapper = await mount([OVERFILLED], { picked: [] })
    const link = byRole(wrapper.element, 'rowheader', '0YH P9K RRT').querySelector('a')!
    const space = new KeyboardEvent('keydown', { key: ' ', cancelable: true, bubbles: true })
    link.dispatchEvent(space)
    expect(space.defaultPrevented).toBe(true)
    expect(wrapper.emitted('update:picked')).toEqual([[['over']]])
    await wrapper.find('table input[aria-label="Choose 0YH P9K RRT"]').trigger('keydown', { key: 'Enter' })
    expect(wrapper.emitted('open')!.map(([row]) => (row as CylinderRow).id)).toEqual(['over'])
  })

  it('keeps what was chosen on another page', async () => {
    const wrapper = await mount([OVERFILLED], { picked: ['elsewhere'] })
    await wrapper.find('table input[aria-label="Choose all on this page"]').setValue(true)
    expect(wrapper.emitted('update:picked')).toEqual([[['elsewhere', 'over']]])
  })

  it('shows the columns that were asked for, in their order, and what to do behind them', async () => {
    const wrapper = await mount([cylinderRow()], { columns: ['code', 'verdict', 'tare', 'lifecycle', 'serial'] })
    const heads = allByRole(wrapper.element, 'columnheader').map(head => head.textContent!.trim())
    expect(heads.slice(1)).toEqual(['Code', 'Verdict', 'TW, lb', 'Stage of life', 'Serial', 'Next step'])
    // 12474 g are 27.50 lb.
    expect(cellsOf(wrapper.element, '7K3 M9Q 2TX').slice(1)).toEqual(['7K3 M9Q 2TX', 'Usable', '27.5', 'in service', 'K48213', 'Fill it'])
  })
})
