import 'fake-indexeddb/auto'
import { mountSuspended, registerEndpoint } from '@nuxt/test-utils/runtime'
import { setResponseStatus } from 'h3'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { defineComponent } from 'vue'
import { kitBox } from '~~/composables/kitBox'
import { useApi } from '~~/composables/useApi'
import { useCopyOf } from '~~/composables/useCopyOf'
import { useSessionStore } from '~~/stores/session'
import type { CylinderView } from '~~/utils/contract/custody'
import { kitEntry } from '~~/utils/kit/kitEntry'
import { KIT_FORM, packCylinder } from '~~/utils/kit/packCylinder'
import { registered, TECHNICIAN } from '../../helpers/custody'
import { KIT_FIRM, stateOf } from '../../helpers/kitAnswers'

const ID = '0198f000-0000-7000-8000-000000000101'
const COPIED_AT = Date.UTC(2026, 6, 2, 19, 5)

let status = 200
let asked = 0
registerEndpoint(`/api/cylinders/${ID}`, (event) => {
  asked++
  setResponseStatus(event, status)
  return status === 200 ? { id: ID, labelCode: 'by the server' } : { type: 'about:blank', title: 'No', status, detail: '' }
})

async function theApi() {
  let api!: ReturnType<typeof useApi>
  let copyOf!: ReturnType<typeof useCopyOf>
  await mountSuspended(defineComponent({
    setup() {
      api = useApi()
      copyOf = useCopyOf()
      return () => null
    },
  }))
  return { cylinder: () => api.get<CylinderView>(`/api/cylinders/${ID}`), api, copyOf: () => copyOf.value }
}

beforeEach(async () => {
  status = 200
  asked = 0
  useSessionStore().set({ id: TECHNICIAN, name: 'Tina', email: 'tina@firm.example', roles: ['technician'], trainee: false } as never)
  await kitBox().take({
    anew: true, before: null, entries: [kitEntry(packCylinder(stateOf(ID, registered())))], firm: KIT_FIRM,
    about: { personId: TECHNICIAN, form: KIT_FORM, seq: 1, mark: '0123456789abcdef', next: null, firmTag: 'fedcba9876543210', followedAt: COPIED_AT },
  })
})
afterEach(async () => {
  vi.unstubAllGlobals()
  useSessionStore().set(null)
  await kitBox().clear()
})

const unreached = () => vi.stubGlobal('$fetch', () => Promise.reject(new TypeError('Failed to fetch')))

describe('what is asked of the server', () => {
  it('comes from the server where it is there', async () => {
    const { cylinder, copyOf } = await theApi()
    expect((await cylinder()).labelCode).toBe('by the server')
    expect(copyOf()).toBeNull()
  })

  it('comes from the phone\'s copy where the server was not reached, and says of when it is', async () => {
    unreached()
    const { cylinder, copyOf } = await theApi()
    expect((await cylinder()).stamp?.serial).toBe('A1001')
    expect(copyOf()).toBe(COPIED_AT)
  })

  it('is not even sent while the phone knows that it has no network', async () => {
    vi.stubGlobal('navigator', Object.create(navigator, { onLine: { value: false } }))
    const { cylinder } = await theApi()
    expect((await cylinder()).stamp?.serial).toBe('A1001')
    expect(asked).toBe(0)
  })

  it('is refused as the server refuses it: its word stands above the copy', async () => {
    status = 404
    const { cylinder } = await theApi()
    await expect(cylinder()).rejects.toMatchObject({ statusCode: 404 })
  })

  it('fails as before where the copy has no answer to it, and where it must be fresh', async () => {
    unreached()
    const { api } = await theApi()
    await expect(api.get('/api/reports/mass-balance')).rejects.toMatchObject({ statusCode: 0 })
    await expect(api.getFresh(`/api/cylinders/${ID}`)).rejects.toMatchObject({ statusCode: 0 })
  })
})

describe('what the server is long in answering', () => {
  let answer: (body: unknown) => void
  let fail: (error: Error) => void

  beforeEach(() => {
    vi.useFakeTimers({ toFake: ['setTimeout', 'clearTimeout'], shouldAdvanceTime: true })
    vi.stubGlobal('$fetch', () => new Promise((done, failed) => {
      [answer, fail] = [done, failed]
    }))
  })
  afterEach(() => vi.useRealTimers())

  const BY_THE_SERVER = { id: ID, labelCode: 'by the server' }

  it('comes from the server where it answers just before three seconds are over', async () => {
    const { cylinder, copyOf } = await theApi()
    const found = cylinder()
    await vi.advanceTimersByTimeAsync(2_800)
    answer(BY_THE_SERVER)
    expect([(await found).labelCode, copyOf()]).toEqual(['by the server', null])
  })

  it('comes from the phone\'s copy after three seconds, and from the server as soon as it has answered', async () => {
    const { api, copyOf } = await theApi()
    const later = vi.fn(() => true)
    const found = api.get<CylinderView>(`/api/cylinders/${ID}`, undefined, later)
    await vi.advanceTimersByTimeAsync(3_000)
    expect((await found).stamp?.serial).toBe('A1001')
    expect([copyOf(), later.mock.calls]).toEqual([COPIED_AT, []])
    answer(BY_THE_SERVER)
    await vi.waitFor(() => expect(later.mock.calls).toEqual([[BY_THE_SERVER]]))
    expect(copyOf()).toBeNull()
  })

  it.each([
    ['nobody shows what comes later', () => answer(BY_THE_SERVER)],
    ['it fails in the end', () => fail(new TypeError('Failed to fetch'))],
  ])('is marked as the copy\'s for as long as the copy\'s is shown: %s', async (_, end) => {
    const { cylinder, copyOf } = await theApi()
    const found = cylinder()
    await vi.advanceTimersByTimeAsync(3_000)
    await found
    end()
    await vi.advanceTimersByTimeAsync(10)
    expect(copyOf()).toBe(COPIED_AT)
  })

  it('is waited for where the copy has no answer to it', async () => {
    const { api, copyOf } = await theApi()
    const found = api.get('/api/reports/mass-balance')
    await vi.advanceTimersByTimeAsync(30_000)
    answer('the report')
    expect([await found, copyOf()]).toEqual(['the report', null])
  })
})
