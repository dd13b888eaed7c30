import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import RegisterForm from '~~/components/register/RegisterForm.vue'
import { allByRole, byRole } from '../../helpers/roles'

const PLACE = '01900000-0000-7000-8000-0000000000a1'

async function mount(change: Record<string, unknown> = {}) {
  const wrapper = await mountSuspended(RegisterForm, {
    props: {
      unit: 'lb', thisMonth: '2026-12', refrigerants: ['R-22', 'R-410A'], firms: [], places: [{ id: PLACE, name: 'Warehouse, bay 1' }],
      serialTaken: false, ...change,
    },
    attachTo: document.body,
  })
  const field = (name: RegExp) => wrapper.findAll('input,select').find(input => name.test(labelOf(input.element as HTMLElement)))!
  return {
    wrapper,
    type: (name: RegExp, text: string) => field(name).setValue(text),
    press: async (name: string | RegExp) => {
      byRole(wrapper.element, 'button', name).click()
      await wrapper.vm.$nextTick()
    },
    submit: () => wrapper.find('form').trigger('submit'),
    alerts: () => allByRole(wrapper.element, 'alert').map(alert => alert.textContent!.replaceAll(/\s+/g, ' ')).join(' '),
    text: () => wrapper.element.textContent!.replaceAll(/\s+/g, ' '),
  }
}

function labelOf(input: HTMLElement): string {
  const own = input.getAttribute('aria-label')
  if (own) return own
  return (document.querySelector(`label[for="${input.id}"]`) ?? input.closest('label'))?.textContent?.trim() ?? ''
}

async function usual(form: Awaited<ReturnType<typeof mount>>) {
  await form.type(/^Specification/, 'DOT-4BA400')
  await form.type(/^Serial/, 'K48266')
  await form.type(/^Tare weight/, '27.5')
  await form.type(/^Water capacity/, '47.6')
  await form.type(/^Made/, '03-21')
  await form.type(/^Where it stands/, PLACE)
  await form.press('nothing, evacuated')
}

describe('registering from the collar', () => {
  it('records what the stamp says, its specification and pressure apart and its weights as stamped', async () => {
    const form = await mount()
    await usual(form)
    await form.submit()
    expect(form.wrapper.emitted('register')).toEqual([[{
      details: {
        stamp: {
          serial: 'K48266', spec: 'DOT-4BA', servicePressurePsig: 400, tareWeight: { unit: 'lb', value: 27.5 },
          waterCapacity: { unit: 'lb', value: 47.6 }, madeMonth: '2021-03', flammableMarked: false,
        },
        ownership: 'own',
        contents: 'evacuated',
      },
      placeId: PLACE,
      label: { choice: 'new' },
    }]])
    form.wrapper.unmount()
  })

  it('says beside the fields what is missing, and records nothing', async () => {
    const form = await mount()
    await form.submit()
    expect(form.text()).toContain('Copy the serial, or say that it cannot be read.')
    expect(form.text()).toContain('Say what is in it.')
    expect(form.alerts()).toContain('4 fields are still open.')
    expect(form.wrapper.emitted('register')).toBeUndefined()
    form.wrapper.unmount()
  })

  it('asks again about an unlikely figure, and then takes the word of the person', async () => {
    const form = await mount()
    await usual(form)
    await form.type(/^On the scale now/, '20')
    await form.submit()
    expect(form.wrapper.emitted('register')).toBeUndefined()
    expect(form.alerts()).toContain('The scale shows 7.5 lb less than TW.')
    await form.submit()
    expect(form.wrapper.emitted('register')).toHaveLength(1)
    form.wrapper.unmount()
  })

  it('asks anew where another figure became unlikely after the answer', async () => {
    const form = await mount()
    await usual(form)
    await form.type(/^On the scale now/, '20')
    await form.submit()
    await form.type(/^On the scale now/, '10')
    await form.submit()
    expect(form.wrapper.emitted('register')).toBeUndefined()
    expect(form.alerts()).toContain('17.5 lb less than TW.')
    form.wrapper.unmount()
  })

  it('asks about a serial that the fleet has already', async () => {
    const form = await mount({ serialTaken: true })
    await usual(form)
    await form.submit()
    expect(form.alerts()).toContain('Serial K48266 is in the fleet already.')
    form.wrapper.unmount()
  })

  it('takes a cylinder whose serial cannot be read', async () => {
    const form = await mount()
    await usual(form)
    await form.wrapper.findAll('input[type=checkbox]')[0]!.setValue(true)
    await form.submit()
    const [registration] = form.wrapper.emitted('register')![0] as [{ details: { stamp: object } }]
    expect(registration.details.stamp).toMatchObject({ serial: null, serialUnreadable: true })
    form.wrapper.unmount()
  })

  it('takes a label from the roll only with a code whose check fits', async () => {
    const form = await mount({ code: '7K3M9Q2TA' })
    await usual(form)
    await form.submit()
    expect(form.wrapper.emitted('register')).toBeUndefined()
    await form.type(/^Code of the label/, '7k3 m9q 2tx')
    await form.submit()
    const [registration] = form.wrapper.emitted('register')![0] as [{ label: object }]
    expect(registration.label).toEqual({ choice: 'blank', code: '7K3M9Q2TX' })
    form.wrapper.unmount()
  })
})
