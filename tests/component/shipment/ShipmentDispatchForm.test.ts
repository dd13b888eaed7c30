import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import ShipmentDispatchForm from '~~/components/shipment/ShipmentDispatchForm.vue'
import type { ShipmentLine } from '~~/utils/contract/shipments'
import { cylinderRow } from '../../helpers/cylinderRow'
import { allByRole, byRole } from '../../helpers/roles'

function line(id: string, labelCode: string, version: number): ShipmentLine {
  return { cylinder: cylinderRow({ id, labelCode }), version, because: [], sent: null, received: null }
}

async function mount() {
  const wrapper = await mountSuspended(ShipmentDispatchForm, {
    props: { lines: [line('a', '0YHP9KRRT', 7), line('b', '7K3M9Q2TX', 3)], to: 'Reclaimer One', unit: 'lb' },
    attachTo: document.body,
  })
  return {
    wrapper,
    weigh: (code: string, text: string) => wrapper.findAll('input').find(input => input.element.closest('label')?.textContent?.includes(code))!.setValue(text),
    alerts: () => allByRole(wrapper.element, 'alert').map(alert => alert.textContent!.trim()).join(' '),
    dialog: () => byRole(document.body, 'dialog') as HTMLDialogElement,
  }
}

describe('dispatching a shipment', () => {
  it('leaves nothing unweighed', async () => {
    const form = await mount()
    await form.weigh('0YH P9K RRT', '50.1')
    await form.wrapper.find('form').trigger('submit')
    expect(form.alerts()).toBe('1 cylinder is not weighed yet.')
    expect(form.dialog().open).toBe(false)
    form.wrapper.unmount()
  })

  // Tare 12474 g is 27.5 lb: 50.1 lb and 49.9 lb hold 22.6 lb and 22.4 lb.
  it('asks once, naming how many leave and what they weigh, then sends each with its version', async () => {
    const form = await mount()
    await form.weigh('0YH P9K RRT', '50.1')
    await form.weigh('7K3 M9Q 2TX', '49.9')
    await form.wrapper.find('form').trigger('submit')
    expect(form.dialog().open).toBe(true)
    expect(byRole(form.dialog(), 'heading').textContent!.trim()).toBe('Ship 2 cylinders to Reclaimer One')
    expect(form.dialog().textContent).toContain('45.0\u00A0lb net, 100.0\u00A0lb gross')
    expect(form.wrapper.emitted('dispatch')).toBeUndefined()
    byRole(form.dialog(), 'button', 'Dispatch 2 cylinders').click()
    expect(form.wrapper.emitted('dispatch')).toEqual([[[
      { cylinderId: 'a', expects: 7, gross: { unit: 'lb', value: 50.1 } },
      { cylinderId: 'b', expects: 3, gross: { unit: 'lb', value: 49.9 } },
    ]]])
    form.wrapper.unmount()
  })

  // 17272 g more than the tare is the limit: 29746 g, 65.58 lb.
  it('lets none leave whose scale shows more than its fill limit', async () => {
    const form = await mount()
    await form.weigh('0YH P9K RRT', '65.6')
    await form.weigh('7K3 M9Q 2TX', '49.9')
    await form.wrapper.find('form').trigger('submit')
    expect(form.alerts()).toContain('0YH P9K RRT is above the fill limit.')
    expect(form.dialog().open).toBe(false)
    form.wrapper.unmount()
  })

  it('asks to look again where the weight has come far from the last known one', async () => {
    const form = await mount()
    await form.weigh('0YH P9K RRT', '48.0')
    expect(form.wrapper.element.textContent).toContain('2.1\u00A0lb less than last known.')
    form.wrapper.unmount()
  })

  it('weighs a cylinder anew that was taken off and put back', async () => {
    const form = await mount()
    await form.weigh('0YH P9K RRT', '50.1')
    await form.weigh('7K3 M9Q 2TX', '49.9')
    const both = form.wrapper.props('lines')
    await form.wrapper.setProps({ lines: both.slice(1) })
    await form.wrapper.setProps({ lines: both })
    expect(form.wrapper.findAll('input').map(input => input.element.value)).toEqual(['', '49.9'])
    expect(form.wrapper.emitted('change')!.at(-1)).toEqual([{ a: null, b: { unit: 'lb', value: 49.9 } }])
    form.wrapper.unmount()
  })

  it('asks no more for what is on the list no more', async () => {
    const form = await mount()
    await form.weigh('0YH P9K RRT', '50.1')
    await form.weigh('7K3 M9Q 2TX', '49.9')
    await form.wrapper.find('form').trigger('submit')
    expect(form.dialog().open).toBe(true)
    await form.wrapper.setProps({ lines: [...form.wrapper.props('lines'), line('c', '4TR8W2HN6', 1)] })
    expect(form.dialog().open).toBe(false)
    form.wrapper.unmount()
  })
})
