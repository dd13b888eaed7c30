import 'fake-indexeddb/auto'
import { IDBFactory } from 'fake-indexeddb'
import { registerEndpoint } from '@nuxt/test-utils/runtime'
import { flushPromises } from '@vue/test-utils'
import { readBody, setResponseStatus } from 'h3'
import { createPinia, setActivePinia } from 'pinia'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { outboxBox } from '~~/composables/outboxBox'
import { useOutboxStore } from '~~/stores/outbox'
import { usePostingStore } from '~~/stores/posting'
import { useSessionStore } from '~~/stores/session'
import type { CustodyEvent } from '~~/utils/custody/event'

interface Request { events: CustodyEvent[], author?: string }

/** What the server has, by id, and each request it was sent. */
let log: Map<string, CustodyEvent>
let requests: Request[]
/** How the next requests fail: by a status before anything is recorded, after it ('lost'), or by what stands between. */
let faults: (number | 'lost' | 'empty' | 'proxy')[]
/** What the server refuses on its own. */
let refuses: (event: CustodyEvent) => boolean

registerEndpoint('/api/events', {
  method: 'POST',
  handler: async (event) => {
    const body = await readBody<Request>(event)
    requests.push(body)
    const fault = faults.shift()
    if (typeof fault === 'number') return fail(event, fault)
    if (fault === 'empty') return null
    if (fault === 'proxy') {
      setResponseStatus(event, 400)
      return '<html>Request header too large</html>'
    }
    const results = body.events.map((one) => {
      if (refuses(one)) return { id: one.id, outcome: 'refused', problem: { type: 'about:blank', title: 'No', status: 422, detail: 'Choose again.' } }
      const outcome = log.has(one.id) ? 'duplicate' : 'accepted'
      if (outcome === 'accepted') log.set(one.id, one)
      return { id: one.id, outcome, version: 1 }
    })
    if (fault === 'lost') return fail(event, 504)
    return { results, cylinders: [] }
  },
})

function fail(event: Parameters<typeof setResponseStatus>[0], status: number) {
  setResponseStatus(event, status)
  return { type: 'about:blank', title: 'No', status, detail: 'Not now.' }
}

let boxes: ReturnType<typeof outboxBox>[] = []
const inBox = async () => {
  const box = outboxBox()
  boxes.push(box)
  return (await box.all()).sort((a, b) => a.event.deviceSeq - b.event.deviceSeq)
}

/** A visit of a person: a fresh page on the same device. */
function visit(id: string) {
  setActivePinia(createPinia())
  useSessionStore().user = { id, name: id, email: `${id}@firm.example`, roles: ['technician'], trainee: false } as never
  return { outbox: useOutboxStore(), posting: usePostingStore() }
}

const weighed = (posting: ReturnType<typeof usePostingStore>, note = 'once') =>
  posting.seal<'weighed'>({ cylinderId: 'c1', kind: 'weighed', occurredAt: '2026-12-01T09:00:00-06:00', note, details: { gross: { value: 40, unit: 'lb' } } as never }) as CustodyEvent

let online: boolean

beforeEach(() => {
  [log, requests, faults, refuses, online, boxes] = [new Map(), [], [], () => false, true, []]
  vi.stubGlobal('indexedDB', new IDBFactory())
  vi.spyOn(navigator, 'onLine', 'get').mockImplementation(() => online)
  vi.useFakeTimers({ toFake: ['setTimeout', 'clearTimeout', 'Date'], shouldAdvanceTime: true })
})
afterEach(() => {
  vi.useRealTimers()
  vi.restoreAllMocks()
  vi.unstubAllGlobals()
  for (const box of boxes) box.close()
  localStorage.clear()
})

