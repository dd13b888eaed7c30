import { mountSuspended } from '@nuxt/test-utils/runtime'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { defineComponent, h, ref } from 'vue'
import { useWedge } from '~~/composables/useWedge'

const CODE = '7K3M9Q2TX'

let read: string[]
let sent: number
let keydowns: KeyboardEvent[]

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

beforeEach(() => {
  vi.useFakeTimers()
  read = []
  sent = 0
  keydowns = []
})
afterEach(() => void vi.useRealTimers())

let now = 1_000

/** One key after a pause, at the window or in a field, which then shows it. */
function press(key: string, pauseMs: number, field?: HTMLInputElement) {
  now += pauseMs
  vi.advanceTimersByTime(pauseMs)
  const event = new KeyboardEvent('keydown', { key, bubbles: true, cancelable: true })
  Object.defineProperty(event, 'timeStamp', { value: now })
  keydowns.push(event)
  ;(field ?? document.body).dispatchEvent(event)
  if (!field || event.defaultPrevented) return
  if (key === 'Enter') {
    field.form!.dispatchEvent(new Event('submit', { cancelable: true }))
  }
  else {
    field.value += key
    field.dispatchEvent(new Event('input', { bubbles: true }))
  }
}

function burst(text: string, pauseMs = 8, field?: HTMLInputElement) {
  press(text.charAt(0), 1_000, field)
  for (const key of text.slice(1)) press(key, pauseMs, field)
}

async function mounted() {
  const wrapper = await mountSuspended(Page, { attachTo: document.body })
  return { wrapper, field: wrapper.get('input').element, shown: () => wrapper.get('output').text() }
}

describe('a hand scanner that types', () => {
  it('is read with Enter at its end, at once', async () => {
    const { wrapper } = await mounted()
    burst(CODE)
    expect(read).toEqual([])
    press('Enter', 8)
    expect(read).toEqual([CODE])
    expect(keydowns.at(-1)!.defaultPrevented).toBe(true)
    wrapper.unmount()
  })

  it('is read without Enter, after a tenth of a second of silence', async () => {
    const { wrapper } = await mounted()
    burst(CODE)
    vi.advanceTimersByTime(99)
    expect(read).toEqual([])
    vi.advanceTimersByTime(1)
    expect(read).toEqual([CODE])
    wrapper.unmount()
  })

  it('is read twice where two bursts follow one another', async () => {
    const { wrapper } = await mounted()
    burst(CODE)
    press('Enter', 8)
    burst('9JY7GJR40')
    vi.advanceTimersByTime(100)
    expect(read).toEqual([CODE, '9JY7GJR40'])
    wrapper.unmount()
  })

  it('is lifted out of a field, whose text and form stay as they were', async () => {
    const { wrapper, field, shown } = await mounted()
    await wrapper.get('input').setValue('half a note')
    burst(CODE, 8, field)
    press('Enter', 8, field)
    await wrapper.vm.$nextTick()
    expect(read).toEqual([CODE])
    expect([field.value, shown(), sent]).toEqual(['half a note', 'half a note', 0])
    wrapper.unmount()
  })

  it('is lifted out of a field without Enter as well', async () => {
    const { wrapper, field, shown } = await mounted()
    burst(CODE, 8, field)
    vi.advanceTimersByTime(100)
    await wrapper.vm.$nextTick()
    expect([read, field.value, shown()]).toEqual([[CODE], '', ''])
    wrapper.unmount()
  })
})

describe('a person who types', () => {
  it('is never taken for one: each key comes later than a scanner\'s', async () => {
    const { wrapper, field } = await mounted()
    burst(CODE, 51, field)
    press('Enter', 51, field)
    vi.advanceTimersByTime(1_000)
    expect([read, field.value, sent]).toEqual([[], CODE, 1])
    wrapper.unmount()
  })

  it('keeps Enter and what stands in a field after a burst that is no code', async () => {
    const { wrapper, field } = await mounted()
    burst('not a label', 8, field)
    press('Enter', 8, field)
    expect([read, field.value, sent]).toEqual([[], 'not a label', 1])
    wrapper.unmount()
  })
})
