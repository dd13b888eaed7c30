import { mountSuspended } from '@nuxt/test-utils/runtime'
import { expect, it } from 'vitest'
import CylinderStampPlate from '~~/components/cylinder/CylinderStampPlate.vue'
import { byRole } from '../../helpers/roles'

it('shows the code in three threes with what is stamped on the collar', async () => {
  const wrapper = await mountSuspended(CylinderStampPlate, {
    props: { code: '7K3M9Q2TX', contents: 'R-410A', serial: 'K48213', specification: '4BA400', waterCapacity: '47.7 lb', tareWeight: '27.9 lb' },
  })
  expect(wrapper.text()).toContain('7K3 M9Q 2TX')
  expect(wrapper.text()).toContain('R-410A')
  expect(wrapper.findAll('dd').map(mark => mark.text())).toEqual(['K48213', '4BA400', '47.7 lb', '27.9 lb'])
  expect(wrapper.findAll('dt .sr-only').map(term => term.text())).toEqual(['Serial', 'Specification', 'Water capacity', 'Tare weight'])
})

it('says that a mark is not known, and that there is no label', async () => {
  const wrapper = await mountSuspended(CylinderStampPlate, { props: { code: null, serial: 'K48213' } })
  expect(wrapper.text()).toContain('no label')
  expect(wrapper.findAll('dd').at(-1)!.text()).toBe('–not known')
})

it('heads its page with the code where it is asked to', async () => {
  const wrapper = await mountSuspended(CylinderStampPlate, { props: { code: '7K3 M9Q 2TX', heading: true } })
  expect(byRole(wrapper.element, 'heading', '7K3 M9Q 2TX').tagName).toBe('H1')
})
