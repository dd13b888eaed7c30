import { mountSuspended } from '@nuxt/test-utils/runtime'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { defineComponent, h, ref } from 'vue'
import { useWedge } from '~~/composables/useWedge'
import { burst, press } from '../../helpers/keyBurst'

const CODE = '7K3M9Q2TX'

let read: string[]
let sent: number

const Page = defineComponent(() => {
  const text = ref('')
  useWedge(code => void read.push(code))
  return () => h('form', { onSubmit: (event: Event) => {
    event.preventDefault()
    sent++
  } }, [h('input', { value: text.value, onInput: (event: Event) => {
    text.value = (event.target as HTMLInputElement).value
  } }), h('output', text.value)])
})

let wrapper: Awaited<ReturnType<typeof mountSuspended>> | null = null

beforeEach(() => {
  read = []
  sent = 0
})
// Also after a test that failed: a page that stays would hear the next one's keys.
afterEach(() => {
  vi.useRealTimers()
  wrapper?.unmount()
  wrapper = null
})

async function mounted() {
  const page = wrapper = await mountSuspended(Page, { attachTo: document.body })
  // The framework's own start goes by the real clock.
  vi.useFakeTimers()
  return { page, field: page.get('input').element, shown: () => page.get('output').text() }
}

describe('a hand scanner that types', () => {
  it('is read with Enter at its end, at once', async () => {
    await mounted()
    burst(CODE)
    expect(read).toEqual([])
    expect(press('Enter', 8).defaultPrevented).toBe(true)
    expect(read).toEqual([CODE])
  })

  it('is read without Enter, after a tenth of a second of silence', async () => {
    await mounted()
    burst(CODE)
    vi.advanceTimersByTime(99)
    expect(read).toEqual([])
    vi.advanceTimersByTime(1)
    expect(read).toEqual([CODE])
  })

  it('is read twice where two bursts follow one another', async () => {
    await mounted()
    burst(CODE)
    press('Enter', 8)
    burst('9JY7GJR40')
    vi.advanceTimersByTime(100)
    expect(read).toEqual([CODE, '9JY7GJR40'])
  })

  it('is lifted out of a field, whose text and form stay as they were', async () => {
    const { page, field, shown } = await mounted()
    await page.get('input').setValue('half a note')
    burst(CODE, 8, field)
    press('Enter', 8, field)
    await page.vm.$nextTick()
    expect(read).toEqual([CODE])
    expect([field.value, shown(), sent]).toEqual(['half a note', 'half a note', 0])
  })

  it('is lifted out of a field without Enter as well', async () => {
    const { page, field, shown } = await mounted()
    burst(CODE, 8, field)
    vi.advanceTimersByTime(100)
    await page.vm.$nextTick()
    expect([read, field.value, shown()]).toEqual([[CODE], '', ''])
  })
})

describe('a person who types', () => {
  it('is never taken for one: each key comes later than a scanner\'s', async () => {
    const { field } = await mounted()
    burst(CODE, 51, field)
    press('Enter', 51, field)
    vi.advanceTimersByTime(1_000)
    expect([read, field.value, sent]).toEqual([[], CODE, 1])
  })

  it('keeps Enter and what stands in a field after a burst that is no code', async () => {
    const { field } = await mounted()
    burst('not a label', 8, field)
    press('Enter', 8, field)
    expect([read, field.value, sent]).toEqual([[], 'not a label', 1])
  })
})
