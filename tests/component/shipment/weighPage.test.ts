import { mountSuspended, registerEndpoint } from '@nuxt/test-utils/runtime'
import { readBody } from 'h3'
import { beforeEach, describe, expect, it, vi } from 'vitest'
import ScanEntry from '~~/components/scan/ScanEntry.vue'
import WeighPage from '~~/pages/shipments/[id]/weigh.vue'
import { useSessionStore } from '~~/stores/session'
import type { User } from '~~/utils/contract/session'
import type { ShipmentWithLines } from '~~/utils/contract/shipments'
import { allByRole } from '../../helpers/roles'
import { shipmentLine, shipmentOf, weighed } from '../../helpers/shipmentLine'

const ON_IT = shipmentLine('a', '0YHP9KRRT')
const STRANGE = shipmentLine('b', '7K3M9Q2TX')
const ID = shipmentOf([]).id
const PATH = `/api/shipments/${ID}`
const WAREHOUSE: User = { id: 'p', name: 'W. Carrow', email: 'carrow@firm.example', roles: ['warehouse'], trainee: false, certification: null, certificationType: null, certificationNumber: null, units: 'lb' }

let stands: ShipmentWithLines
let sent: { ref?: string, gross?: object, add?: { cylinderId: string }[] }[]
registerEndpoint(PATH, () => stands)
registerEndpoint(`${PATH}/acts`, () => ({ items: [] }))
for (const { cylinder } of [ON_IT, STRANGE]) registerEndpoint(`/api/cylinders/${cylinder.labelCode}`, () => ({ id: cylinder.id, labelCode: cylinder.labelCode, stamp: { serial: 'K48213' } }))
registerEndpoint(`${PATH}/weighings`, {
  method: 'POST',
  handler: async (event) => {
    sent.push(await readBody(event))
    return stands = { ...stands, lines: stands.lines.map(line => line.cylinder.labelCode === sent.at(-1)!.ref ? { ...line, weighed: weighed(50.1) } : line) }
  },
})
registerEndpoint(`${PATH}/lines`, {
  method: 'PATCH',
  handler: async (event) => {
    sent.push(await readBody(event))
    return stands = { ...stands, lines: [...stands.lines, STRANGE] }
  },
})
registerEndpoint('/api/policy', () => ({ timeZone: 'America/Chicago', fillPolicies: [], retests: [], scales: [], retest: { soonDays: 120 } }))
registerEndpoint('/api/session', () => ({ user: WAREHOUSE }))

async function open() {
  stands = shipmentOf([ON_IT])
  sent = []
  const page = await mountSuspended(WeighPage, {
    route: `/shipments/${ID}/weigh`, attachTo: document.body, global: { stubs: { ScanViewfinder: true } },
  })
  await vi.waitFor(() => expect(page.text()).toContain('0 of 1 weighed, for Reclaimer One'), { timeout: 5_000 })
  return {
    page,
    scan: (code: string) => page.findComponent(ScanEntry).vm.$emit('code', code),
    press: (name: string) => allByRole(page.element.parentElement!, 'button', name)[0]!.click(),
  }
}

describe('scanning and weighing a shipment', () => {
  beforeEach(() => useSessionStore().set(WAREHOUSE))

  it('puts what is scanned on the scale, keeps its weight, and says how many are left', async () => {
    const { page, scan } = await open()
    scan('0YHP9KRRT')
    await vi.waitFor(() => expect(page.text()).toContain('The scale shows'))
    expect(page.findAll('button').find(button => button.text() === 'Type the code or the serial')!.element.parentElement!.style.display).toBe('none')
    await page.find('form input[inputmode=decimal]').setValue('50.1')
    await page.find('form').trigger('submit')
    await vi.waitFor(() => expect(page.text()).toContain('1 of 1 weighed'))
    expect(sent).toMatchObject([{ ref: '0YHP9KRRT', gross: { unit: 'lb', value: 50.1 } }])
    expect(page.text()).toContain('All are weighed: on to the shipment')
    page.unmount()
  })

  it('says that a scanned cylinder is not on the list, and puts it there and on the scale', async () => {
    const { page, scan, press } = await open()
    scan('7K3M9Q2TX')
    await vi.waitFor(() => expect(page.text()).toContain('7K3 M9Q 2TX is not on this shipment'))
    press('Put it on the list')
    await vi.waitFor(() => expect(page.text()).toContain('The scale shows'))
    expect(sent).toMatchObject([{ add: [{ cylinderId: 'b' }] }])
    expect(page.text()).toContain('0 of 2 weighed')
    page.unmount()
  })

  it('does not let go of the one on the scale for the next scan', async () => {
    const { page, scan } = await open()
    scan('0YHP9KRRT')
    await vi.waitFor(() => expect(page.text()).toContain('The scale shows'))
    scan('7K3M9Q2TX')
    await vi.waitFor(() => expect(page.text()).toContain('One is on the scale'))
    expect(page.text()).toContain('The scale shows')
    page.unmount()
  })
})
