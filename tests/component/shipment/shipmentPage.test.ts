import { mountSuspended, registerEndpoint } from '@nuxt/test-utils/runtime'
import { createError, readBody } from 'h3'
import { beforeEach, describe, expect, it, vi } from 'vitest'
import ShipmentPage from '~~/pages/shipments/[id]/index.vue'
import { useSessionStore } from '~~/stores/session'
import type { User } from '~~/utils/contract/session'
import type { ShipmentWithLines } from '~~/utils/contract/shipments'
import { allByRole, byRole } from '../../helpers/roles'
import { shipmentLine, shipmentOf, weighed } from '../../helpers/shipmentLine'

const WEIGHED = [shipmentLine('a', '0YHP9KRRT', { weighed: weighed(50.1) }), shipmentLine('b', '7K3M9Q2TX', { weighed: weighed(49.9) })]
const READY = shipmentOf(WEIGHED, { state: 'ready' })
const PATH = `/api/shipments/${READY.id}`
const MANAGER: User = { id: 'p', name: 'M. Sorrel', email: 'sorrel@firm.example', roles: ['manager'], trainee: false, certification: null, certificationType: null, certificationNumber: null, units: 'lb' }

let stands: ShipmentWithLines
let sent: unknown[]
registerEndpoint(PATH, () => stands)
registerEndpoint(`${PATH}/acts`, () => ({ items: [] }))
registerEndpoint(`${PATH}/dispatch`, {
  method: 'POST',
  handler: async (event) => {
    sent.push(await readBody(event))
    return stands = { ...stands, state: 'dispatched', dispatchedAt: '2026-05-01T11:00:00.000Z', dispatchedBy: 'M. Sorrel' }
  },
})
registerEndpoint(`${PATH}/lines`, {
  method: 'PATCH',
  handler: async (event) => {
    const body = await readBody<{ add?: { cylinderId: string }[], takeOff?: { cylinderId: string }[] }>(event)
    sent.push(body)
    const off = body.takeOff?.map(one => one.cylinderId) ?? []
    return stands = { ...stands, state: 'draft', lines: stands.lines.filter(line => !off.includes(line.cylinder.id)) }
  },
})
registerEndpoint(`${PATH}/papers`, () => createError({ statusCode: 409 }))
registerEndpoint('/api/firms', () => ({ items: [] }))
registerEndpoint('/api/places', () => ({ items: [] }))
registerEndpoint('/api/policy', () => ({ timeZone: 'America/Chicago', fillPolicies: [], retests: [], scales: [], retest: { soonDays: 120 } }))
registerEndpoint('/api/session', () => ({ user: MANAGER }))

async function open(shipment: ShipmentWithLines) {
  stands = shipment
  sent = []
  const page = await mountSuspended(ShipmentPage, { route: `/shipments/${shipment.id}`, attachTo: document.body })
  await vi.waitFor(() => expect(page.text()).toContain('What is next'))
  const root = page.element.parentElement!
  return {
    page,
    root,
    // A line stands in the table and, for a phone, as a card.
    press: (name: string) => allByRole(root, 'button', name)[0]!.click(),
    openDialog: () => allByRole(root, 'dialog').find(one => (one as HTMLDialogElement).open)!,
  }
}

describe('the page of a shipment', () => {
  beforeEach(() => useSessionStore().set(MANAGER))

  // Tare 12474 g is 27.5 lb: 50.1 lb and 49.9 lb hold 22.6 lb and 22.4 lb.
  it('asks once before it leaves, naming how many and what they weigh, and sends each as it was weighed', async () => {
    const { page, press, openDialog } = await open(READY)
    press('Dispatch 2 cylinders')
    await vi.waitFor(() => expect(openDialog().textContent).toContain('45.0\u00A0lb net, 100.0\u00A0lb gross'))
    expect(byRole(openDialog(), 'heading').textContent!.trim()).toBe('Ship 2 cylinders to Reclaimer One')
    expect(sent).toEqual([])
    byRole(openDialog(), 'button', 'Ship 2 cylinders').click()
    await vi.waitFor(() => expect(page.text()).toContain('On its way to Reclaimer One.'))
    expect(sent).toMatchObject([{ lines: [
      { cylinderId: 'a', expects: 3, gross: { unit: 'lb', value: 50.1 } }, { cylinderId: 'b', expects: 3, gross: { unit: 'lb', value: 49.9 } },
    ] }])
    page.unmount()
  })

  it('takes no cylinder off without a reason, and says the reason with it', async () => {
    const { page, press, openDialog } = await open(READY)
    press('Take off 0YH P9K RRT')
    await vi.waitFor(() => expect(openDialog()).toBeDefined())
    byRole(openDialog(), 'button', 'Take off').click()
    await vi.waitFor(() => expect(openDialog().textContent).toContain('Say why: it stays in the history.'))
    expect(sent).toEqual([])
    byRole(openDialog(), 'button', 'Not found').click()
    await page.vm.$nextTick()
    byRole(openDialog(), 'button', 'Take off').click()
    await vi.waitFor(() => expect(sent).toHaveLength(1))
    expect(sent).toMatchObject([{ takeOff: [{ cylinderId: 'a', reason: 'Not found' }] }])
    page.unmount()
  })

  it('offers no dispatch while a line is to be weighed again', async () => {
    const { page, root } = await open(shipmentOf([WEIGHED[0]!, shipmentLine('b', '7K3M9Q2TX', { weighed: weighed(49.9, { isStale: true }) })]))
    await vi.waitFor(() => expect(page.text()).toContain('1 of 2 still to be scanned and weighed.'))
    expect(allByRole(root, 'button').map(button => button.textContent!.trim()).filter(text => text.startsWith('Dispatch'))).toEqual([])
    page.unmount()
  })
})
