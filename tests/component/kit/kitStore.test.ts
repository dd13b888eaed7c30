import 'fake-indexeddb/auto'
import { registerEndpoint } from '@nuxt/test-utils/runtime'
import { getQuery, setResponseStatus } from 'h3'
import { createPinia, setActivePinia } from 'pinia'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { keepPerson } from '~~/composables/keptPerson'
import { kitBox } from '~~/composables/kitBox'
import { offlineAnswer } from '~~/composables/offlineAnswers'
import { outboxBox } from '~~/composables/outboxBox'
import { useKitStore } from '~~/stores/kit'
import { useOutboxStore } from '~~/stores/outbox'
import { useSessionStore } from '~~/stores/session'
import type { KitAnswer } from '~~/utils/contract/kit'
import type { CylinderView, FleetAnswer, FoldInput } from '~~/utils/contract/custody'
import type { PlacesAnswer } from '~~/utils/contract/places'
import type { VanAnswer } from '~~/utils/contract/vans'
import { did, filled, kg, registered, SHOP, TECHNICIAN, VAN } from '../../helpers/custody'
import { kitAnswerOf, stateOf } from '../../helpers/kitAnswers'

const [ONE, TWO, THREE] = ['0198f000-0000-7000-8000-000000000101', '0198f000-0000-7000-8000-000000000102', '0198f000-0000-7000-8000-000000000103']
const inShop = stateOf(ONE, registered(), did('labelled', { code: '7K3M9Q2TX' }), filled('R-22', 22))
const inVan = stateOf(TWO, registered({ stamp: { serial: 'B-77 31', spec: 'DOT-4BA', servicePressurePsig: 400, tareWeight: kg(12), waterCapacity: kg(20), madeMonth: '2024-03', flammableMarked: true } }), did('moved', { toPlaceId: VAN, toHolderId: TECHNICIAN }))

/** What the server answers, one after another; the status of a refusal in place of one, or what happens before it answers. */
let answers: (KitAnswer | number | (() => Promise<KitAnswer>))[] = []
let asked: Record<string, unknown>[] = []
registerEndpoint('/api/kit', (event) => {
  asked.push(getQuery(event))
  const next = answers.shift() ?? kitAnswerOf([], { seq: 9, firm: undefined })
  if (typeof next === 'function') return next()
  if (typeof next !== 'number') return next
  setResponseStatus(event, next)
  return { type: 'about:blank', title: 'No', status: next, detail: '' }
})

/** A visit of a person: a fresh page on the same device. */
function visit(id = TECHNICIAN) {
  setActivePinia(createPinia())
  useSessionStore().set({ id, name: 'Tina', email: 'tina@firm.example', roles: ['technician'], trainee: false } as never)
  return useKitStore()
}

beforeEach(() => {
  answers = []
  asked = []
  vi.useFakeTimers({ toFake: ['setInterval', 'clearInterval'] })
})
afterEach(async () => {
  vi.useRealTimers()
  const box = kitBox()
  await box.clear()
  await box.close()
})

