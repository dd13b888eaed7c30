import { mountSuspended } from '@nuxt/test-utils/runtime'
import { expect, it } from 'vitest'
import FleetSelectionBar from '~~/components/fleet/FleetSelectionBar.vue'

const SUM = { count: 2, netGrams: 10_000, contents: [{ refrigerant: 'R-22', count: 2, netGrams: 10_000 }], grossGrams: null, withoutWeight: 1 }

it('shows what is done first as the last and strongest key, and says which was pressed', async () => {
  const wrapper = await mountSuspended(FleetSelectionBar, { props: { sum: SUM, unit: 'kg', offer: { primary: 'ship', others: ['move', 'label'] } } })
  const keys = wrapper.findAll('button')
  expect(keys.map(key => key.text())).toEqual(['Clear', 'Move these', 'Print labels', 'Prepare a shipment with these'])
  await keys[3]!.trigger('click')
  await keys[1]!.trigger('click')
  await keys[0]!.trigger('click')
  expect(wrapper.emitted('act')).toEqual([['ship'], ['move']])
  expect(wrapper.emitted('clear')).toHaveLength(1)
  wrapper.unmount()
})

it('offers nothing but to clear where the person may do nothing with them', async () => {
  const wrapper = await mountSuspended(FleetSelectionBar, { props: { sum: SUM, unit: 'kg', offer: { primary: null, others: [] } } })
  expect(wrapper.findAll('button').map(key => key.text())).toEqual(['Clear'])
  wrapper.unmount()
})
