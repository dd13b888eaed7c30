import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import PairPage from '~~/components/pair/PairPage.vue'
import { OTHER_CYLINDER, registered, viewAfter } from '../../helpers/custody'
import { allByRole, byRole } from '../../helpers/roles'

const PROPS = {
  kind: 'transferred' as const, title: 'Transfer: 7K3', verb: 'Record the transfer', back: '/c/7k3', unit: 'lb' as const, unloaded: null, may: true,
  other: { isAsked: true, told: null as string | null, problem: null },
  form: { problem: null, blocked: null, refusal: null as string | null, restored: false, busy: false, findings: [], asks: false },
  trainee: false, supervisors: [], latest: '2026-12-01T10:00', posted: null,
  seen: false, mode: 'type' as const, envelope: { at: '', supervisorId: '', note: '' },
}
const SLOTS = { scan: () => 'where it is typed', choices: () => 'which way', pair: () => 'the two', default: () => 'the weights' }

async function mount(changes: Partial<Record<keyof typeof PROPS, unknown>> = {}) {
  return await mountSuspended(PairPage, { props: { ...PROPS, ...changes } as typeof PROPS, slots: SLOTS, attachTo: document.body })
}
const buttons = (element: Element) => allByRole(element, 'button').map(one => one.textContent!.trim())

describe('the page of what happens between two cylinders', () => {
  it('asks for the other one until it is there, and then lets another be scanned', async () => {
    const asking = await mount({ other: { isAsked: true, told: 'That is this cylinder itself. Scan the other one.', problem: null } })
    expect(asking.text()).toContain('where it is typed')
    expect(byRole(asking.element, 'alert').textContent).toContain('That is this cylinder itself')
    expect(buttons(asking.element)).not.toContain('Scan another one')
    const page = await mount({ other: { isAsked: false, told: null, problem: null } })
    expect(page.text()).not.toContain('where it is typed')
    byRole(page.element, 'button', 'Scan another one').click()
    expect(page.emitted('other')).toHaveLength(1)
    expect(page.text()).toMatch(/which way.*the two.*the weights/s)
  })

  it('records, and says at its button what is missing once it was pressed', async () => {
    const page = await mount({ form: { ...PROPS.form, refusal: 'Choose the firm.' } })
    expect(byRole(page.element, 'alert').textContent).toContain('Choose the firm.')
    await page.find('form').trigger('submit')
    expect(page.emitted('record')).toHaveLength(1)
  })

  it('shows what became of both, and nothing to record to who may not', async () => {
    const posted = [viewAfter([registered()]), { ...viewAfter([registered()]), id: OTHER_CYLINDER }].map(cylinder => ({ event: { id: cylinder.id }, version: 2, cylinder }))
    const page = await mount({ posted })
    expect(page.findAll('form')).toHaveLength(0)
    expect(page.text().match(/Recorded: transferred/g)).toHaveLength(2)
    const refused = await mount({ may: false })
    expect(refused.text()).toContain('You may not record this.')
    expect(buttons(refused.element)).not.toContain('Record the transfer')
  })
})
