import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import FirmTable from '~~/components/firm/FirmTable.vue'
import type { Firm } from '~~/utils/contract/places'
import { allByRole, byRole } from '../../helpers/roles'

const OXBOW: Firm = {
  id: 'f1', name: 'Oxbow Tests', kind: 'requalifier', telephone: '(555) 010-0327', email: 'dock@oxbow.example', address: '27 Kiln Lane', rin: 'Z987', placeId: 'p1', active: true, cylinders: 3,
}
const QUIET: Firm = { ...OXBOW, id: 'f2', name: 'Quiet Supply', kind: 'supplier', telephone: null, email: null, address: null, rin: null, placeId: 'p2', active: false, cylinders: 0 }

describe('the list of firms', () => {
  it('says how to reach each, with its RIN, and leads to the cylinders at its place', async () => {
    const wrapper = await mountSuspended(FirmTable, { props: { firms: [OXBOW, QUIET], mayManage: false } })
    const table = byRole(wrapper.element, 'table', 'Firms')
    const links = allByRole(table, 'link').map(link => link.getAttribute('href'))
    expect(links).toEqual(['/firms/f1', 'tel:5550100327', 'mailto:dock@oxbow.example', '/fleet?place=p1', '/firms/f2'])
    const [oxbow, quiet] = [...table.querySelectorAll('tbody tr')].map(row => row.textContent)
    expect(oxbow).toContain('Z987')
    expect(quiet).toContain('not known')
    expect(quiet).toContain('turned off')
    expect(allByRole(wrapper.element, 'button')).toHaveLength(0)
  })

  it('shows each as a card on a phone, with the same to be done', async () => {
    const wrapper = await mountSuspended(FirmTable, { props: { firms: [OXBOW, QUIET], mayManage: true } })
    const [card, other] = allByRole(wrapper.element, 'listitem')
    expect(card!.textContent).toContain('test station, RIN Z987')
    expect(card!.textContent).toContain('3 cylinders there')
    byRole(card!, 'button', 'Turn off Oxbow Tests').click()
    byRole(other!, 'button', 'Use again Quiet Supply').click()
    byRole(card!, 'button', 'Change Oxbow Tests').click()
    expect(wrapper.emitted('turn')).toEqual([[OXBOW, false], [QUIET, true]])
    expect(wrapper.emitted('edit')).toEqual([[OXBOW]])
  })
})
