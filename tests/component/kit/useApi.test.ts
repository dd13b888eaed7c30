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
    anew: true, entries: [kitEntry(packCylinder(stateOf(ID, registered())))], firm: KIT_FIRM,
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
