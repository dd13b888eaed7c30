import { mountSuspended } from '@nuxt/test-utils/runtime'
import { expect, it } from 'vitest'
import RefrigerantCurve from '~~/components/refrigerant/RefrigerantCurve.vue'
import { byRole } from '../../helpers/roles'

const BLEND = [
  { tC: -40, bubblePressureKPa: 101.325, dewPressureKPa: 90 },
  { tC: 0, bubblePressureKPa: 500, dewPressureKPa: 450 },
  { tC: 60, bubblePressureKPa: 1480.276, dewPressureKPa: 1400 },
]
const props = { designation: 'R-0', rows: BLEND, unit: 'psi' as const, reading: { tC: 0, bubblePressureKPa: 500, dewPressureKPa: 450 } }
const plain = (text: string) => text.replaceAll('\u00A0', ' ').replace(/\s+/g, ' ')

it('says in words from where to where the curve runs', async () => {
  const wrapper = await mountSuspended(RefrigerantCurve, { props })
  // 101.325 kPa is 0 psig and 1480.276 kPa 200; −40 °C is −40 °F and 60 °C 140.
  const name = 'Pressure of R-0 over temperature, from 0.0\u00A0psig at −40.0\u00A0°F to 200.0\u00A0psig at 140.0\u00A0°F.'
  expect(byRole(wrapper.element, 'img', name)).toBeTruthy()
})

it('writes the point that was asked for, with the same numbers as the marks', async () => {
  const wrapper = await mountSuspended(RefrigerantCurve, { props })
  // 500 less 101.325 is 398.675 kPa: 57.8 psi, 3.99 bar; 450 less it 348.675: 50.6 psi, 3.49 bar.
  expect(plain(wrapper.find('[role=status]').text())).toBe('At 32.0 °F (0.0 °C): bubble 57.8 psig (3.99 bar), dew 50.6 psig (3.49 bar).')
  // 0 °C lies four tenths of the way from −40 to 60 °C.
  expect(wrapper.find('[data-part=bubble]').attributes('style')).toContain('left: 40%')
  expect(wrapper.find('[data-part=dew]').attributes('style')).toContain('left: 40%')
})

it('says what makes the point doubtful beside it', async () => {
  const wrapper = await mountSuspended(RefrigerantCurve, { props: { ...props, doubt: 'Its bubble point comes out 4 K too cold.' } })
  expect(wrapper.find('[role=status] + p').text()).toBe('In doubt. Its bubble point comes out 4 K too cold.')
})

it('tells bubble and dew apart by their lines and words, not by colour alone', async () => {
  const wrapper = await mountSuspended(RefrigerantCurve, { props })
  expect(wrapper.find('figcaption').text()).toContain('bubble pressure: full of liquid')
  expect(wrapper.find('figcaption').text()).toContain('dew pressure: the last drop')
  expect(wrapper.findAll('path[stroke-dasharray]').length).toBeGreaterThan(0)
})

it('draws one line and one mark for a single substance', async () => {
  const rows = BLEND.map(row => ({ ...row, dewPressureKPa: row.bubblePressureKPa }))
  const wrapper = await mountSuspended(RefrigerantCurve, { props: { ...props, rows, reading: { ...props.reading, dewPressureKPa: 500 } } })
  expect(wrapper.find('[data-part=band]').exists()).toBe(false)
  expect(wrapper.find('[data-part=dew]').exists()).toBe(false)
  expect(wrapper.find('figcaption').text()).toBe('pressure while liquid is left')
})

it('marks nothing while nothing is asked', async () => {
  const wrapper = await mountSuspended(RefrigerantCurve, { props: { ...props, reading: null } })
  expect(wrapper.find('[role=status]').text()).toBe('')
  expect(wrapper.find('[data-part=bubble]').exists()).toBe(false)
})
