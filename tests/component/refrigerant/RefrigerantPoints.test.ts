import { mountSuspended } from '@nuxt/test-utils/runtime'
import { expect, it } from 'vitest'
import RefrigerantPoints from '~~/components/refrigerant/RefrigerantPoints.vue'
import type { Saturation } from '~~/utils/refrigerant/saturation'
import { byRole } from '../../helpers/roles'

const saturation: Saturation = {
  liquidDensity: 1000, vapourDensity: 20, bubblePressureKPa: 500, dewPressureKPa: 450,
  relativeErrorDensity: 0.003, relativeErrorPressure: 0.005, accuracyGroup: 'A', doubt: null, source: '',
}
const point = (temperatureF: number, at: Saturation | null) => ({ temperatureF, temperatureC: (temperatureF - 32) * 5 / 9, saturation: at })
const props = { points: [point(32, saturation), point(77, null), point(131, null)], unit: 'psi' as const, criticalC: 50 }
const rows = (text: string) => text.replaceAll('\u00A0', ' ').replace(/\s+/g, ' ')

it('gives bubble and dew pressure in both units, and the density', async () => {
  const wrapper = await mountSuspended(RefrigerantPoints, { props })
  // 398.675 kPa gauge is 57.8 psi and 3.99 bar; 348.675 is 50.6 psi and 3.49 bar.
  const cells = wrapper.findAll('tbody tr')[0]!.findAll('td').map(cell => rows(cell.text()))
  expect(cells).toEqual(['57.8 3.99', '50.6 3.49', '1.000'])
  expect(byRole(wrapper.element, 'columnheader', /Bubble, psig/)).toBeTruthy()
})

it('says why there is no figure, and never writes one', async () => {
  const wrapper = await mountSuspended(RefrigerantPoints, { props })
  const [, cool, hot] = wrapper.findAll('tbody tr')
  expect(cool!.text()).toContain('past the end of its table')
  // 131 °F is 55 °C, above the critical 50.
  expect(hot!.text()).toContain('no liquid')
})

it('does not write the same pressure twice', async () => {
  const wrapper = await mountSuspended(RefrigerantPoints, { props: { ...props, points: [point(32, { ...saturation, dewPressureKPa: 500 })] } })
  expect(wrapper.findAll('td')[1]!.text()).toBe('the same')
})
