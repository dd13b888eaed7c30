import { mountSuspended } from '@nuxt/test-utils/runtime'
import { expect, it } from 'vitest'
import CylinderFillBar from '~~/components/cylinder/CylinderFillBar.vue'
import { allByRole, byRole } from '../../helpers/roles'

const props = { netGrams: 4_000, limitGrams: 8_009, waterGrams: 10_000, unit: 'kg' as const }

it('names net and limit, the limit rounded down', async () => {
  const wrapper = await mountSuspended(CylinderFillBar, { props })
  expect(byRole(wrapper.element, 'img', '4.00\u00A0kg of 8.00\u00A0kg')).toBeTruthy()
  expect(wrapper.text()).toBe('4.00 / 8.00')
})

it('draws an excess', async () => {
  const wrapper = await mountSuspended(CylinderFillBar, { props: { ...props, netGrams: 9_000 } })
  expect(wrapper.find('[data-part=over]').exists()).toBe(true)
})

it('draws an empty cylinder as a bar with nothing in it', async () => {
  const wrapper = await mountSuspended(CylinderFillBar, { props: { ...props, netGrams: 0 } })
  expect(byRole(wrapper.element, 'img', '0.00\u00A0kg of 8.00\u00A0kg')).toBeTruthy()
})

it('draws no bar without a limit, and still gives the net', async () => {
  const wrapper = await mountSuspended(CylinderFillBar, { props: { ...props, limitGrams: null } })
  expect(allByRole(wrapper.element, 'img')).toHaveLength(0)
  expect(wrapper.text()).toBe('4.00\u00A0kg net, no limit')
})

it('draws no bar while the net is not known', async () => {
  const wrapper = await mountSuspended(CylinderFillBar, { props: { ...props, netGrams: null } })
  expect(wrapper.text()).toBe('– not known')
})