describe('the copy of the firm on a phone', () => {
  it('is fetched in parts, and then only what has changed since', async () => {
    answers = [kitAnswerOf([inShop], { anew: true, seq: 5, next: ONE }), kitAnswerOf([inVan], { seq: 5, firm: undefined })]
    const kit = visit()
    await kit.start()
    expect(asked).toEqual([{}, { since: '5', mark: '0123456789abcdef', firm: 'fedcba9876543210', after: ONE }])
    expect([kit.count, kit.seq]).toEqual([2, 5])
    answers = [kitAnswerOf([stateOf(THREE, registered())], { seq: 6, firm: undefined })]
    await kit.follow()
    expect(asked.at(-1)).toEqual({ since: '5', mark: '0123456789abcdef', firm: 'fedcba9876543210' })
    expect([kit.count, kit.seq]).toEqual([3, 6])
  })

  it('goes on where it was when the phone dies in the midst of the first walk', async () => {
    answers = [kitAnswerOf([inShop], { anew: true, seq: 5, next: ONE }), 503]
    await visit().start()
    answers = [kitAnswerOf([inVan], { seq: 5, firm: undefined })]
    const kit = visit()
    await kit.start()
    expect(asked.at(-1)).toMatchObject({ since: '5', after: ONE })
    expect(kit.count).toBe(2)
  })

  it('lists nothing before it is whole, for half a van looks like a whole one', async () => {
    answers = [kitAnswerOf([inVan], { anew: true, next: TWO }), 503]
    await visit().start()
    expect(await offlineAnswer('/api/cylinders', { holder: TECHNICIAN })).toBeUndefined()
    expect(await offlineAnswer(`/api/vans/${VAN}`)).toBeUndefined()
    expect(await offlineAnswer(`/api/cylinders/${ONE}`)).toBeUndefined()
    expect(await offlineAnswer(`/api/cylinders/${TWO}`)).toMatchObject({ id: TWO })
  })

  it('stays as it is where the server is not reached or the session has ended', async () => {
    answers = [kitAnswerOf([inShop], { anew: true, seq: 5 })]
    const kit = visit()
    await kit.start()
    const followedAt = kit.followedAt
    answers = [401]
    await kit.follow()
    expect([kit.count, kit.seq, kit.followedAt]).toEqual([1, 5, followedAt])
  })

  it('follows again after an answer that began and never ended', async () => {
    answers = [kitAnswerOf([inShop], { anew: true, seq: 5 })]
    const kit = visit()
    await kit.start()
    vi.useFakeTimers({ toFake: ['setTimeout', 'clearTimeout'] })
    vi.stubGlobal('$fetch', (_path: string, { signal }: { signal?: AbortSignal }) => new Promise((_, failed) => {
      signal?.addEventListener('abort', () => failed(new Error('aborted')))
    }))
    const following = kit.follow()
    for (let second = 0; second < 61; second++) await vi.advanceTimersByTimeAsync(1_000)
    vi.useRealTimers()
    await following
    vi.unstubAllGlobals()
    answers = [kitAnswerOf([inVan], { seq: 6, firm: undefined })]
    await kit.follow()
    expect([kit.count, kit.seq]).toEqual([2, 6])
  })

  it('is thrown away where the server says that its log is another one', async () => {
    answers = [kitAnswerOf([inShop, inVan], { anew: true, seq: 5 })]
    const kit = visit()
    await kit.start()
    answers = [kitAnswerOf([stateOf(THREE, registered())], { anew: true, seq: 2 })]
    await kit.follow()
    expect([kit.count, kit.seq]).toEqual([1, 2])
    expect(await offlineAnswer(`/api/cylinders/${THREE}`)).toMatchObject({ id: THREE })
  })

  it('keeps the firm where only its cylinders come anew, for the server does not send again what the phone has of it', async () => {
    answers = [kitAnswerOf([inShop], { anew: true, seq: 5 }), kitAnswerOf([inVan], { anew: true, seq: 5, mark: 'aaaaaaaaaaaaaaaa', firm: undefined })]
    await visit().start()
    await visit().start()
    expect(asked).toHaveLength(2)
    visit()
    expect(await offlineAnswer(`/api/cylinders/${TWO}`)).toMatchObject({ id: TWO, place: { name: 'Van 7' } })
  })

  it.each([
    ['the first walk', kitAnswerOf([inVan], { seq: 5, firm: undefined })],
    ['what has changed since', kitAnswerOf([inVan], { seq: 6, firm: undefined })],
  ])('begins anew, and not in the middle, where another tab signs out while a part of %s is on its way', async (walk, part) => {
    answers = [kitAnswerOf([inShop], { anew: true, seq: 5, next: walk === 'the first walk' ? ONE : null }), async () => {
      const otherTab = kitBox()
      await otherTab.clear()
      await otherTab.close()
      return part
    }]
    const kit = visit()
    await kit.start()
    if (asked.length === 1) await kit.follow()
    expect(await kitBox().about()).toBeNull()
    answers = [kitAnswerOf([inShop, inVan], { anew: true, seq: 6 })]
    await visit().start()
    expect(asked.at(-1)).toEqual({})
    expect(await offlineAnswer(`/api/cylinders/${ONE}`)).toMatchObject({ id: ONE })
  })

  it('leaves an answer of another form alone', async () => {
    answers = [kitAnswerOf([inShop], { anew: true, seq: 5 }), kitAnswerOf([], { anew: true, seq: 9, form: 2 })]
    const kit = visit()
    await kit.start()
    await kit.follow()
    expect([kit.count, kit.seq]).toEqual([1, 5])
  })

  it('is no other person\'s, and gone after signing out', async () => {
    answers = [kitAnswerOf([inShop], { anew: true })]
    await visit().start()
    answers = [503]
    const other = visit('0198f000-0000-7000-8000-0000000000b9')
    await other.start()
    expect(other.count).toBe(0)
    expect(await offlineAnswer(`/api/cylinders/${ONE}`)).toBeUndefined()
    answers = [kitAnswerOf([inShop], { anew: true })]
    const kit = visit()
    await kit.start()
    await kit.wipe()
    expect(await kitBox().count()).toBe(0)
  })

  it('is left alone by the tab of whoever was signed in before: it takes nothing of it away and puts nothing in', async () => {
    const other = { id: '0198f000-0000-7000-8000-0000000000b9', roles: ['technician'] }
    answers = [kitAnswerOf([inShop, inVan], { anew: true })]
    await visit(other.id).start()
    keepPerson(other as never)
    const leftOver = visit()
    await leftOver.start()
    await leftOver.follow()
    keepPerson(null)
    expect([leftOver.count, asked.length, (await kitBox().about())?.personId, await kitBox().count()]).toEqual([0, 1, other.id, 2])
  })

  it('is opened again where the browser has closed it in the background', async () => {
    const box = kitBox()
    await box.clear()
    await box.close()
    expect(await box.count()).toBe(0)
  })
})

