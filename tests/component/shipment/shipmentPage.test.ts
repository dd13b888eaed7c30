import { mountSuspended, registerEndpoint } from '@nuxt/test-utils/runtime'
import { readBody } from 'h3'
import { beforeEach, describe, expect, it, vi } from 'vitest'
import ShipmentPage from '~~/pages/shipments/[id].vue'
import { useSessionStore } from '~~/stores/session'
import type { User } from '~~/utils/contract/session'
import type { ShipmentLine } from '~~/utils/contract/shipments'
import { cylinderRow } from '../../helpers/cylinderRow'
import { byRole } from '../../helpers/roles'

const ID = '01900000-0000-7000-8000-0000000000f1'
const LINES = [['a', '0YHP9KRRT'], ['b', '7K3M9Q2TX']].map(([id, labelCode]): ShipmentLine => ({
  cylinder: cylinderRow({ id, labelCode }), version: 3, because: [], sent: null, received: null,
}))
const MANAGER: User = { id: 'p', name: 'M. Sorrel', email: 'sorrel@firm.example', roles: ['manager'], trainee: false, certification: null, certificationType: null, certificationNumber: null, units: 'lb' }

function draft(lines: ShipmentLine[]) {
  return {
    id: ID, number: 4, state: 'draft', to: { id: 'f', name: 'Reclaimer One' }, note: null, cylinders: lines.length, netGrams: null,
    createdAt: '2026-05-01T10:00:00.000Z', createdBy: null, dispatchedAt: null, dispatchedBy: null, readyAt: null, arrivedAt: null, settledAt: null, closedAt: null, cancelledAt: null, lines,
  }
}

registerEndpoint(`/api/shipments/${ID}`, () => draft(LINES))
registerEndpoint(`/api/shipments/${ID}/lines`, {
  method: 'PUT',
  handler: async (event) => {
    const { cylinderIds } = await readBody<{ cylinderIds: string[] }>(event)
    return draft(LINES.filter(line => cylinderIds.includes(line.cylinder.id)))
  },
})
registerEndpoint('/api/policy', () => ({ timeZone: 'America/Chicago', fillPolicies: [], retests: [], scales: [], retest: { soonDays: 120 } }))
registerEndpoint('/api/session', () => ({ user: MANAGER }))

async function open() {
  const page = await mountSuspended(ShipmentPage, { route: `/shipments/${ID}`, attachTo: document.body })
  const boxOf = (code: string) => page.findAll('input').find(input => input.element.closest('label')?.textContent?.includes(code))
  await vi.waitFor(() => expect(boxOf('0YH P9K RRT')).toBeDefined())
  return {
    page,
    boxOf,
    press: (name: string) => byRole(page.element.parentElement!, 'button', name).click(),
  }
}

describe('a shipment that is being weighed', () => {
  beforeEach(() => {
    sessionStorage.clear()
    useSessionStore().set(MANAGER)
  })

  it('keeps the weights of the cylinders that stay when one is taken off', async () => {
    const { page, boxOf, press } = await open()
    await boxOf('0YH P9K RRT')!.setValue('50.1')
    await boxOf('7K3 M9Q 2TX')!.setValue('49.9')
    press('Take off 0YH P9K RRT')
    await vi.waitFor(() => expect(boxOf('0YH P9K RRT')).toBeUndefined())
    expect(boxOf('7K3 M9Q 2TX')!.element.value).toBe('49.9')
    expect(page.text()).toContain('1 of 1 weighed')
    page.unmount()
  })

  it('forgets the weights kept from before once none is left on it', async () => {
    const before = await open()
    await before.boxOf('7K3 M9Q 2TX')!.setValue('49.9')
    before.page.unmount()
    const { page, boxOf, press } = await open()
    await vi.waitFor(() => expect(boxOf('7K3 M9Q 2TX')!.element.value).toBe('49.9'))
    press('Take off 0YH P9K RRT')
    await vi.waitFor(() => expect(boxOf('0YH P9K RRT')).toBeUndefined())
    press('Take off 7K3 M9Q 2TX')
    await vi.waitFor(() => expect(page.text()).toContain('No cylinder is on this shipment yet.'))
    press('Undo')
    await vi.waitFor(() => expect(boxOf('7K3 M9Q 2TX')).toBeDefined())
    expect(boxOf('7K3 M9Q 2TX')!.element.value).toBe('')
    page.unmount()
  })
})
