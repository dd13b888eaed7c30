import { mountSuspended } from '@nuxt/test-utils/runtime'
import { expect, it } from 'vitest'
import CylinderActButton from '~~/components/cylinder/CylinderActButton.vue'
import { byRole } from '../../helpers/roles'

it('is pressed by its word', async () => {
  const wrapper = await mountSuspended(CylinderActButton, { props: { word: 'Weigh' } })
  byRole(wrapper.element, 'button', 'Weigh').click()
  expect(wrapper.emitted('click')).toHaveLength(1)
})

it('leads to a page', async () => {
  const wrapper = await mountSuspended(CylinderActButton, { props: { word: 'Move', to: '/scan' } })
  expect(byRole(wrapper.element, 'link', 'Move').getAttribute('href')).toBe('/scan')
})

it('has a drawing beside its word, which is not heard', async () => {
  const wrapper = await mountSuspended(CylinderActButton, { props: { word: 'Move', icon: 'truck', to: '/scan' } })
  expect(byRole(wrapper.element, 'link', 'Move').querySelector('svg[aria-hidden="true"] path')?.getAttribute('d')).toMatch(/^M/)
})

it('says why it may not be done, can still be reached, and does nothing', async () => {
  const wrapper = await mountSuspended(CylinderActButton, { props: { word: 'Fill', to: '/scan', refusal: 'the retest is late' } })
  const button = byRole(wrapper.element, 'button', /^Fill/)
  expect(button.getAttribute('aria-disabled')).toBe('true')
  expect(wrapper.find(`[id="${button.getAttribute('aria-describedby')}"]`).text()).toBe('the retest is late')
  button.click()
  expect(wrapper.emitted('click')).toBeUndefined()
})
