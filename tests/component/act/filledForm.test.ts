import { flushPromises } from '@vue/test-utils'
import { mountSuspended, registerEndpoint } from '@nuxt/test-utils/runtime'
import { createError, readBody } from 'h3'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import ActPage from '~~/pages/c/[ref]/act/[kind].vue'
import { usePreferencesStore } from '~~/stores/preferences'
import { useSessionStore } from '~~/stores/session'
import { DEFAULT_FILL_POLICY } from '~~/utils/capacity/types'
import type { CustodyEvent } from '~~/utils/custody/event'
import { fold } from '~~/utils/custody/fold'
import { view } from '~~/utils/custody/view'
import { CYLINDER, did, filled, FOLD_CONTEXT, recorded, registered, TECHNICIAN, VIEW_CONTEXT } from '../../helpers/custody'
import { allByRole, byRole } from '../../helpers/roles'

const CODE = '7K3M9Q2TX'
// Tare 12 kg and room for 16 kg of R-22: filling stops at 28.00 kg. It holds 8 kg, so the scale shows 20 kg.
const EVENTS = recorded(registered(), did('labelled', { code: CODE }), filled('R-22', 20))
const CYLINDER_VIEW = view(fold(EVENTS, FOLD_CONTEXT).state, { ...VIEW_CONTEXT, nowMs: Date.now() })

const SCALES = [
  { id: '0190a3c4-0000-7000-8000-000000000001', name: 'Bench', accuracyGrams: 5, accuracyPercent: 0, lastCheck: null, active: true },
  { id: '0190a3c4-0000-7000-8000-000000000002', name: 'Dock', accuracyGrams: 90, accuracyPercent: 0, lastCheck: null, active: true },
]

const CUSTOMER_FIRM = '0190a3c4-0000-7000-8000-0000000000f1'
const MADE_JOB = '0190a3c4-0000-7000-8000-0000000000d2'
const JOB = {
  id: '0190a3c4-0000-7000-8000-0000000000d1', number: 7, customer: { id: CUSTOMER_FIRM, name: 'Ossory Foods' }, email: null, site: '4 Quay Street', equipment: 'Chiller 2',
  refrigerant: 'R-22', charge: null, keeps: 'customer', opened: null, note: null, createdAt: '2026-07-01T15:00:00.000Z', createdBy: { id: 'p', name: 'Tina' }, cylinders: 0, recoveredGrams: null, notKnown: 0,
}
const madeJobs: unknown[] = []
const sent: CustodyEvent[] = []
let isDown = false

const list = (items: unknown[]) => () => ({ items, nextCursor: null, total: items.length })
for (const ref of [CODE.toLowerCase(), CYLINDER]) {
  registerEndpoint(`/api/cylinders/${ref}`, () => CYLINDER_VIEW)
  registerEndpoint(`/api/cylinders/${ref}/fold`, () => ({ events: EVENTS, codesOnTwo: [], otherHalves: [] }))
  registerEndpoint(`/api/cylinders/${ref}/events`, list([]))
}
registerEndpoint('/api/places', list([]))
registerEndpoint('/api/firms', list([{ id: CUSTOMER_FIRM, name: 'Ossory Foods', kind: 'customer' }]))
registerEndpoint('/api/people', list([]))
registerEndpoint('/api/refrigerants', list([{ designation: 'R-22' }, { designation: 'R-410A' }]))
registerEndpoint('/api/policy', () => ({
  timeZone: 'America/Chicago', fillPolicies: [{ fromAt: 0, policy: DEFAULT_FILL_POLICY }], retests: [], scales: SCALES,
  retest: { soonDays: 120, notSeenDays: 30, missingDays: 90, intervalMonths: null, ownerChoices: [] },
}))
registerEndpoint('/api/jobs', { method: 'GET', handler: () => ({ items: [JOB], nextCursor: null }) })
registerEndpoint('/api/jobs', {
  method: 'POST',
  handler: async (event) => {
    madeJobs.push(await readBody(event))
    return { ...JOB, id: MADE_JOB, number: 8, keeps: 'firm' }
  },
})
registerEndpoint('/api/events', {
  method: 'POST',
  handler: async (event) => {
    const { events } = await readBody<{ events: CustodyEvent[] }>(event)
    sent.push(...events)
    if (isDown) throw createError({ statusCode: 503, data: { type: 'about:blank', title: 'Out of reach', status: 503, detail: 'Try again.' } })
    return { results: events.map(({ id }) => ({ id, outcome: 'accepted', version: 4 })), cylinders: [CYLINDER_VIEW] }
  },
})

