import 'fake-indexeddb/auto'
import { mountSuspended, registerEndpoint } from '@nuxt/test-utils/runtime'
import { setResponseStatus, type H3Event } from 'h3'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { defineComponent, h } from 'vue'
import { kitBox } from '~~/composables/kitBox'
import { useCopyOf } from '~~/composables/useCopyOf'
import { useScanLookup } from '~~/composables/useScanLookup'
import { useSessionStore } from '~~/stores/session'
import { kitEntry } from '~~/utils/kit/kitEntry'
import { KIT_FORM, packCylinder } from '~~/utils/kit/packCylinder'
import { did, filled, registered, TECHNICIAN, viewAfter } from '../../helpers/custody'
import { KIT_FIRM, stateOf } from '../../helpers/kitAnswers'

const ID = '0198f000-0000-7000-8000-000000000101'
const CODE = '7K3M9Q2TX'
const STORY = [registered(), did('labelled', { code: CODE }), filled('R-22', 22)]
const COPIED_AT = Date.UTC(2026, 6, 2, 19, 5)

/** A text with its narrow spaces as plain ones. */
const plain = (text: string | null | undefined) => text?.replace(/[\u00A0\u202F]/g, ' ')

/** How the server answers; it waits until then. */
let tell: (view: object | number) => void
let told: Promise<object | number>
registerEndpoint(`/api/cylinders/${CODE}`, async (event: H3Event) => {
  const answer = await told
  if (typeof answer !== 'number') return answer
  setResponseStatus(event, answer)
  return { type: 'about:blank', title: 'No', status: answer, detail: '' }
})

/** The first answer brings the catalogue of refrigerants with it. */
const until = (holds: () => void) => vi.waitFor(holds, { timeout: 20_000 })

async function scanner() {
  const on = { start: vi.fn<() => void>(), end: vi.fn<() => void>() }
  let lookup!: ReturnType<typeof useScanLookup>
  const copyOf = { value: useCopyOf() }
  const wrapper = await mountSuspended(defineComponent({
    setup() {
      lookup = useScanLookup(on)
      copyOf.value = useCopyOf()
      return () => h('p', lookup.spoken.value)
    },
  }))
  return { lookup, on, copyOf: () => copyOf.value.value, wrapper }
}

beforeEach(async () => {
  told = new Promise((done) => {
    tell = done
  })
  useSessionStore().set({ id: TECHNICIAN, name: 'Tina', email: 'tina@firm.example', roles: ['technician'], trainee: false } as never)
  await kitBox().take({
    anew: true, before: null, entries: [kitEntry(packCylinder(stateOf(ID, ...STORY)))], firm: KIT_FIRM,
    about: { personId: TECHNICIAN, form: KIT_FORM, seq: 1, mark: '0123456789abcdef', next: null, firmTag: 'fedcba9876543210', followedAt: COPIED_AT },
  })
})
afterEach(async () => {
  tell(503)
  useSessionStore().set(null)
  useCopyOf().value = null
  await kitBox().clear()
})

describe('a scanned code', () => {
  it('is answered from the phone before the server has said anything, and then confirmed', async () => {
    const { lookup, on, copyOf, wrapper } = await scanner()
    void lookup.look(CODE)
    await until(() => expect(lookup.outcome.value).toMatchObject({ is: 'known', copyOf: COPIED_AT }))
    await until(() => expect(on.end).toHaveBeenCalledOnce())
    // 16 kg may be in it and 10 kg are: 6 kg are 13.2 lb, rounded down.
    expect(plain(lookup.verdict.value?.text)).toBe('Room for 13.2 lb of R-22')
    tell({ ...viewAfter(STORY), id: ID, place: { id: 'x', name: 'North shop', kind: 'shop' } })
    await until(() => expect(lookup.outcome.value).not.toHaveProperty('copyOf'))
    expect(copyOf()).toBeNull()
    wrapper.unmount()
  })

  it('shows as a change what the server says otherwise, by a word and to a screen reader', async () => {
    const { lookup, wrapper } = await scanner()
    void lookup.look(CODE)
    await until(() => expect(lookup.outcome.value).toMatchObject({ copyOf: COPIED_AT }))
    tell({ ...viewAfter([...STORY, filled('R-22', 24)]), id: ID })
    await until(() => expect(plain(lookup.changedFrom.value)).toBe('R-22, room for 13.2 lb of R-22'))
    // 12 kg are in it now: 4 kg are 8.8 lb.
    expect(plain(lookup.verdict.value?.text)).toBe('Room for 8.8 lb of R-22')
    expect(plain(wrapper.text())).toBe('7K3 M9Q 2TX, changed, R-22, Room for 8.8 lb of R-22')
    wrapper.unmount()
  })

  it('keeps the copy\'s answer where the server fails, and says of when it is', async () => {
    const { lookup, copyOf, wrapper } = await scanner()
    void lookup.look(CODE)
    tell(503)
    await until(() => expect(copyOf()).toBe(COPIED_AT))
    expect(lookup.outcome.value).toMatchObject({ is: 'known', copyOf: COPIED_AT })
    wrapper.unmount()
  })

  it('is left to the server where the copy does not have it, and is on no cylinder of the copy where the server fails', async () => {
    await kitBox().clear()
    await kitBox().take({ anew: true, before: null, entries: [], firm: KIT_FIRM, about: { personId: TECHNICIAN, form: KIT_FORM, seq: 1, mark: '0123456789abcdef', next: null, firmTag: 'fedcba9876543210', followedAt: COPIED_AT } })
    const { lookup, wrapper } = await scanner()
    void lookup.look(CODE)
    tell(503)
    await until(() => expect(lookup.outcome.value).toEqual({ is: 'unknown', code: CODE, copyOf: COPIED_AT }))
    wrapper.unmount()
  })
})
