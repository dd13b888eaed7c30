import { mountSuspended } from '@nuxt/test-utils/runtime'
import { expect, it } from 'vitest'
import HeatPicture from '~~/components/heat/HeatPicture.vue'
import { heatOf } from '~~/utils/picture/heat'
import { CATALOGUE } from '~~/utils/refrigerant/allRefrigerants'
import { byRole } from '../../helpers/roles'

// 20 kg of water are 20.02 L.
function heat(refrigerant: string, netGrams: number) {
  return heatOf({ refrigerant, netGrams, ofLimit: false, waterCapacity: { unit: 'kg', value: 20 } }, CATALOGUE)!
}

it('carries its numbers in words', async () => {
  const wrapper = await mountSuspended(HeatPicture, { props: { heat: heat('R-22', 16_000) } })
  expect(byRole(wrapper.element, 'img', /at 77.°F 66.% of the volume liquid, at 131.°F 73.%/)).toBeTruthy()
  expect(wrapper.get('figcaption').text()).toContain('liquid-full above')
  expect(wrapper.find('[data-part=liquid-full]').exists()).toBe(false)
})

it('reads share and pressure wherever the temperature is stepped to, beginning at 131 F', async () => {
  const wrapper = await mountSuspended(HeatPicture, { props: { heat: heat('R-22', 16_000) } })
  const slider = wrapper.get('input[type=range]')
  expect(wrapper.get('output').text()).toMatch(/^131.°F \(55.°C\): 73.% of the volume is liquid/)
  await slider.setValue(77)
  expect(wrapper.get('output').text()).toMatch(/^77.°F \(25.°C\): 66.% of the volume is liquid, 137.psig$/)
  expect(slider.attributes('aria-valuetext')).toBe(wrapper.get('output').text())
})

it('hatches the heat in which no vapor is left', async () => {
  const wrapper = await mountSuspended(HeatPicture, { props: { heat: heat('R-22', 23_000) } })
  expect(wrapper.find('[data-part=liquid-full]').exists()).toBe(true)
  await wrapper.get('input[type=range]').setValue(158)
  expect(wrapper.get('output').text()).toContain('liquid-full. No vapor is left')
})

it('shows the pressure of a gas, and asks no 80 % of it', async () => {
  const wrapper = await mountSuspended(HeatPicture, { props: { heat: heat('R-744', 13_600) } })
  expect(wrapper.text()).toContain('psig')
  expect(wrapper.text()).not.toContain('Why 80 %')
})
