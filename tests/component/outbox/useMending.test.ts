import 'fake-indexeddb/auto'
import { mountSuspended, registerEndpoint } from '@nuxt/test-utils/runtime'
import { flushPromises } from '@vue/test-utils'
import { readBody } from 'h3'
import { afterEach, beforeEach, expect, it, vi } from 'vitest'
import { defineComponent, h } from 'vue'
import { outboxBox } from '~~/composables/outboxBox'
import { useEventForm } from '~~/composables/useEventForm'
import { useMending } from '~~/composables/useMending'
import { useOutboxStore } from '~~/stores/outbox'
import { usePostingStore } from '~~/stores/posting'
import { useSessionStore } from '~~/stores/session'
import type { CustodyEvent } from '~~/utils/custody/event'

/** The status with which the server refuses each event; null where it takes it. */
let refuses: number | null
let log: CustodyEvent[]
registerEndpoint('/api/events', {
  method: 'POST',
  handler: async (event) => {
    const { events } = await readBody<{ events: CustodyEvent[] }>(event)
    if (refuses === null) log.push(...events)
    return {
      results: events.map(({ id }) => refuses === null
        ? { id, outcome: 'accepted', version: 1 }
        : { id, outcome: 'refused', problem: { type: 'about:blank', title: 'No', status: refuses, detail: 'Choose again.' } }),
      cylinders: [],
    }
  },
})

const content = (note: string) => ({ cylinderId: 'c1', kind: 'weighed' as const, note, details: { gross: { value: 40, unit: 'lb' } } as never })

/** A form, on the refused event that its address names, where it names one. */
async function opened(mend?: string) {
  let form!: ReturnType<typeof useEventForm<{ typed: string }>> & { mending: ReturnType<typeof useMending> }
  const page = await mountSuspended(defineComponent({
    setup() {
      const found = useEventForm(`form ${mend}`, () => ({ typed: '' }))
      form = { ...found, mending: useMending(() => found.restored.value, () => {}, found.takePlaceOf) }
      return () => h('p')
    },
  }), { route: mend ? `/?mend=${mend}` : '/' })
  await flushPromises()
  return { form, page }
}

const inBox = async () => {
  const box = outboxBox()
  return (await box.all().finally(() => box.close())).map(({ id, state, event: { note } }) => [id, state, note])
}

/** An event that was refused after its form was gone. */
async function refusedOne(status: number): Promise<string> {
  refuses = status
  const posting = usePostingStore()
  const event = posting.seal({ ...content('bad'), occurredAt: '2026-12-01T09:00:00-06:00' }) as CustodyEvent
  await posting.post(event, () => false).catch(() => {})
  expect(useOutboxStore().refused.map(({ id }) => id)).toEqual([event.id])
  return event.id
}

beforeEach(() => {
  [refuses, log] = [null, []]
  useSessionStore().user = { id: 'tina', name: 'Tina', email: 'tina@firm.example', roles: ['technician'], trainee: false } as never
})
afterEach(async () => {
  await useOutboxStore().giveBack(useOutboxStore().refused.map(({ id }) => id))
  vi.restoreAllMocks()
  sessionStorage.clear()
})

it('a refused event that is mended takes its own place, before it is known what becomes of it', async () => {
  const id = await refusedOne(422)
  const { form, page } = await opened(id)
  vi.spyOn(navigator, 'onLine', 'get').mockReturnValue(false)
  expect(await form.send(content('mended'))).toMatchObject({ isQueued: true, event: { id } })
  expect(await inBox()).toEqual([[id, 'queued', 'mended']])
  vi.restoreAllMocks()
  refuses = null
  await useOutboxStore().flush()
  await form.mending.done()
  expect([log.map(({ note }) => note), await inBox()]).toEqual([['mended'], []])
  page.unmount()
})

it('a mended event that is refused again stays on the device as it was mended', async () => {
  const id = await refusedOne(422)
  const { form, page } = await opened(id)
  expect(await form.send(content('mended'))).toBeNull()
  expect([form.problem.value?.detail, await inBox()]).toEqual(['Choose again.', [[id, 'refused', 'mended']]])
  page.unmount()
})

it('an event by whose id the log has another one is mended as a new one', async () => {
  const id = await refusedOne(409)
  const { form, page } = await opened(id)
  refuses = null
  const posted = await form.send(content('mended'))
  expect(posted!.event.id).not.toBe(id)
  await form.mending.done()
  expect([log.map(({ note }) => note), await inBox()]).toEqual([['mended'], []])
  page.unmount()
})

it('what is refused after its form was left stays on the device, and is given back to one that is there', async () => {
  refuses = 422
  const left = await opened()
  const sending = left.form.send(content('left'))
  left.page.unmount()
  await sending
  expect((await inBox()).map(([, ...rest]) => rest)).toEqual([['refused', 'left']])
  await useOutboxStore().giveBack(useOutboxStore().refused.map(({ id }) => id))
  const { form, page } = await opened()
  await form.send(content('here'))
  expect([form.problem.value?.detail, await inBox()]).toEqual(['Choose again.', []])
  page.unmount()
})
