import 'fake-indexeddb/auto'
import { mountSuspended } from '@nuxt/test-utils/runtime'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { defineComponent } from 'vue'
import { kitBox } from '~~/composables/kitBox'
import { useCopyOf } from '~~/composables/useCopyOf'
import { useCylinder } from '~~/composables/useCylinder'
import { useOutboxStore } from '~~/stores/outbox'
import { useSessionStore } from '~~/stores/session'
import { kitEntry } from '~~/utils/kit/kitEntry'
import { KIT_FORM, packCylinder } from '~~/utils/kit/packCylinder'
import { registered, TECHNICIAN } from '../../helpers/custody'
import { KIT_FIRM, stateOf } from '../../helpers/kitAnswers'

const ID = '0198f000-0000-7000-8000-000000000101'
const COPIED_AT = Date.UTC(2026, 6, 2, 19, 5)
const BY_THE_SERVER = { id: ID, labelCode: null, stamp: { serial: 'by the server' }, oldLabelCodes: [] }

/** The requests for the cylinder that wait for their answer. */
let answers: ((body: unknown) => void)[]

beforeEach(async () => {
  answers = []
  vi.useFakeTimers({ toFake: ['setTimeout', 'clearTimeout'], shouldAdvanceTime: true })
  vi.stubGlobal('$fetch', (path: string) => new Promise((done) => {
    if (path === `/api/cylinders/${ID}`) answers.push(done)
  }))
  useSessionStore().set({ id: TECHNICIAN, name: 'Tina', email: 'tina@firm.example', roles: ['technician'], trainee: false } as never)
  await kitBox().take({
    anew: true, before: null, entries: [kitEntry(packCylinder(stateOf(ID, registered())))], firm: KIT_FIRM,
    about: { personId: TECHNICIAN, form: KIT_FORM, seq: 1, mark: '0123456789abcdef', next: null, firmTag: 'fedcba9876543210', followedAt: COPIED_AT },
  })
})
afterEach(async () => {
  vi.useRealTimers()
  vi.restoreAllMocks()
  vi.unstubAllGlobals()
  useSessionStore().set(null)
  await kitBox().clear()
})

/** The page of the cylinder, once the phone's copy stands in for the server. */
async function fromCopy() {
  let shown!: ReturnType<typeof useCylinder> & { copyOf: ReturnType<typeof useCopyOf> }
  const wrapper = await mountSuspended(defineComponent({
    setup() {
      shown = { ...useCylinder(), copyOf: useCopyOf() }
      return () => null
    },
  }), { route: `/c/${ID}` })
  await vi.waitFor(() => expect(answers).toHaveLength(1))
  await vi.advanceTimersByTimeAsync(3_000)
  // What the copy is read with is fetched first.
  await vi.waitFor(() => expect(shown.view.value?.stamp?.serial).toBe('A1001'), { timeout: 20_000 })
  expect(shown.copyOf.value).toBe(COPIED_AT)
  return { shown, wrapper }
}

describe('a cylinder that the server is long in telling of', () => {
  it('is shown from the phone\'s copy, and then as the server tells it', async () => {
    const { shown, wrapper } = await fromCopy()
    answers[0]!(BY_THE_SERVER)
    await vi.waitFor(() => expect(shown.view.value?.stamp?.serial).toBe('by the server'))
    expect(shown.copyOf.value).toBeNull()
    wrapper.unmount()
  })

  it('stays as the copy has it where what waits on the phone is in the copy alone', async () => {
    vi.spyOn(useOutboxStore(), 'pendingOf').mockReturnValue([{}] as never)
    const { shown, wrapper } = await fromCopy()
    answers[0]!(BY_THE_SERVER)
    await vi.advanceTimersByTimeAsync(50)
    expect([shown.view.value?.stamp?.serial, shown.copyOf.value]).toEqual(['A1001', COPIED_AT])
    wrapper.unmount()
  })
})
