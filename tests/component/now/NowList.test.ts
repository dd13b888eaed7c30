import { mountSuspended } from '@nuxt/test-utils/runtime'
import { expect, it } from 'vitest'
import NowList from '~~/components/now/NowList.vue'
import NowTop from '~~/components/now/NowTop.vue'
import type { NowLine } from '~~/utils/contract/now'
import { allByRole, byRole } from '../../helpers/roles'

const line = (topic: string, change: Partial<NowLine> = {}): NowLine => ({
  key: topic, topic, kind: 'att', number: 2, sentence: `2 ${topic}.`, reason: 'In Main shop.', verb: 'Start a shipment', to: '/shipments?with=a,b', ...change,
})

it('gives every line its sentence, its reason and one way to clear it', async () => {
  const list = await mountSuspended(NowList, { props: { lines: [line('full'), line('late', { kind: 'stop', verb: 'Show the 2', to: '/fleet?finding=retest-overdue' })] } })
  const items = allByRole(list.element, 'listitem')
  expect(items).toHaveLength(2)
  expect(items[0]!.textContent).toMatch(/2 full\.\s*In Main shop\./)
  expect(allByRole(items[0]!, 'link')).toHaveLength(1)
  expect(byRole(items[0]!, 'link', 'Start a shipment: 2 full.').getAttribute('href')).toBe('/shipments?with=a,b')
  expect(byRole(items[1]!, 'link', 'Show the 2: 2 late.').getAttribute('href')).toBe('/fleet?finding=retest-overdue')
})

it('tells what can hurt by its shape, not by its colour alone', async () => {
  const shapeOf = async (kind: NowLine['kind']) => (await mountSuspended(NowList, { props: { lines: [line('x', { kind })] } })).find('svg').html()
  const shapes = [await shapeOf('stop'), await shapeOf('att'), await shapeOf('unk')]
  expect(new Set(shapes).size).toBe(3)
})

it('keeps the focus on a line when another comes above it', async () => {
  const list = await mountSuspended(NowList, { props: { lines: [line('full')] }, attachTo: document.body })
  const link = byRole(list.element, 'link', /2 full/)
  link.focus()
  await list.setProps({ lines: [line('overfilled', { kind: 'stop' }), line('full')] })
  expect(allByRole(list.element, 'link')).toHaveLength(2)
  expect(document.activeElement).toBe(link)
})

it('says at the scan how much more there is', async () => {
  const top = await mountSuspended(NowTop, { props: { line: line('full'), more: 3 } })
  expect(byRole(top.element, 'link').getAttribute('href')).toBe('/now')
  expect(top.text()).toMatch(/2 full\.\s*3 more/)
  await top.setProps({ more: 0 })
  expect(top.text()).toMatch(/2 full\.\s*Open/)
})