describe('an answer from the copy', () => {
  beforeEach(async () => {
    answers = [kitAnswerOf([inShop, inVan], { anew: true })]
    await visit().start()
  })

  it('is the cylinder with its limit, by its label however typed, its id or its serial', async () => {
    const view = await offlineAnswer('/api/cylinders/7k3m9q2tx') as CylinderView
    // Water capacity 20 kg, R-22: 16,000 g; tare 12 kg; 10 kg are in it.
    expect(view.capacity).toMatchObject({ fillLimitGrams: 16_000, stopWeightGrams: 28_000, roomGrams: 6_000 })
    expect(view.place).toEqual({ id: SHOP, name: 'North shop', kind: 'shop' })
    expect((await offlineAnswer(`/api/cylinders/${ONE}`) as CylinderView).id).toBe(ONE)
    expect((await offlineAnswer('/api/cylinders/B-77%2031') as CylinderView).id).toBe(TWO)
  })

  it('asks about a refrigerant to come', async () => {
    const view = await offlineAnswer(`/api/cylinders/${TWO}`, { refrigerant: 'r-22' }) as CylinderView
    expect(view.capacity).toMatchObject({ forRefrigerant: 'R-22', stopWeightGrams: 28_000 })
  })

  it('says of what is not in it that it is not in the copy', async () => {
    await expect(offlineAnswer('/api/cylinders/000000000')).rejects.toMatchObject({ data: { status: 404, type: 'not-in-copy' } })
  })

  it('tells what is held, what stands in a van, and what ends with typed characters', async () => {
    const ids = async (path: string, query: object) => (await offlineAnswer(path, { ...query }) as FleetAnswer).items.map(({ id }) => id)
    expect(await ids('/api/cylinders', { holder: TECHNICIAN, limit: 200 })).toEqual([TWO])
    expect(await ids('/api/cylinders', { place: SHOP })).toEqual([ONE])
    expect(await ids('/api/cylinders', { q: '77-31' })).toEqual([TWO])
    expect(await ids('/api/cylinders', { q: '7732' })).toEqual([])
    expect(await ids('/api/cylinders', { label: '7K3M9Q2TX', limit: 1 })).toEqual([ONE])
    const van = await offlineAnswer(`/api/vans/${VAN}`) as VanAnswer
    expect(van.aboard.map(({ id }) => id)).toEqual([TWO])
    expect(van.van).toMatchObject({ name: 'Van 7', cylinders: 1 })
  })

  it('gives a form what it judges a draft by, and says of the log that it is with the server', async () => {
    const fold = await offlineAnswer(`/api/cylinders/${ONE}/fold`) as FoldInput
    expect([fold.events, fold.state?.contents.netGrams]).toEqual([[], 10_000])
    expect(await offlineAnswer(`/api/cylinders/${ONE}/events`)).toMatchObject({ items: [], isWithServer: true })
  })

  it('knows the places with what stands in each, and leaves what it does not know to the server', async () => {
    const { items } = await offlineAnswer('/api/places', { active: true }) as PlacesAnswer
    expect(items.map(({ name, cylinders }) => [name, cylinders])).toEqual([['North shop', 1], ['Van 7', 1]])
    for (const path of ['/api/reports/mass-balance', '/api/session', '/api/now']) expect(await offlineAnswer(path)).toBeUndefined()
    expect(await offlineAnswer('/api/cylinders', { holder: TECHNICIAN, asOf: '2026-07-01T00:00:00Z' })).toBeUndefined()
  })

  it('gives the saturation that a check by pressure is judged by', async () => {
    const { bubblePressureKPa } = await offlineAnswer('/api/refrigerants/r-22/saturation', { temperatureC: 25 }) as { bubblePressureKPa: number }
    // 1,044 kPa absolute at 25 °C, from memory.
    expect(Math.abs(bubblePressureKPa - 1_044)).toBeLessThan(5)
    expect(await offlineAnswer('/api/refrigerants/R-22/saturation', { temperatureC: 150 })).toBeUndefined()
    expect(await offlineAnswer('/api/refrigerants/none/saturation', { temperatureC: 25 })).toBeUndefined()
  })

  it('says which cylinders share a code', async () => {
    const shared = stateOf(THREE, registered(), did('labelled', { code: '7K3M9Q2TX' }, { occurredAt: Date.UTC(2026, 8, 1) }))
    answers = [kitAnswerOf([shared], { seq: 2, firm: undefined })]
    await useKitStore().follow()
    const { items } = await offlineAnswer('/api/cylinders', { finding: 'code-on-two', limit: 200 }) as FleetAnswer
    expect(items.map(({ id }) => id)).toEqual([ONE, THREE])
    const view = await offlineAnswer('/api/cylinders/7K3M9Q2TX') as CylinderView
    expect([view.id, view.findings.map(({ code }) => code)]).toEqual([ONE, expect.arrayContaining(['code-on-two'])])
  })
})

