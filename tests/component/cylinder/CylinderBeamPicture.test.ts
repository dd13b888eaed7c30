import { mountSuspended } from '@nuxt/test-utils/runtime'
import { expect, it } from 'vitest'
import CylinderBeamPicture from '~~/components/cylinder/CylinderBeamPicture.vue'
import { allByRole, byRole } from '../../helpers/roles'

const props = { tareGrams: 10_000, nowGrams: 16_000, stopGrams: 18_000, waterFullGrams: 20_000, unit: 'kg' as const }

it('carries its numbers in words', async () => {
  const wrapper = await mountSuspended(CylinderBeamPicture, { props })
  expect(byRole(wrapper.element, 'img', /tare 10\.00.kg, now 16\.00.kg, stop at 18\.00.kg/)).toBeTruthy()
  expect(wrapper.find('[data-part=over]').exists()).toBe(false)
})

it('draws an excess solid past the line', async () => {
  const wrapper = await mountSuspended(CylinderBeamPicture, { props: { ...props, nowGrams: 19_000 } })
  const over = wrapper.find('[data-part=over]')
  expect(over.attributes('style')).toContain('left: 80%')
  expect(over.attributes('style')).toContain('width: 10%')
  expect(byRole(wrapper.element, 'img', /1\.00.kg above the stop/)).toBeTruthy()
})

it.each(['tareGrams', 'nowGrams', 'stopGrams', 'waterFullGrams'])('draws no bar while %s is not known', async (missing) => {
  const wrapper = await mountSuspended(CylinderBeamPicture, { props: { ...props, [missing]: null, reason: 'Not weighed since 21 October.' } })
  expect(allByRole(wrapper.element, 'img')).toHaveLength(0)
  expect(wrapper.text()).toBe('Not weighed since 21 October.')
})