describe('an event where the server is reached', () => {
  it('is recorded at once as before, under its author, and leaves nothing behind', async () => {
    const { outbox, posting } = visit('tina')
    const posted = await posting.post(weighed(posting))
    expect(posted).toMatchObject({ version: 1, event: { note: 'once' } })
    expect(posted.isQueued).toBeUndefined()
    expect(requests.map(({ author, events }) => [author, events.length])).toEqual([['tina', 1]])
    expect([outbox.entries.length, (await inBox()).length, posting.recorded]).toEqual([0, 0, 1])
  })

  it('is given back to its form where it is refused', async () => {
    refuses = () => true
    const { outbox, posting } = visit('tina')
    const event = weighed(posting)
    await expect(posting.post(event)).rejects.toMatchObject({ data: { detail: 'Choose again.' } })
    expect([outbox.entries.length, (await inBox()).length]).toEqual([0, 0])
    refuses = () => false
    await posting.post({ ...event, note: 'mended' })
    expect([...log.values()].map(({ note }) => note)).toEqual(['mended'])
  })

  it('is there once although its answer was lost and the form sends it again', async () => {
    faults = ['lost']
    const { outbox, posting } = visit('tina')
    const event = weighed(posting)
    expect(await posting.post(event)).toMatchObject({ isQueued: true, version: null })
    expect(outbox.pause).toBe('server')
    expect(await posting.post(event)).toMatchObject({ version: 1 })
    expect(log.size).toBe(1)
    expect(new Set(requests.flatMap(({ events }) => events.map(({ deviceSeq }) => deviceSeq))).size).toBe(1)
  })
})

describe('an event where it is not reached', () => {
  it('is on the device before it is said to be saved, and is sent by itself when the network is back', async () => {
    online = false
    const first = visit('tina')
    expect(await first.posting.post(weighed(first.posting))).toMatchObject({ isQueued: true, version: null, cylinder: null })
    expect((await inBox()).map(({ state, tries, firstSentAt }) => [state, tries, firstSentAt])).toEqual([['queued', 0, null]])
    expect(first.outbox.pause).toBe('offline')

    vi.clearAllTimers()
    online = true
    const { outbox, posting } = visit('tina')
    const before = posting.recorded
    await outbox.attend()
    expect(requests).toEqual([])
    await vi.advanceTimersByTimeAsync(10_000)
    await vi.waitFor(() => expect(log.size).toBe(1))
    await vi.waitFor(() => expect([outbox.entries.length, posting.recorded]).toEqual([0, before + 1]))
  })

  it.each([401, 403, 500, 503])('is kept over a %i and recorded once afterwards, in order', async (status) => {
    faults = [status, status]
    const { outbox, posting } = visit('tina')
    for (const note of ['one', 'two']) expect(await posting.post(weighed(posting, note))).toMatchObject({ isQueued: true })
    expect(outbox.pause).toBe(status === 401 ? 'sign-in' : 'server')
    expect(outbox.waiting.map(({ event, problem }) => [event.note, problem?.status])).toEqual([['one', status], ['two', status]])
    await outbox.flush()
    expect([[...log.values()].map(({ note }) => note), outbox.waiting.length, outbox.pause]).toEqual([['one', 'two'], 0, null])
  })

  it.each(['empty', 'proxy'] as const)('is kept over an answer that is none of the server\'s: %s', async (fault) => {
    faults = [fault]
    const { outbox, posting } = visit('tina')
    expect(await posting.post(weighed(posting))).toMatchObject({ isQueued: true })
    expect([outbox.waiting.length, outbox.refused.length, outbox.pause]).toEqual([1, 0, 'server'])
    await outbox.flush()
    expect([log.size, outbox.entries.length]).toEqual([1, 0])
  })

  it('is kept where the answer begins and never ends, and holds nothing up', async () => {
    const { outbox, posting } = visit('tina')
    const stalled = vi.fn((_path: string, { signal }: { signal?: AbortSignal }) => new Promise((_, failed) => {
      signal?.addEventListener('abort', () => failed(signal.reason))
    }))
    const reached = globalThis.$fetch
    vi.stubGlobal('$fetch', stalled)
    const posted = posting.post(weighed(posting))
    await vi.waitFor(() => expect(stalled).toHaveBeenCalled())
    await vi.advanceTimersByTimeAsync(15_000)
    expect(await posted).toMatchObject({ isQueued: true })
    expect(outbox.pause).toBe('offline')
    vi.stubGlobal('$fetch', reached)
    await outbox.flush()
    expect([log.size, outbox.entries.length]).toEqual([1, 0])
  })

  it('stays sealed for whoever else signs in, and only its author sends it', async () => {
    online = false
    const tina = visit('tina')
    await tina.posting.post(weighed(tina.posting))
    online = true
    const wes = visit('wes')
    await wes.outbox.attend()
    await wes.posting.post(weighed(wes.posting, 'of Wes'))
    expect([wes.outbox.entries.length, wes.outbox.sealed]).toEqual([0, 1])
    expect([...log.values()].map(({ note }) => note)).toEqual(['of Wes'])
    const again = visit('tina')
    await again.outbox.flush()
    expect(requests.map(({ author }) => author)).toEqual(['wes', 'tina'])
    expect([log.size, again.outbox.sealed]).toEqual([2, 0])
  })

  it('can be taken back without a trace while it was never sent', async () => {
    online = false
    const { outbox, posting } = visit('tina')
    const posted = await posting.post(weighed(posting))
    posting.announce(posted)
    expect(posting.notice).toBe('Saved on this phone, waiting to send: weighed')
    await posting.takeBack()
    expect([posting.notice, outbox.entries.length, posting.takenBackIds]).toEqual(['Taken back before it was sent.', 0, [posted.event.id]])
  })

  it('is taken back by a correction where it was recorded meanwhile', async () => {
    online = false
    const { outbox, posting } = visit('tina')
    const posted = await posting.post(weighed(posting))
    posting.announce(posted)
    online = true
    await outbox.flush()
    await posting.takeBack()
    expect([...log.values()].map(({ kind, expects }) => [kind, expects])).toEqual([['weighed', undefined], ['corrected', 1]])
  })

  it('that decides on the cylinder as it stands is not kept, and says so', async () => {
    online = false
    const { posting } = visit('tina')
    const event = posting.seal<'released'>({ cylinderId: 'c1', kind: 'released', occurredAt: '', expects: 2, details: {} as never }) as CustodyEvent
    await expect(posting.post(event)).rejects.toMatchObject({ data: { title: 'This needs the server' } })
    expect(await inBox()).toEqual([])
  })
})

