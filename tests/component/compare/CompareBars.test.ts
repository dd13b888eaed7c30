import { mountSuspended } from '@nuxt/test-utils/runtime'
import { expect, it } from 'vitest'
import CompareBars from '~~/components/compare/CompareBars.vue'
import type { FillTerm } from '~~/utils/capacity/types'
import { byRole } from '../../helpers/roles'

// Liquid-full at 20 L x 1 kg/L = 20 kg: the scale goes to 22 kg.
const TERMS: FillTerm[] = [
  { rule: 'water-weight', limitGrams: 11_000, standing: 'in-force', factors: [], source: '' },
  { rule: 'liquid-77F', limitGrams: null, standing: 'unsafe', factors: [], source: '' },
  { rule: 'filling-density', limitGrams: null, standing: 'in-force', factors: [], source: '', because: 'not named' },
  { rule: 'hot-ceiling', limitGrams: 19_000, standing: 'in-force', source: '', factors: [
    { name: 'share', value: 0.95, unit: '' }, { name: 'volume', value: 20, unit: 'L' }, { name: 'liquid-density', value: 1, unit: 'kg/L', atC: 55 },
  ] },
]

it('marks each limit on one scale and writes every figure', async () => {
  const wrapper = await mountSuspended(CompareBars, { props: { terms: TERMS, governingRule: 'water-weight', unit: 'kg' } })
  expect(byRole(wrapper.element, 'img', /water weight 11\.00.kg, governs;.*liquid-full at 131 °F 20\.00.kg/)).toBeTruthy()
  const marks = wrapper.findAll('[data-part=limit]')
  expect(marks).toHaveLength(2)
  expect(marks[0]!.attributes('style')).toContain('left: 50%')
  expect(wrapper.text()).toContain('unsafe for this refrigerant')
  expect(wrapper.text()).toContain('No figure: filling density.')
})

it('draws nothing where no rule has a figure', async () => {
  const wrapper = await mountSuspended(CompareBars, { props: { terms: TERMS.slice(2, 3), governingRule: null, unit: 'kg' } })
  expect(wrapper.find('figure').exists()).toBe(false)
})
