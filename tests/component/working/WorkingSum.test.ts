import { mountSuspended } from '@nuxt/test-utils/runtime'
import { expect, it } from 'vitest'
import WorkingSum from '~~/components/working/WorkingSum.vue'
import type { SumLine } from '~~/utils/picture/sumAccount'

const LINES: SumLine[] = [
  { words: 'Scale reads', note: 'today 09:41, hoses off', figure: { figure: '50.5', symbol: 'lb' }, reason: '', isResult: false, isEnd: false },
  { words: 'Stop weight', note: 'tare plus limit', figure: null, reason: 'nothing may go in', isResult: true, isEnd: true },
]

it('pairs each figure with its words, and a missing one with its reason', async () => {
  const wrapper = await mountSuspended(WorkingSum, { props: { lines: LINES } })
  const [terms, figures] = [wrapper.findAll('dt'), wrapper.findAll('dd')]
  expect(terms.map(term => term.text())).toEqual(['Scale reads today 09:41, hoses off', 'Stop weight tare plus limit'])
  expect(figures[0]!.text()).toBe('50.5lb')
  expect(figures[1]!.text()).toBe('– nothing may go in')
})
