import { mountSuspended } from '@nuxt/test-utils/runtime'
import { expect, it } from 'vitest'
import BaseStatusShape from '~~/components/base/BaseStatusShape.vue'
import BaseVerdict from '~~/components/base/BaseVerdict.vue'

const KINDS = ['ok', 'att', 'stop', 'unk'] as const

it('always carries its word beside the shape', async () => {
  const wrapper = await mountSuspended(BaseVerdict, { props: { kind: 'stop', text: 'Retest overdue' } })
  expect(wrapper.text()).toBe('Retest overdue')
  expect(wrapper.find('svg').attributes('aria-hidden')).toBe('true')
})

it('has a shape of its own for each status, so that colour is never alone', async () => {
  const shapes = await Promise.all(KINDS.map(async kind => (await mountSuspended(BaseStatusShape, { props: { kind } })).html()))
  const outlines = shapes.map(html => html.replaceAll(/var\([^)]*\)/g, ''))
  expect(new Set(outlines).size).toBe(4)
})

it('keeps its word as a chip', async () => {
  const wrapper = await mountSuspended(BaseVerdict, { props: { kind: 'att', text: '120 days', chip: true } })
  expect(wrapper.text()).toBe('120 days')
})

it('keeps a designation whole on a narrow screen, and leaves the words as they are', async () => {
  const { element } = await mountSuspended(BaseVerdict, { props: { kind: 'ok', text: 'Room for 3.2 lb of R-410A' } })
  expect(element.textContent!.trim()).toBe('Room for 3.2 lb of R-410A')
  expect([...element.querySelectorAll('.whitespace-nowrap')].map(part => part.textContent)).toEqual(['R-410A'])
})
