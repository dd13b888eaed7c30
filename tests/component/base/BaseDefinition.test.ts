import { mountSuspended } from '@nuxt/test-utils/runtime'
import { expect, it } from 'vitest'
import BaseDefinition from '~~/components/base/BaseDefinition.vue'

it('sets each term beside its value, and a reason where there is none', async () => {
  const wrapper = await mountSuspended(BaseDefinition, {
    props: { rows: [{ term: 'Last test mark', value: 'April 2026' }, { term: 'Due by', value: null, reason: 'no interval for this specification' }] },
  })
  expect(wrapper.findAll('dt').map(term => term.text())).toEqual(['Last test mark', 'Due by'])
  expect(wrapper.findAll('dd').map(value => value.text())).toEqual(['April 2026', '– no interval for this specification'])
})
