import { mountSuspended, registerEndpoint } from '@nuxt/test-utils/runtime'
import { readBody } from 'h3'
import { expect, it } from 'vitest'
import { useLabelChoice } from '~~/composables/useLabelChoice'

let made = 0
registerEndpoint('/api/labels', { method: 'POST', handler: async (event) => {
  const { count } = await readBody<{ count: number }>(event)
  return { codes: Array.from({ length: count }, () => `CODE${String(made++).padStart(5, '0')}`) }
} })

it('forgets no blank label that was made, however many come after it, until it is set aside', async () => {
  let choice!: ReturnType<typeof useLabelChoice>
  await mountSuspended({
    setup() {
      choice = useLabelChoice()
      return () => null
    },
  }, { route: '/labels' })
  await choice.mintBlank(100)
  await choice.mintBlank(10)
  expect(choice.codes.value).toHaveLength(110)
  expect(choice.codes.value[0]).toBe('CODE00000')
  choice.setAside(choice.codes.value.slice(0, 100))
  expect(choice.codes.value).toEqual(Array.from({ length: 10 }, (_, index) => `CODE00${100 + index}`))
})