describe('an event whose answer does not come', () => {
  /** The requests that wait for their answer; each is let through by a call. */
  let hanging: (() => void)[]

  beforeEach(() => {
    hanging = []
    const reached = globalThis.$fetch as unknown as (path: string, options: object) => Promise<unknown>
    vi.stubGlobal('$fetch', (path: string, options: { signal?: AbortSignal }) => new Promise((done, failed) => {
      options.signal?.addEventListener('abort', () => failed(new Error('aborted')))
      hanging.push(() => done(reached(path, { ...options, signal: undefined })))
    }))
  })

  /** Posts an event, and lets time pass until its form is free. */
  async function posted(posting: ReturnType<typeof usePostingStore>, event: CustodyEvent) {
    const posted = posting.post(event)
    await vi.waitFor(() => expect(hanging).toHaveLength(1))
    await vi.advanceTimersByTimeAsync(3_000)
    return await posted
  }

  it('is recorded as ever where the answer comes just before three seconds are over', async () => {
    const { posting } = visit('tina')
    const posted = posting.post(weighed(posting))
    await vi.waitFor(() => expect(hanging).toHaveLength(1))
    await vi.advanceTimersByTimeAsync(2_700)
    hanging[0]!()
    expect(await posted).toMatchObject({ version: 1 })
  })

  it('frees its form after three seconds, and is known to be recorded once the answer comes', async () => {
    const { outbox, posting } = visit('tina')
    expect(await posted(posting, weighed(posting))).toMatchObject({ isQueued: true, version: null })
    expect([posting.busy, outbox.waiting.map(({ state }) => state)]).toEqual([false, ['sending']])
    const before = posting.recorded
    hanging[0]!()
    await vi.waitFor(() => expect([outbox.entries.length, posting.recorded]).toEqual([0, before + 1]))
    expect(log.size).toBe(1)
  })

  it('is waited for longer where many are sent with it', async () => {
    const { outbox, posting } = visit('tina')
    const settled = vi.fn()
    const posted = posting.postAll(Array.from({ length: 61 }, (_, at) => weighed(posting, String(at)))).then(settled)
    await vi.waitFor(() => expect(hanging).toHaveLength(1))
    await vi.advanceTimersByTimeAsync(5_500)
    expect(settled).not.toHaveBeenCalled()
    await vi.advanceTimersByTimeAsync(500)
    await posted
    expect(outbox.waiting).toHaveLength(61)
    hanging[0]!()
    await vi.waitFor(() => expect(outbox.entries).toEqual([]))
  })

  it('stays where it is refused after its form is gone', async () => {
    refuses = () => true
    const { outbox, posting } = visit('tina')
    await posted(posting, weighed(posting))
    hanging[0]!()
    await vi.waitFor(() => expect(outbox.refused.map(({ problem }) => problem?.detail)).toEqual(['Choose again.']))
    expect((await inBox()).map(({ state }) => state)).toEqual(['refused'])
  })

  it('may have arrived: after fifteen seconds it waits, is not taken out, and goes again', async () => {
    const { outbox, posting } = visit('tina')
    const { event } = await posted(posting, weighed(posting))
    await vi.advanceTimersByTimeAsync(12_000)
    await vi.waitFor(() => expect(outbox.pause).toBe('offline'))
    expect((await inBox()).map(({ state, firstSentAt }) => [state, firstSentAt === null])).toEqual([['queued', false]])
    expect(await outbox.takeOut([event.id])).toBe(false)
    void outbox.flush()
    await vi.waitFor(() => expect(hanging).toHaveLength(2))
    hanging[1]!()
    await vi.waitFor(() => expect([log.size, outbox.entries.length]).toEqual([1, 0]))
  })

  it('does not hold up one that follows it: both wait, and go in their order', async () => {
    const { outbox, posting } = visit('tina')
    await posted(posting, weighed(posting, 'one'))
    expect(await posted(posting, weighed(posting, 'two'))).toMatchObject({ isQueued: true })
    expect(outbox.waiting.map(({ event }) => event.note)).toEqual(['one', 'two'])
    hanging[0]!()
    await vi.waitFor(() => expect(hanging).toHaveLength(2))
    hanging[1]!()
    await vi.waitFor(() => expect(outbox.entries).toEqual([]))
    expect([...log.values()].map(({ note }) => note)).toEqual(['one', 'two'])
  })
})

