import { mountSuspended, registerEndpoint } from '@nuxt/test-utils/runtime'
import { readBody } from 'h3'
import { beforeEach, describe, expect, it, vi } from 'vitest'
import SettlementPage from '~~/pages/shipments/[id]/settlement.vue'
import { useSessionStore } from '~~/stores/session'
import type { User } from '~~/utils/contract/session'
import type { Dispute, SettlementAnswer, SettlementLine } from '~~/utils/contract/settlement'
import { settlementCredit } from '~~/utils/settlement/credit'
import { stillMissing } from '~~/utils/settlement/missing'
import { allByRole, byRole } from '../../helpers/roles'
import { settlementLine } from '../../helpers/settlementLine'
import { shipmentOf } from '../../helpers/shipmentLine'

const MANAGER: User = { id: 'p', name: 'M. Sorrel', email: 'sorrel@firm.example', roles: ['manager'], trainee: false, certification: null, certificationType: null, certificationNumber: null, units: 'lb' }
const TAKEN = { acceptedNet: { unit: 'lb' as const, value: 12.5 }, rate: { mills: 2_400, per: 'lb' as const }, outcome: 'taken-over' as const }
const GONE = settlementLine('gone', { outcome: 'not-arrived' })
const ARGUED: Dispute = {
  id: 'd', about: 'missing', cylinderId: 'gone', isByFigures: true, isOpen: true, outcome: null,
  history: [{ id: 'h', kind: 'opened', text: null, outcome: null, photoIds: [], by: null, at: '2026-05-02T10:00:00.000Z' }],
}
const SHIPMENT = shipmentOf([], { state: 'arrived', dispatchedAt: '2026-05-01T11:00:00.000Z', arrivedAt: '2026-05-02T11:00:00.000Z' })
const PATH = `/api/shipments/${SHIPMENT.id}`

function answer(lines: SettlementLine[], change: Partial<SettlementAnswer> = {}): SettlementAnswer {
  const statement = { number: 'ST-1', day: '2026-05-03', others: [], totalCents: 3_000 }
  const figures = { lines: lines.map(line => ({ ...line, cylinderId: line.cylinder.id })), statement, unexpected: [] }
  return { shipment: SHIPMENT, revision: 7, lines, statement, credit: settlementCredit(figures), missing: stillMissing(figures), unexpected: [], disputes: [ARGUED], files: [], ...change }
}

let stands: SettlementAnswer
let sent: { path: string, body: unknown }[]
registerEndpoint(`${PATH}/settlement`, () => stands)
for (const path of ['settlement/settle', 'settlement/close', 'disputes/d/end']) {
  registerEndpoint(`${PATH}/${path}`, {
    method: 'POST',
    handler: async (event) => {
      sent.push({ path, body: await readBody(event) })
      return stands
    },
  })
}
registerEndpoint('/api/policy', () => ({ timeZone: 'America/Chicago', fillPolicies: [], retests: [], scales: [], retest: { soonDays: 120 } }))
registerEndpoint('/api/session', () => ({ user: MANAGER }))

async function open(settlement: SettlementAnswer) {
  stands = settlement
  sent = []
  const page = await mountSuspended(SettlementPage, { route: `/shipments/${SHIPMENT.id}/settlement`, attachTo: document.body })
  await vi.waitFor(() => expect(page.text()).toContain('The statement'))
  const root = page.element.parentElement!
  return { page, root, openDialog: () => allByRole(root, 'dialog').find(one => (one as HTMLDialogElement).open)! }
}

describe('the page of a settlement', () => {
  beforeEach(() => useSessionStore().set(MANAGER))

  it('settles what was taken over, and records as missing only what was ticked', async () => {
    const { page, root, openDialog } = await open(answer([settlementLine('taken', TAKEN), GONE, settlementLine('back', { outcome: 'sent-back' })]))
    byRole(root, 'button', 'Settle the shipment').click()
    await vi.waitFor(() => expect(openDialog().textContent).toContain('1 cylinder is taken over, $30.00 in all'))
    byRole(openDialog(), 'checkbox', 'serial S-gone').click()
    byRole(openDialog(), 'button', 'Settle it').click()
    await vi.waitFor(() => expect(sent).toMatchObject([{ path: 'settlement/settle', body: { revision: 7, lines: [{ cylinderId: 'taken', expects: 4 }, { cylinderId: 'gone', expects: 4 }] } }]))
    page.unmount()
  })

  it('cannot be settled before it is said what became of each line', async () => {
    const { page, root } = await open(answer([settlementLine('taken', TAKEN), settlementLine('open')]))
    expect(byRole(root, 'button', 'Settle the shipment')).toHaveProperty('disabled', true)
    expect(page.text()).toContain('What became of serial S-open')
    page.unmount()
  })

  it('is closed only once no dispute is open, and a dispute ends only with an outcome and a reason', async () => {
    const settled = { shipment: { ...SHIPMENT, state: 'settled' as const, settledAt: '2026-05-04T11:00:00.000Z' } }
    const { page, root } = await open(answer([settlementLine('taken', TAKEN), GONE], settled))
    expect(byRole(root, 'button', 'Close the shipment')).toHaveProperty('disabled', true)
    byRole(root, 'button', 'End the dispute').click()
    await vi.waitFor(() => expect(page.text()).toContain('Choose how it ends.'))
    expect(sent).toEqual([])
    const [outcome, reason] = [byRole(root, 'combobox', 'How it ends') as HTMLSelectElement, byRole(root, 'textbox', 'Why') as HTMLTextAreaElement]
    outcome.value = 'theirs-accepted'
    outcome.dispatchEvent(new Event('change'))
    reason.value = 'It was never loaded.'
    reason.dispatchEvent(new Event('input'))
    stands = answer([settlementLine('taken', TAKEN), GONE], { ...settled, disputes: [{ ...ARGUED, isOpen: false, outcome: 'theirs-accepted' }] })
    byRole(root, 'button', 'End the dispute').click()
    await vi.waitFor(() => expect(byRole(root, 'button', 'Close the shipment')).toHaveProperty('disabled', false))
    expect(sent).toMatchObject([{ path: 'disputes/d/end', body: { outcome: 'theirs-accepted', reason: 'It was never loaded.' } }])
    byRole(root, 'button', 'Close the shipment').click()
    await vi.waitFor(() => expect(sent.map(one => one.path)).toEqual(['disputes/d/end', 'settlement/close']))
    page.unmount()
  })

  it('is only read by whoever may not settle', async () => {
    useSessionStore().set({ ...MANAGER, roles: ['auditor'] })
    const { page, root } = await open(answer([settlementLine('taken', TAKEN), GONE]))
    for (const name of ['Settle the shipment', 'Enter figures', 'Open a dispute', 'End the dispute', 'Change it']) expect(allByRole(root, 'button', name)).toEqual([])
    expect(allByRole(root, 'button', 'Save as CSV')).toHaveLength(1)
    page.unmount()
  })
})
