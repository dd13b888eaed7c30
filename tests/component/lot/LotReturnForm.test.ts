import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import LotReturnForm from '~~/components/lot/LotReturnForm.vue'
import type { TestLotLine } from '~~/utils/contract/testLots'
import { cylinderRow } from '../../helpers/cylinderRow'
import { allByRole, byRole } from '../../helpers/roles'

const PLACE = '01900000-0000-7000-8000-0000000000a1'

function line(id: string, labelCode: string): TestLotLine {
  return { cylinder: cylinderRow({ id, labelCode }), version: 4, because: [], open: true, result: null }
}

async function mount() {
  const wrapper = await mountSuspended(LotReturnForm, {
    props: { lines: [line('a', '0YHP9KRRT'), line('b', '7K3M9Q2TX')], places: [{ id: PLACE, name: 'Bay 1' }], thisMonth: '2026-12', unit: 'lb' },
    attachTo: document.body,
  })
  const part = (name: string) => byRole(wrapper.element, 'region', name)
  const month = (name: string) => wrapper.findAll('input').filter(input => part(name).contains(input.element))
    .find(input => document.querySelector(`label[for="${input.element.id}"]`)?.textContent?.trim() === 'Month')!
  return {
    wrapper,
    choose: async (name: string, result: string) => {
      byRole(part(name), 'button', result).click()
      await wrapper.vm.$nextTick()
    },
    month: (name: string, text: string) => month(name).setValue(text),
    place: () => wrapper.find('select').setValue(PLACE),
    leaveAway: (name: string) => wrapper.findAll('input[type=checkbox]').find(box => part(name).contains(box.element))!.setValue(false),
    submit: () => wrapper.find('form').trigger('submit'),
    alerts: () => allByRole(wrapper.element, 'alert').map(alert => alert.textContent!.trim()).join(' '),
    dialog: () => byRole(document.body, 'dialog') as HTMLDialogElement,
  }
}

describe('a test lot that comes back', () => {
  it('takes no result for granted, and no month', async () => {
    const form = await mount()
    await form.place()
    await form.submit()
    expect(form.alerts()).toBe('2 cylinders are still open.')
    expect(form.wrapper.emitted('back')).toBeUndefined()
    form.wrapper.unmount()
  })

  it('records those that are back and leaves the others away', async () => {
    const form = await mount()
    await form.place()
    await form.choose('0YH P9K RRT', 'passed')
    await form.month('0YH P9K RRT', '12-26')
    await form.leaveAway('7K3 M9Q 2TX')
    await form.submit()
    expect(form.wrapper.emitted('back')).toEqual([[PLACE, [{ cylinderId: 'a', result: 'passed', method: 'volumetric', month: '2026-12' }]]])
    form.wrapper.unmount()
  })

  it('asks before it condemns, naming how many and which', async () => {
    const form = await mount()
    await form.place()
    await form.choose('0YH P9K RRT', 'condemned')
    await form.month('0YH P9K RRT', '12-26')
    await form.choose('7K3 M9Q 2TX', 'passed')
    await form.month('7K3 M9Q 2TX', '12-26')
    await form.submit()
    expect(form.wrapper.emitted('back')).toBeUndefined()
    expect(byRole(form.dialog(), 'heading').textContent!.trim()).toBe('Condemn 1 cylinder')
    expect(form.dialog().textContent).toContain('0YH P9K RRT')
    byRole(form.dialog(), 'button', 'Record, 1 condemned').click()
    expect(form.wrapper.emitted('back')).toHaveLength(1)
    form.wrapper.unmount()
  })
})