describe('what the server refuses later', () => {
  it('stays with its problem and holds nothing up, until it is dropped with a reason that is kept', async () => {
    online = false
    const { outbox, posting } = visit('tina')
    for (const note of ['bad', 'good']) await posting.post(weighed(posting, note))
    online = true
    refuses = ({ note }) => note === 'bad'
    await outbox.flush()
    expect([...log.values()].map(({ note }) => note)).toEqual(['good'])
    expect(outbox.refused.map(({ event, problem }) => [event.note, problem?.detail])).toEqual([['bad', 'Choose again.']])
    await outbox.flush()
    expect(requests).toHaveLength(1)
    const file = JSON.parse(await (await outbox.exportFile()).text())
    expect(file.entries.map(({ event }: { event: CustodyEvent }) => event.note)).toEqual(['bad'])
    expect(await outbox.drop(outbox.refused[0]!.id, 'weighed twice')).toBe(true)
    expect([outbox.entries.length, outbox.dropped.map(({ event, reason }) => [event.note, reason])]).toEqual([0, [['bad', 'weighed twice']]])
  })

  it('is not dropped once it was mended in another tab and goes again', async () => {
    online = false
    const { outbox, posting } = visit('tina')
    const event = weighed(posting, 'bad')
    await posting.post(event)
    online = true
    refuses = () => true
    await outbox.flush()
    online = false
    await visit('tina').posting.post({ ...event, note: 'mended' })
    expect(await outbox.drop(event.id, 'weighed twice')).toBe(false)
    expect((await inBox()).map(({ state, event: { note } }) => [state, note])).toEqual([['queued', 'mended']])
  })

  it('is found out of many by sending fewer at a time, and the others are recorded', async () => {
    online = false
    const { outbox, posting } = visit('tina')
    await posting.postAll(['a', 'b', 'c', 'd', 'e'].map(note => weighed(posting, note)))
    online = true
    // The whole of five, the two with the bad one, the bad one alone; then the others.
    faults = [413, 413, 413]
    await outbox.flush()
    expect(requests.map(({ events }) => events.map(({ note }) => note).join(''))).toEqual(['abcde', 'ab', 'a', 'bcde'])
    expect([outbox.refused.map(({ event }) => event.note), [...log.values()].map(({ note }) => note).join('')]).toEqual([['a'], 'bcde'])
  })
})

