import { mountSuspended } from '@nuxt/test-utils/runtime'
import { expect, it } from 'vitest'
import WorkingRules from '~~/components/working/WorkingRules.vue'
import type { FillTerm } from '~~/utils/capacity/types'

// 0.80 x 20 kg = 16 kg.
const WATER: FillTerm = {
  rule: 'water-weight', limitGrams: 16_000, standing: 'in-force', source: 'a guideline',
  factors: [{ name: 'share', value: 0.8, unit: '' }, { name: 'water-capacity', value: 20, unit: 'kg' }],
}

function mounted(terms: FillTerm[], governingRule: FillTerm['rule'] | null) {
  return mountSuspended(WorkingRules, { props: { terms, governingRule, unit: 'kg' as const } })
}

it('sets each rule as an account, the one that governs first', async () => {
  const wrapper = await mounted([{ ...WATER, rule: 'liquid-77F', limitGrams: 17_000 }, WATER], 'water-weight')
  const [first, second] = wrapper.findAll('li')
  expect(first!.text()).toMatch(/water weight.*governs.*16\.00.kg/s)
  expect(first!.findAll('tr').map(row => row.findAll('td, th').map(cell => cell.text()))).toEqual([
    ['', 'share', '0.80', ''], ['×', 'water capacity, WC', '20.00', 'kg'], ['=', 'together', '16.00', 'kg'], ['', 'rounded down', '16.00', 'kg'],
  ])
  expect(second!.text()).not.toContain('governs')
})

it('gives no figure of a rule that would overfill', async () => {
  const wrapper = await mounted([{ ...WATER, limitGrams: null, because: 'unsafe for R-290: liquid-full below 131 °F', standing: 'unsafe' }], null)
  expect(wrapper.text()).toContain('unsafe for this refrigerant')
  expect(wrapper.text()).not.toMatch(/16\.00/)
})

it('says one reason once for all the rules that it silences', async () => {
  const silent = { ...WATER, limitGrams: null, factors: [], because: 'its row alone decides' }
  const wrapper = await mounted([silent, { ...silent, rule: 'liquid-77F' }, { ...silent, rule: 'oily', because: 'no figure at 122 °F' }, { ...WATER, rule: 'filling-density' }], 'filling-density')
  expect(wrapper.findAll('h3').map(title => title.text())).toEqual(['filling density', 'water weight; liquid at 77 °F', 'oily refrigerant'])
  expect(wrapper.text().match(/its row alone decides/g)).toHaveLength(1)
})

it('says why a rule has none', async () => {
  const wrapper = await mounted([{ ...WATER, limitGrams: null, factors: [], because: 'the table does not name R-410A' }], null)
  expect(wrapper.text()).toContain('no figure')
  expect(wrapper.text()).toContain('the table does not name R-410A.')
})

it('folds the sum of a rule that does not govern away on a phone, until it is asked for', async () => {
  const wrapper = await mounted([{ ...WATER, rule: 'liquid-77F', limitGrams: 17_000 }, WATER], 'water-weight')
  const [first, second] = wrapper.findAll('li')
  expect(first!.find('button').exists()).toBe(false)
  const folded = () => second!.find('table').element.parentElement!.classList.contains('hidden')
  const key = second!.find('button')
  expect([folded(), key.attributes('aria-expanded'), key.text()]).toEqual([true, 'false', 'Show its sum: liquid at 77 °F'])
  await key.trigger('click')
  expect([folded(), key.attributes('aria-expanded'), key.text()]).toEqual([false, 'true', 'Hide its sum: liquid at 77 °F'])
})
