import { mountSuspended } from '@nuxt/test-utils/runtime'
import { expect, it } from 'vitest'
import CylinderCautionBox from '~~/components/cylinder/CylinderCautionBox.vue'

it('lists the cautions of its topics and what always holds', async () => {
  const wrapper = await mountSuspended(CylinderCautionBox, { props: { topics: ['not-refillable'] } })
  expect(wrapper.findAll('li').map(item => item.text())).toEqual(['A non-refillable cylinder is never filled again, whatever it held.'])
  expect(wrapper.text()).toContain('Collarbook computes; it does not license.')
  expect(wrapper.find('details').element.open).toBe(true)
})

it('folded keeps its first caution in sight, and says it once', async () => {
  const wrapper = await mountSuspended(CylinderCautionBox, { props: { topics: ['filling'], folded: true } })
  expect(wrapper.find('details').element.open).toBe(false)
  expect(wrapper.find('summary').text()).toContain('Wear eye and hand protection: escaping liquid freezes skin and eyes.')
  expect(wrapper.findAll('li').map(item => item.text())).toEqual([
    'Watch the scale to the stop weight; do not go by time or by feel.',
    'Put one refrigerant in a cylinder, never a second.',
    'Work where air moves: vapor gathers low and pushes the air out.',
  ])
})