describe('what waits on the phone', () => {
  const at = (minutes: number) => new Date(Date.UTC(2026, 6, 2) + minutes * 60_000).toISOString()
  const toVan = (cylinderId: string, id: string) => ({
    id, cylinderId, kind: 'moved' as const, occurredAt: at(1), deviceId: 'phone-1', deviceSeq: 0, details: { toPlaceId: VAN, toHolderId: TECHNICIAN },
  })
  const EVENT = '0198f000-0000-7000-8000-0000000000e5'

  beforeEach(async () => {
    answers = [kitAnswerOf([inShop, inVan], { anew: true })]
    await visit().start()
    vi.stubGlobal('navigator', Object.create(navigator, { onLine: { value: false } }))
  })
  afterEach(async () => {
    vi.unstubAllGlobals()
    const box = outboxBox()
    await box.giveBack((await box.all()).map(({ id }) => id))
    await box.close()
  })

  it('is in every answer of the copy: the cylinder itself, what is held, what stands in the van', async () => {
    await useOutboxStore().put([toVan(ONE, EVENT)])
    expect(await offlineAnswer(`/api/cylinders/${ONE}`)).toMatchObject({ version: inShop.version + 1, place: { name: 'Van 7' }, holder: { name: 'Tina' } })
    const held = await offlineAnswer('/api/cylinders', { holder: TECHNICIAN, limit: 200 }) as FleetAnswer
    expect(held.items.map(({ id }) => id)).toEqual([ONE, TWO])
    expect((await offlineAnswer('/api/cylinders', { place: SHOP }) as FleetAnswer).items).toEqual([])
    expect((await offlineAnswer(`/api/vans/${VAN}`) as VanAnswer).aboard.map(({ id }) => id)).toEqual([ONE, TWO])
  })

  it('is said not to be in it where it takes the whole log to know', async () => {
    await useOutboxStore().put([{ ...toVan(ONE, EVENT), kind: 'corrected', details: { eventId: EVENT, reason: 'a slip' } } as never])
    expect(await offlineAnswer(`/api/cylinders/${ONE}`)).toMatchObject({ version: inShop.version, place: { name: 'North shop' }, waitingNotIn: 1 })
  })

  it('is a cylinder of its own where it was registered without the server', async () => {
    await useOutboxStore().put([
      { ...toVan(THREE, EVENT), kind: 'registered', placeId: VAN, details: { ...registered().details } } as never,
    ])
    expect(await offlineAnswer(`/api/cylinders/${THREE}`)).toMatchObject({ id: THREE, place: { name: 'Van 7' }, stamp: { serial: 'A1001' } })
    expect((await offlineAnswer('/api/cylinders', { q: '1001' }) as FleetAnswer).items.map(({ id }) => id)).toContain(THREE)
  })

  it('stays in the answer once it is recorded, until the copy has followed', async () => {
    const outbox = useOutboxStore()
    const [kept] = await outbox.put([toVan(ONE, EVENT)])
    const box = outboxBox()
    const sent = await box.all()
    await box.settle(sent, { recorded: [{ id: kept!.id, version: inShop.version + 1, cylinderId: ONE }], refused: [], kept: [], pause: null, split: false }, Date.now())
    await box.close()
    await outbox.attend()
    expect(outbox.waiting).toEqual([])
    expect(await offlineAnswer(`/api/cylinders/${ONE}`)).toMatchObject({ version: inShop.version + 1, place: { name: 'Van 7' } })
  })
})
