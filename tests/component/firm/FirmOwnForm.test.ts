import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import { nextTick } from 'vue'
import FirmOwnForm from '~~/components/firm/FirmOwnForm.vue'
import type { OwnFirm } from '~~/utils/contract/firm'
import { byRole } from '../../helpers/roles'

const OWN: OwnFirm = { name: 'Quillfen Cooling', telephone: '555-0100', timeZone: 'America/Chicago', units: 'lb', address: null, emergencyTelephone: '555-0142', emergencyContract: null }

async function open(props: object = {}) {
  const form = await mountSuspended(FirmOwnForm, { props: { firm: OWN, ...props } })
  const field = (name: string) => byRole(form.element, 'textbox', name) as HTMLInputElement
  return {
    form, field,
    async type(name: string, text: string) {
      field(name).value = text
      field(name).dispatchEvent(new Event('input'))
      await nextTick()
    },
    async save() {
      await form.find('form').trigger('submit')
      return form.emitted<[object]>('save')?.at(-1)?.[0]
    },
  }
}

describe('the form of our own firm', () => {
  it('says what the emergency telephone must be, and by which rule', async () => {
    const { form } = await open()
    expect(form.text()).toContain('49 CFR 172.604')
    expect(form.text()).toContain('at every moment that a load is on the road')
  })

  it('is sent with what is empty as nothing', async () => {
    const { type, save } = await open()
    await type('Address', ' 200 Millrace Street ')
    await type('Emergency telephone', ' ')
    expect(await save()).toEqual({ name: 'Quillfen Cooling', telephone: '555-0100', address: '200 Millrace Street', emergencyTelephone: null, emergencyContract: null })
  })

  it('is not sent without a name, and keeps what was typed', async () => {
    const { form, field, type, save } = await open()
    await type('Name', '')
    await type('Contract or registrant', 'contract 555-77')
    expect(await save()).toBeUndefined()
    expect(form.text()).toContain('Give the name.')
    expect(field('Contract or registrant').value).toBe('contract 555-77')
  })

  it('shows what the server refused beside its field', async () => {
    const { form } = await open({ errors: [{ path: 'address', message: 'cannot be printed with ☂' }] })
    expect(form.text()).toContain('cannot be printed with ☂')
  })
})
