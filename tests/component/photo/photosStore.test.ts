import 'fake-indexeddb/auto'
import { registerEndpoint } from '@nuxt/test-utils/runtime'
import { flushPromises } from '@vue/test-utils'
import { readBody, setResponseStatus } from 'h3'
import { createPinia, setActivePinia } from 'pinia'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { openPhotoBox } from '~~/composables/photoBox'
import { useOutboxStore } from '~~/stores/outbox'
import { usePhotosStore } from '~~/stores/photos'
import { usePostingStore } from '~~/stores/posting'
import { useSessionStore } from '~~/stores/session'
import type { CustodyEvent } from '~~/utils/custody/event'
import { PHOTOS_WAIT_KEY } from '~~/utils/photo/waitKey'

/** The status and the detail of what the server refuses with; null where it takes the photo. */
let refusal: (() => [status: number, detail: string] | null)
let asked = 0
registerEndpoint('/api/events', {
  method: 'POST',
  handler: async event => ({ results: (await readBody<{ events: CustodyEvent[] }>(event)).events.map(({ id }) => ({ id, outcome: 'accepted', version: 1 })), cylinders: [] }),
})
registerEndpoint('/api/uploads', {
  method: 'POST',
  handler: (event) => {
    asked++
    const refused = refusal()
    if (!refused) return { id: 'x' }
    setResponseStatus(event, refused[0])
    return { type: 'about:blank', title: 'No', status: refused[0], detail: refused[1] }
  },
})

const BYTES = new Uint8Array([0xFF, 0xD8, 0xFF, 0xD9])
const inBox = async (personId: string) => {
  const box = await openPhotoBox()
  return box.of(personId, Date.now()).finally(() => box.close())
}

/** A visit of a person: a fresh page on the same device. */
function visit(id: string) {
  setActivePinia(createPinia())
  useSessionStore().user = { id, name: id, email: `${id}@firm.example`, roles: ['technician'], trainee: false } as never
  return usePhotosStore()
}

beforeEach(() => {
  asked = 0
  refusal = () => null
  vi.useFakeTimers({ toFake: ['setTimeout', 'clearTimeout'], shouldAdvanceTime: true })
})
afterEach(async () => {
  vi.useRealTimers()
  const box = await openPhotoBox()
  for (const person of ['tina', 'wes']) for (const { id } of await box.of(person, Date.now())) await box.remove(id)
  box.close()
  localStorage.clear()
})

describe('a photo of a form', () => {
  it('stays on the device until the form is recorded, also over a closed page', async () => {
    await visit('tina').take('form', BYTES, 'scale')
    const store = visit('tina')
    await store.load()
    expect(asked).toBe(0)
    expect(store.ofForm('form').map(({ subject, bytes }) => [subject, [...bytes]])).toEqual([['scale', [...BYTES]]])
    expect(localStorage.getItem(PHOTOS_WAIT_KEY)).toBe('1')
  })

  it('is sent once the form is recorded, and is gone from the device when it has arrived', async () => {
    const store = visit('tina')
    await store.take('form', BYTES, 'scale')
    await store.release('form')
    await vi.waitFor(() => expect(store.arrived).toBe(1))
    await flushPromises()
    expect([asked, store.held.length, (await inBox('tina')).length, localStorage.getItem(PHOTOS_WAIT_KEY)]).toEqual([1, 0, 0, null])
  })

  it('is nobody else\'s who signs in on the device', async () => {
    await visit('tina').take('form', BYTES, 'scale')
    const store = visit('wes')
    await store.load()
    await store.release('form')
    await flushPromises()
    expect([store.held.length, asked, (await inBox('tina')).length]).toEqual([0, 0, 1])
  })

  it('goes with the form that is given up', async () => {
    const store = visit('tina')
    await store.take('form', BYTES, 'scale')
    await store.take('other', BYTES, 'scale')
    await store.drop('form')
    expect(store.held.map(({ form }) => form)).toEqual(['other'])
    expect((await inBox('tina')).map(({ form }) => form)).toEqual(['other'])
  })
})

describe('a photo of an event that was saved before the page was killed', () => {
  const twoDaysAgo = new Date(Date.now() - 48 * 3_600_000).toISOString()

  async function saveAndKill(online: boolean) {
    const store = visit('tina')
    await store.take('form', BYTES, 'scale')
    const photo = store.ofForm('form')[0]!
    await store.keep({ ...photo, takenAt: twoDaysAgo })
    vi.spyOn(navigator, 'onLine', 'get').mockReturnValue(online)
    const posting = usePostingStore()
    await posting.post(posting.seal<'weighed'>({
      cylinderId: 'c1', kind: 'weighed', occurredAt: twoDaysAgo, photoIds: [photo.id], details: { gross: { value: 40, unit: 'lb' } } as never,
    }) as CustodyEvent)
  }
  afterEach(() => vi.restoreAllMocks())

  it('is kept for as long as the event waits, and is sent once that is recorded', async () => {
    await saveAndKill(false)
    const store = visit('tina')
    await store.load()
    await flushPromises()
    expect([store.held.length, asked]).toEqual([1, 0])
    vi.restoreAllMocks()
    await useOutboxStore().flush()
    await vi.waitFor(() => expect([store.arrived, store.held.length]).toEqual([1, 0]))
  })

  it('is sent where the event was recorded', async () => {
    await saveAndKill(true)
    const store = visit('tina')
    await store.load()
    await vi.waitFor(() => expect([store.arrived, store.held.length]).toEqual([1, 0]))
  })
})

describe('a photo that does not arrive', () => {
  it.each([[503, 'The store does not answer'], [500, 'Failed'], [429, 'Wait'], [401, 'Sign in first']])('waits and is tried again by itself after a %i', async (status, detail) => {
    refusal = () => [status, detail]
    const store = visit('tina')
    await store.take('form', BYTES, 'scale')
    await store.release('form')
    await vi.waitFor(() => expect(store.unreached).toBe(true))
    expect([store.waiting.length, store.refused.length]).toEqual([1, 0])
    refusal = () => null
    await vi.advanceTimersByTimeAsync(5_000)
    await vi.waitFor(() => expect([store.arrived, store.unreached]).toEqual([1, false]))
  })

  it('stays with the reason where the server does not take it, holds up no other, and can be tried again', async () => {
    refusal = () => asked === 1 ? [422, 'The file is damaged.'] : null
    const store = visit('tina')
    await store.take('form', BYTES, 'scale')
    await store.take('form', BYTES, 'stamp')
    await store.release('form')
    await vi.waitFor(() => expect(store.arrived).toBe(1))
    expect(store.refused.map(({ subject, refusal }) => [subject, refusal])).toEqual([['scale', 'The file is damaged.']])
    await store.retry()
    expect([store.arrived, store.held.length]).toEqual([2, 0])
  })
})
