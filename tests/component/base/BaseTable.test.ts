import { mountSuspended } from '@nuxt/test-utils/runtime'
import { h } from 'vue'
import { describe, expect, it } from 'vitest'
import BaseTable from '~~/components/base/BaseTable.vue'
import { allByRole, byRole } from '../../helpers/roles'

type Line = { code: string, room: string | null }

const props = {
  caption: 'Fleet',
  columns: [{ key: 'code', label: 'Code', names: true, stick: '9rem', sortable: true }, { key: 'room', label: 'Room', align: 'end' as const, sortable: true }],
  rows: [{ code: '7K3 M9Q 2TX', room: '15.5' }, { code: 'SPN 2VT 2FM', room: null }] as unknown[],
  rowKey: (row: unknown) => (row as Line).code,
  sort: { key: 'room', descending: true },
}

describe('a table', () => {
  it('is a plain table with its name and a header for each column and row', async () => {
    const wrapper = await mountSuspended(BaseTable, { props })
    expect(byRole(wrapper.element, 'table', 'Fleet')).toBeTruthy()
    expect(allByRole(wrapper.element, 'columnheader')).toHaveLength(2)
    expect(byRole(wrapper.element, 'rowheader', '7K3 M9Q 2TX')).toBeTruthy()
  })

  it('writes what is not known as a dash, never as 0', async () => {
    const wrapper = await mountSuspended(BaseTable, { props })
    expect(wrapper.findAll('tbody tr')[1]!.find('td').text()).toBe('–')
  })

  it('says only of the sorted column how it is sorted, and asks for another by a button', async () => {
    const wrapper = await mountSuspended(BaseTable, { props })
    const headers = allByRole(wrapper.element, 'columnheader').map(header => header.getAttribute('aria-sort'))
    expect(headers).toEqual([null, 'descending'])
    byRole(wrapper.element, 'button', 'Code').click()
    expect(wrapper.emitted('sort')).toEqual([['code']])
  })

  it('gives each row its box, its cells and its card to draw', async () => {
    const wrapper = await mountSuspended(BaseTable, {
      props: { ...props, picked: (row: unknown) => (row as Line).room === null },
      slots: {
        'select': (scope: { row: unknown }) => h('input', { 'type': 'checkbox', 'aria-label': `Choose ${(scope.row as Line).code}` }),
        'cell-room': (scope: { row: unknown }) => `room ${(scope.row as Line).room}`,
        'card': (scope: { row: unknown }) => `card of ${(scope.row as Line).code}`,
      },
    })
    expect(byRole(wrapper.element, 'checkbox', 'Choose SPN 2VT 2FM')).toBeTruthy()
    expect(wrapper.find('tbody').text()).toContain('room 15.5')
    expect(allByRole(wrapper.element, 'listitem').map(item => item.textContent)).toEqual(['card of 7K3 M9Q 2TX', 'card of SPN 2VT 2FM'])
    expect(wrapper.findAll('tbody tr').map(row => row.classes('bg-picked'))).toEqual([false, true])
  })

  it('shows why it is empty in place of an empty table', async () => {
    const wrapper = await mountSuspended(BaseTable, { props: { ...props, rows: [] }, slots: { empty: () => 'No cylinder has this filter.' } })
    expect(wrapper.text()).toBe('No cylinder has this filter.')
  })
})
