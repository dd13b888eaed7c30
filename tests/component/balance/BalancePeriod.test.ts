import { mountSuspended } from '@nuxt/test-utils/runtime'
import { expect, it } from 'vitest'
import BalancePeriod from '~~/components/balance/BalancePeriod.vue'
import { byRole } from '../../helpers/roles'

async function mount(period: 'this-month' | 'days' = 'this-month') {
  const wrapper = await mountSuspended(BalancePeriod, { props: { period, days: { from: '2026-12-01', to: '2026-12-09' } } })
  const press = async (name: string) => {
    byRole(wrapper.element, 'button', name).click()
    await wrapper.vm.$nextTick()
  }
  return { wrapper, press, days: () => wrapper.findAll('input') }
}

it('asks for a named period at once', async () => {
  const { wrapper, press } = await mount()
  await press('Last month')
  expect(wrapper.emitted('name')).toEqual([['last-month']])
})

it('begins two days with those that are shown, and asks for them when both are given in order', async () => {
  const { wrapper, press, days } = await mount()
  await press('Between two days')
  expect(days().map(input => input.element.value)).toEqual(['2026-12-01', '2026-12-09'])
  await days()[0]!.setValue('2026-12-10')
  await wrapper.find('form').trigger('submit')
  expect(wrapper.text()).toContain('The last day comes before the first.')
  await days()[0]!.setValue('2026-12-09')
  await wrapper.find('form').trigger('submit')
  expect(wrapper.emitted('days')).toEqual([[{ from: '2026-12-09', to: '2026-12-09' }]])
})

it('asks for both days', async () => {
  const { wrapper, days } = await mount('days')
  await days()[1]!.setValue('')
  await wrapper.find('form').trigger('submit')
  expect(wrapper.text()).toContain('Give both days.')
  expect(wrapper.emitted('days')).toBeUndefined()
})
