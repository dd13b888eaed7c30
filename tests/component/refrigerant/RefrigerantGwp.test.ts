import { mountSuspended } from '@nuxt/test-utils/runtime'
import { expect, it } from 'vitest'
import RefrigerantGwp from '~~/components/refrigerant/RefrigerantGwp.vue'

const PARTS = [
  { component: 'R-32', massPercent: 68.9, gwp: 675, source: '42 USC 7675(c)', known: 'read' as const },
  { component: 'R-1234yf', massPercent: 31.1, gwp: 1, source: '40 CFR 84.64(b)', known: 'reported' as const },
]

it('shows how a blend is summed, with the sources and how each is known', async () => {
  const wrapper = await mountSuspended(RefrigerantGwp, { props: { gwps: [{ basis: 'exchange-value' as const, value: 465.386, parts: PARTS, fromMemory: false }] } })
  expect(wrapper.text()).toContain('US exchange value (40 CFR 84.64)')
  expect(wrapper.text()).toContain('465')
  expect(wrapper.text()).toContain('68.9 % × 675 + 31.1 % × 1')
  expect(wrapper.text()).toContain('42 USC 7675(c); 40 CFR 84.64(b) (reported)')
})

it('writes why there is none, and never a zero', async () => {
  const gwp = { basis: 'AR4' as const, value: null, because: 'R-1234yf without a value', parts: PARTS, fromMemory: false }
  const wrapper = await mountSuspended(RefrigerantGwp, { props: { gwps: [gwp] } })
  expect(wrapper.text()).toContain('– not known')
  expect(wrapper.text()).toContain('R-1234yf without a value.')
  expect(wrapper.text()).not.toContain('×')
})
