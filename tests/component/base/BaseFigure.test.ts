import { mountSuspended } from '@nuxt/test-utils/runtime'
import { expect, it } from 'vitest'
import BaseFigure from '~~/components/base/BaseFigure.vue'

it('sets a figure with its unit after a narrow space', async () => {
  const wrapper = await mountSuspended(BaseFigure, { props: { label: 'Room', value: '15.5', unit: 'lb' } })
  expect(wrapper.text()).toContain('15.5\u202Flb')
})

it('shows nothing in it as a figure', async () => {
  const wrapper = await mountSuspended(BaseFigure, { props: { label: 'Net', value: '0.0', unit: 'lb' } })
  expect(wrapper.text()).toContain('0.0')
})

it('gives the reason for a figure that is not known, and no 0', async () => {
  const wrapper = await mountSuspended(BaseFigure, { props: { label: 'Net', value: null, unit: 'lb', reason: 'not weighed since 21 October' } })
  expect(wrapper.text()).toContain('– not weighed since 21 October')
  expect(wrapper.text()).not.toContain('lb')
})
