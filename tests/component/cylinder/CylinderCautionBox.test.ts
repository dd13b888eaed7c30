import { mountSuspended } from '@nuxt/test-utils/runtime'
import { expect, it } from 'vitest'
import CylinderCautionBox from '~~/components/cylinder/CylinderCautionBox.vue'

it('lists the cautions of its topics and what always holds', async () => {
  const wrapper = await mountSuspended(CylinderCautionBox, { props: { topics: ['not-refillable'] } })
  expect(wrapper.findAll('li').map(item => item.text())).toEqual(['A non-refillable cylinder is never filled again, whatever it held.'])
  expect(wrapper.text()).toContain('Collarbook computes; it does not license.')
  expect(wrapper.find('details').element.open).toBe(true)
})

it('stays folded where it was asked to', async () => {
  const wrapper = await mountSuspended(CylinderCautionBox, { props: { topics: ['filling'], folded: true } })
  expect(wrapper.find('details').element.open).toBe(false)
})
