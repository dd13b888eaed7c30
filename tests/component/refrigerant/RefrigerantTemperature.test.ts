import { mountSuspended } from '@nuxt/test-utils/runtime'
import { expect, it } from 'vitest'
import RefrigerantTemperature from '~~/components/refrigerant/RefrigerantTemperature.vue'

const props = { leastC: -40, mostC: 60, unit: 'psi' as const, modelValue: '77' }

it('is moved by the arrow keys, a degree at a time, and stops at the ends of the table', async () => {
  const wrapper = await mountSuspended(RefrigerantTemperature, { props })
  const field = wrapper.find('input[inputmode]')
  await field.trigger('keydown', { key: 'ArrowUp' })
  await field.trigger('keydown', { key: 'ArrowDown' })
  expect(wrapper.emitted('update:modelValue')).toEqual([['78'], ['77']])
  // 60 °C is 140 °F.
  await wrapper.setProps({ modelValue: '140' })
  await field.trigger('keydown', { key: 'ArrowUp' })
  expect(wrapper.emitted('update:modelValue')?.at(-1)).toEqual(['140'])
})

it('says between what the table lies, in the unit of the thermometer', async () => {
  const wrapper = await mountSuspended(RefrigerantTemperature, { props })
  expect(wrapper.text()).toContain('From −40 to 140 °F')
  await wrapper.setProps({ unit: 'bar' })
  expect(wrapper.text()).toContain('From −40 to 60 °C')
})

it('says beside the field what is wrong with it', async () => {
  const wrapper = await mountSuspended(RefrigerantTemperature, { props: { ...props, error: 'R-0 has saturation data to 60 °C.' } })
  expect(wrapper.text()).toContain('R-0 has saturation data to 60 °C.')
  expect(wrapper.find('input[inputmode]').attributes('aria-invalid')).toBe('true')
})
