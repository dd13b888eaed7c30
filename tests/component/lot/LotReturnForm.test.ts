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
    props: { lines: [line('a', '0YHP9KRRT'), line('b', '7K3M9Q2TX')], places: [{ id: PLACE, name: 'Bay 1' }], thisMonth: '2026-12', rin: 'B765', unit: 'lb' },
    attachTo: document.body,
  })
  const part = (name: string) => byRole(wrapper.element, 'region', name)
  const field = (name: string, label: string) => wrapper.findAll('input').filter(input => part(name).contains(input.element))
    .find(input => document.querySelector(`label[for="${input.element.id}"]`)?.textContent?.trim() === label)!
  return {
    wrapper,
    choose: async (name: string, result: string) => {
      byRole(part(name), 'button', result).click()
      await wrapper.vm.$nextTick()
    },
    type: (name: string, label: string, text: string) => field(name, label).setValue(text),
    fields: (name: string) => [...part(name).querySelectorAll('label')].map(label => label.textContent!.trim()),
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
    await form.type('0YH P9K RRT', 'Mark', '12-26')
    await form.type('0YH P9K RRT', 'Suffix', '+')
    await form.leaveAway('7K3 M9Q 2TX')
    await form.submit()
    expect(form.wrapper.emitted('back')).toEqual([[PLACE, [{
      cylinderId: 'a', result: 'passed', method: 'volumetric', month: '2026-12', rin: 'B765', suffix: '+',
    }]]])
    form.wrapper.unmount()
  })

  it('asks before it condemns, naming how many and which', async () => {
    const form = await mount()
    await form.place()
    await form.choose('0YH P9K RRT', 'condemned')
    await form.type('0YH P9K RRT', 'Month', '12-26')
    await form.choose('7K3 M9Q 2TX', 'passed')
    await form.type('7K3 M9Q 2TX', 'Mark', '12-26')
    await form.submit()
    expect(form.wrapper.emitted('back')).toBeUndefined()
    expect(byRole(form.dialog(), 'heading').textContent!.trim()).toBe('Condemn 1 cylinder')
    expect(form.dialog().textContent).toContain('0YH P9K RRT')
    byRole(form.dialog(), 'button', 'Record, 1 condemned').click()
    expect(form.wrapper.emitted('back')).toHaveLength(1)
    form.wrapper.unmount()
  })

  it('asks no mark of one that was not passed, for only a passed test is marked', async () => {
    const form = await mount()
    await form.place()
    expect(form.fields('0YH P9K RRT')).toContain('Suffix')
    await form.type('0YH P9K RRT', 'Mark', '12 B765 26')
    await form.choose('0YH P9K RRT', 'rejected')
    expect(form.fields('0YH P9K RRT')).not.toContain('Suffix')
    await form.leaveAway('7K3 M9Q 2TX')
    await form.submit()
    expect(form.wrapper.emitted('back')).toEqual([[PLACE, [{ cylinderId: 'a', result: 'rejected', method: 'volumetric', month: '2026-12' }]]])
    form.wrapper.unmount()
  })

  it('keeps a mark that cannot be read, and says so beside it', async () => {
    const form = await mount()
    await form.place()
    await form.choose('0YH P9K RRT', 'passed')
    await form.type('0YH P9K RRT', 'Mark', '13-26')
    await form.leaveAway('7K3 M9Q 2TX')
    await form.submit()
    expect(form.wrapper.emitted('back')).toBeUndefined()
    expect(form.wrapper.text()).toContain('Write the month and the year of the test')
    form.wrapper.unmount()
  })
})