describe('what was recorded', () => {
  it('is remembered although the clock was set back and much else is remembered', async () => {
    const { posting, outbox } = visit('tina')
    await posting.postAll(Array.from({ length: 200 }, (_, at) => weighed(posting, String(at))))
    vi.setSystemTime(Date.now() - 24 * 3_600_000)
    await posting.post(weighed(posting, 'last'))
    const notes = (await outbox.recordedLately()).map(({ event }) => event.note)
    expect([notes.length, notes.includes('last')]).toEqual([200, true])
  })
})

describe('the device\'s count', () => {
  it('gives no number twice, though two tabs count at once', async () => {
    online = false
    const [one, other] = [visit('tina'), visit('tina')]
    const events = Array.from({ length: 20 }, (_, at) => weighed(one.posting, String(at)))
    await Promise.all(events.map((event, at) => (at % 2 === 0 ? one : other).posting.post(event)))
    const counted = (await inBox()).map(({ event }) => event.deviceSeq)
    expect(new Set(counted).size).toBe(20)
    expect(counted).not.toContain(0)
  })

  it('goes on from what was counted before the store was there', async () => {
    online = false
    localStorage.setItem('collarbook-device-seq', '900')
    const { posting, outbox } = visit('tina')
    await posting.post(weighed(posting))
    expect(outbox.entries[0]!.event.deviceSeq).toBeGreaterThan(900)
  })
})

describe('a device that keeps nothing', () => {
  const full = () => vi.spyOn(IDBObjectStore.prototype, 'put').mockImplementation(() => {
    throw new DOMException('no room', 'QuotaExceededError')
  })

  it('says so instead of pretending, where the server is not reached either', async () => {
    online = false
    full()
    const { posting, outbox } = visit('tina')
    await expect(posting.post(weighed(posting))).rejects.toMatchObject({ data: { title: 'This phone is full' } })
    expect([outbox.entries.length, posting.recorded]).toEqual([0, 0])
  })

  it('still records where the server is reached, under its author', async () => {
    full()
    const { posting } = visit('tina')
    expect(await posting.post(weighed(posting))).toMatchObject({ version: 1 })
    expect(log.size).toBe(1)
    expect(requests.map(({ author }) => author)).toEqual(['tina'])
  })

  it('makes room for what is new by forgetting what is recorded', async () => {
    const { posting, outbox } = visit('tina')
    await posting.post(weighed(posting, 'recorded'))
    expect(await outbox.recordedLately()).toHaveLength(1)
    online = false
    // Full for as long as anything is remembered.
    const [put, clear] = [IDBObjectStore.prototype.put, IDBObjectStore.prototype.clear]
    let isFull = true
    vi.spyOn(IDBObjectStore.prototype, 'put').mockImplementation(function (this: IDBObjectStore, ...given) {
      if (isFull) throw new DOMException('no room', 'QuotaExceededError')
      return put.apply(this, given)
    })
    vi.spyOn(IDBObjectStore.prototype, 'clear').mockImplementation(function (this: IDBObjectStore) {
      isFull = false
      return clear.apply(this)
    })
    expect(await posting.post(weighed(posting, 'new'))).toMatchObject({ isQueued: true })
    expect((await inBox()).map(({ event }) => event.note)).toEqual(['new'])
    expect(await outbox.recordedLately()).toEqual([])
  })

  it('still gives what is shown as a file', async () => {
    online = false
    const { posting, outbox } = visit('tina')
    await posting.post(weighed(posting))
    vi.spyOn(IDBDatabase.prototype, 'transaction').mockImplementation(() => {
      throw new DOMException('gone', 'UnknownError')
    })
    const file = JSON.parse(await (await outbox.exportFile()).text())
    expect(file.entries.map(({ event }: { event: CustodyEvent }) => event.note)).toEqual(['once'])
  })

  it('is tried once more where the system had closed the connection', async () => {
    online = false
    const { posting, outbox } = visit('tina')
    await posting.post(weighed(posting, 'before'))
    vi.spyOn(IDBDatabase.prototype, 'transaction').mockImplementationOnce(() => {
      throw new DOMException('closing', 'InvalidStateError')
    })
    await posting.post(weighed(posting, 'after'))
    expect(outbox.entries.map(({ event }) => event.note)).toEqual(['before', 'after'])
    await flushPromises()
  })
})