async function openForm() {
  useSessionStore().set({
    id: TECHNICIAN, name: 'A. Technician', email: 'a@firm.example', roles: ['technician'], trainee: false, certification: null, certificationType: 'universal', certificationNumber: null, units: 'kg',
  })
  usePreferencesStore().unit = 'kg'
  const page = await mountSuspended(ActPage, { route: `/c/${CODE.toLowerCase()}/act/filled` })
  await flushPromises()
  return page
}

type Page = Awaited<ReturnType<typeof openForm>>

async function type(page: Page, name: string, text: string) {
  const field = byRole(page.element.parentElement!, 'textbox', name) as HTMLInputElement
  field.value = text
  field.dispatchEvent(new Event('input'))
  await flushPromises()
}

const pressRecord = async (page: Page) => {
  await page.find('form#act').trigger('submit')
  await flushPromises()
}
const shows = (page: Page, text: string) => vi.waitFor(() => expect(page.text()).toContain(text), { timeout: 5000 })

describe('the form of a recovery', () => {
  beforeEach(() => {
    sessionStorage.clear()
    sent.length = 0
    isDown = false
  })
  afterEach(() => {
    document.body.innerHTML = ''
  })

  it('says where to stop before anything is typed', async () => {
    const page = await openForm()
    expect(page.text()).toContain('Room for 8.00\u00A0kg of R-22')
    expect(page.text()).toContain('28.00')
  })

  it('shows a reading in the other units as it is typed', async () => {
    const page = await openForm()
    await page.findAll('button[aria-pressed]').filter(button => button.text() === 'lb oz').at(-1)!.trigger('click')
    await type(page, 'Scale after, pounds', '61')
    await type(page, 'Scale after, ounces', '12')
    // 61 lb 12 oz = 61.75 lb = 28.009 kg.
    expect(page.text()).toContain('61.8\u00A0lb · 28.01\u00A0kg')
  })

  it('tells of an overfill before it is sent, and sends it only once its author has said that it happened', async () => {
    const page = await openForm()
    await type(page, 'Scale after, kilograms', '28.5')
    await shows(page, 'Overfilled by')
    await pressRecord(page)
    expect(sent).toHaveLength(0)
    const seen = allByRole(page.element.parentElement!, 'checkbox').at(-1) as HTMLInputElement
    seen.checked = true
    seen.dispatchEvent(new Event('change'))
    await pressRecord(page)
    await vi.waitFor(() => expect(sent).toHaveLength(1))
    expect(sent[0]!.confirmed).toContain('overfill')
    expect(sent[0]!.details).toMatchObject({ refrigerant: 'R-22', grossAfter: { unit: 'kg', value: 28.5 } })
    await shows(page, 'Recorded: filled')
  })

  it('begins with the scale last used on this device, and keeps the one that was used now', async () => {
    usePreferencesStore().lastScaleId = SCALES[0]!.id
    const page = await openForm()
    const scale = (name: string) => byRole(page.element.parentElement!, 'button', name)
    expect(scale('Bench').getAttribute('aria-pressed')).toBe('true')
    scale('Dock').click()
    await flushPromises()
    await type(page, 'Scale after, kilograms', '24')
    await pressRecord(page)
    await vi.waitFor(() => expect(sent).toHaveLength(1))
    expect(sent[0]!.details).toMatchObject({ scaleId: SCALES[1]!.id })
    await vi.waitFor(() => expect(usePreferencesStore().lastScaleId).toBe(SCALES[1]!.id))
    usePreferencesStore().lastScaleId = ''
  })

  async function choose(page: Page, name: string, value: string) {
    const box = byRole(page.element.parentElement!, 'combobox', name) as HTMLSelectElement
    box.value = value
    box.dispatchEvent(new Event('change'))
    await flushPromises()
  }

  it('of a job is that customer\'s refrigerant, and leads to the job once it is recorded', async () => {
    const page = await openForm()
    await vi.waitFor(() => expect(page.text()).toContain('7: Ossory Foods, Chiller 2'), { timeout: 5000 })
    await choose(page, 'Job', JOB.id)
    await type(page, 'Scale after, kilograms', '24')
    await pressRecord(page)
    await vi.waitFor(() => expect(sent).toHaveLength(1))
    expect(sent[0]!.details).toMatchObject({ jobId: JOB.id, ownerOfRefrigerantId: CUSTOMER_FIRM })
    await shows(page, 'The job and its recovery note')
  })

  it('makes a job in place, and is of it', async () => {
    const page = await openForm()
    await vi.waitFor(() => expect(page.text()).toContain('A new job'), { timeout: 5000 })
    byRole(page.element.parentElement!, 'button', 'A new job').click()
    await flushPromises()
    await choose(page, 'Customer', CUSTOMER_FIRM)
    await type(page, 'Site', '5 Quay Street')
    await type(page, 'Equipment', 'Ice machine')
    byRole(page.element.parentElement!, 'button', 'Left to us').click()
    await flushPromises()
    await page.find('form[aria-label="A new job"]').trigger('submit')
    await vi.waitFor(() => expect(madeJobs).toMatchObject([{ customerId: CUSTOMER_FIRM, site: '5 Quay Street', equipment: 'Ice machine', keeps: 'firm' }]))
    await type(page, 'Scale after, kilograms', '24')
    await pressRecord(page)
    await vi.waitFor(() => expect(sent).toHaveLength(1))
    expect(sent[0]!.details).toMatchObject({ jobId: MADE_JOB })
    expect(sent[0]!.details).not.toHaveProperty('ownerOfRefrigerantId')
  })

  it('asks for nothing where nothing is found', async () => {
    const page = await openForm()
    const looked = allByRole(page.element.parentElement!, 'checkbox')[0] as HTMLInputElement
    looked.checked = true
    looked.dispatchEvent(new Event('change'))
    await type(page, 'Scale after, kilograms', '24')
    await pressRecord(page)
    await vi.waitFor(() => expect(sent).toHaveLength(1))
    expect(sent[0]!.confirmed).toBeUndefined()
    expect(sent[0]!.details).toMatchObject({ looked: true })
  })

  it('keeps the entry when it did not arrive, and sends the same event again', async () => {
    const page = await openForm()
    isDown = true
    await type(page, 'Scale after, kilograms', '24')
    await pressRecord(page)
    await shows(page, 'Your entry is kept')
    expect((byRole(page.element.parentElement!, 'textbox', 'Scale after, kilograms') as HTMLInputElement).value).toBe('24')

    isDown = false
    await pressRecord(page)
    await shows(page, 'Recorded: filled')
    expect(sent).toHaveLength(2)
    expect(sent[1]).toEqual(sent[0])
  })

  it('still has the entry when the page is opened again', async () => {
    const first = await openForm()
    isDown = true
    await type(first, 'Scale after, kilograms', '24')
    await pressRecord(first)
    await shows(first, 'Your entry is kept')
    first.unmount()

    const again = await openForm()
    await shows(again, 'Kept from before')
    expect((byRole(again.element.parentElement!, 'textbox', 'Scale after, kilograms') as HTMLInputElement).value).toBe('24')
  })
})
