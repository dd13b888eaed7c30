import { mountSuspended } from '@nuxt/test-utils/runtime'
import { expect, it } from 'vitest'
import BaseCard from '~~/components/base/BaseCard.vue'
import { byRole } from '../../helpers/roles'

it('is a region named by its title', async () => {
  const wrapper = await mountSuspended(BaseCard, { props: { title: 'Its label' }, attachTo: document.body })
  expect(byRole(wrapper.element, 'region', 'Its label')).toBeTruthy()
  expect(byRole(wrapper.element, 'heading', 'Its label').tagName).toBe('H2')
  wrapper.unmount()
})

it('is a region named by its label where no title is drawn', async () => {
  const wrapper = await mountSuspended(BaseCard, { props: { label: 'Stop weight' }, slots: { default: () => '66.0' } })
  expect(byRole(wrapper.element, 'region', 'Stop weight').textContent).toContain('66.0')
})
