import { mountSuspended } from '@nuxt/test-utils/runtime'
import { expect, it } from 'vitest'
import HeatDisclosure from '~~/components/heat/HeatDisclosure.vue'
import { byRole } from '../../helpers/roles'

const props = { sentence: 'At 131 °F it is 92 % full', heat: null }

it('asks for the picture when it is opened, not before', async () => {
  const wrapper = await mountSuspended(HeatDisclosure, { props })
  expect(wrapper.text()).toContain('At 131 °F it is 92 % full')
  expect(wrapper.emitted('open')).toBeUndefined()
  const details = wrapper.element as HTMLDetailsElement
  details.open = true
  await wrapper.trigger('toggle')
  expect(wrapper.emitted('open')!.length).toBeGreaterThan(0)
})

it('says why there is no picture, and tries again', async () => {
  const wrapper = await mountSuspended(HeatDisclosure, { props: { ...props, failed: 'No connection.' } })
  expect(byRole(wrapper.element, 'alert')?.textContent).toContain('No connection.')
  await wrapper.get('button').trigger('click')
  expect(wrapper.emitted('open')).toHaveLength(1)
})
