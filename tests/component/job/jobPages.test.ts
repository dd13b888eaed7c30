import { flushPromises } from '@vue/test-utils'
import { mountSuspended, registerEndpoint } from '@nuxt/test-utils/runtime'
import { getQuery, readBody } from 'h3'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import JobPage from '~~/pages/jobs/[id].vue'
import JobsPage from '~~/pages/jobs/index.vue'
import { usePreferencesStore } from '~~/stores/preferences'
import { useSessionStore } from '~~/stores/session'
import { DEFAULT_FILL_POLICY } from '~~/utils/capacity/types'
import type { JobAnswer } from '~~/utils/contract/jobs'
import { allByRole, byRole } from '../../helpers/roles'

const JOB: JobAnswer = {
  id: '0190a3c4-0000-7000-8000-0000000000d1', number: 7, customer: { id: 'f1', name: 'Ossory Foods' }, email: 'plant@ossory.example', site: '4 Quay Street', equipment: 'Chiller 2',
  refrigerant: 'R-22', charge: null, keeps: 'customer', opened: null, note: null, createdAt: '2026-07-01T15:00:00.000Z', createdBy: { id: 'p', name: 'Tina' },
  cylinders: 1, recoveredGrams: 5_670, notKnown: 0, fills: [], draws: [],
  required: { level: { unit: 'inHg-vacuum', value: 0 }, alternative: null, assumed: ['The charge is not known: taken as 200 lb or more, which asks for more.'], source: '40 CFR 82.156(a), Table 1' },
  cautions: [{ code: 'vacuum-level', text: 'No vacuum was recorded.', source: '40 CFR 82.156(a), Table 1' }], issue: 1, corrections: [], notes: [],
}
const asked: unknown[] = []
const mailed: { id: string, recipient: string }[] = []

registerEndpoint('/api/jobs', (event) => {
  asked.push(getQuery(event))
  return { items: [JOB], nextCursor: null }
})
registerEndpoint(`/api/jobs/${JOB.id}`, () => JOB)
registerEndpoint(`/api/jobs/${JOB.id}/recovery-note/mail`, { method: 'POST', handler: async (event) => {
  mailed.push(await readBody(event))
  return { outcome: 'kept', recipient: 'plant@ossory.example', issue: 1 }
} })
registerEndpoint('/api/firms', () => ({ items: [{ id: 'f1', name: 'Ossory Foods', kind: 'customer' }], nextCursor: null, total: 1 }))
registerEndpoint('/api/refrigerants', () => ({ items: [{ designation: 'R-22' }], nextCursor: null, total: 1, compositions: [] }))
registerEndpoint('/api/policy', () => ({
  timeZone: 'America/Chicago', fillPolicies: [{ fromAt: 0, policy: DEFAULT_FILL_POLICY }], retests: [], scales: [],
  retest: { soonDays: 120, notSeenDays: 30, missingDays: 90, intervalMonths: null, ownerChoices: [] },
}))

function signIn(role: 'technician' | 'auditor') {
  useSessionStore().set({
    id: 'p', name: 'Tina', email: 'tina@firm.example', roles: [role], trainee: false, certification: null, certificationType: 'universal', certificationNumber: null, units: 'kg',
  })
  usePreferencesStore().unit = 'kg'
}

const words = (root: Element) => root.textContent!.replaceAll('\u00A0', ' ').replace(/\s+/g, ' ')

describe('the pages of jobs', () => {
  beforeEach(() => {
    asked.length = 0
    mailed.length = 0
  })
  afterEach(() => {
    document.body.innerHTML = ''
  })

  it('list them by what the address asks', async () => {
    signIn('technician')
    const page = await mountSuspended(JobsPage, { route: '/jobs?customer=f1&mine=true' })
    await vi.waitFor(() => expect(words(page.element.parentElement!)).toContain('7: Ossory Foods'), { timeout: 5000 })
    expect(words(page.element.parentElement!)).toContain('5.67 kg')
    expect(asked).toEqual([{ limit: '50', customer: 'f1', mine: 'true' }])
    expect(allByRole(page.element.parentElement!, 'button').map(button => button.textContent!.trim())).toContain('New job')
  })

  it('show one with what wants looking at, and send its note by one button', async () => {
    signIn('technician')
    const page = await mountSuspended(JobPage, { route: `/jobs/${JOB.id}` })
    await vi.waitFor(() => expect(words(page.element.parentElement!)).toContain('Recovered in all'), { timeout: 5000 })
    const text = words(page.element.parentElement!)
    for (const part of ['No vacuum was recorded.', '5.67 kg', '0 inHg vacuum', 'taken as 200 lb or more', 'Nothing that counts was recorded of this job.']) expect(text).toContain(part)
    byRole(page.element.parentElement!, 'button', 'Send the note').closest('form')!.dispatchEvent(new Event('submit', { cancelable: true }))
    await vi.waitFor(() => expect(mailed).toMatchObject([{ recipient: 'plant@ossory.example' }]))
    await vi.waitFor(() => expect(words(page.element.parentElement!)).toContain('The note is kept here until it can be sent.'))
  })

  it('offer who only reads neither a new job nor the sending', async () => {
    signIn('auditor')
    const list = await mountSuspended(JobsPage, { route: '/jobs' })
    await flushPromises()
    expect(allByRole(list.element.parentElement!, 'button').map(button => button.textContent!.trim())).not.toContain('New job')
    const page = await mountSuspended(JobPage, { route: `/jobs/${JOB.id}` })
    await vi.waitFor(() => expect(words(page.element.parentElement!)).toContain('Recovered in all'), { timeout: 5000 })
    expect(allByRole(page.element.parentElement!, 'button').map(button => button.textContent!.trim())).not.toContain('Send the note')
  })
})
