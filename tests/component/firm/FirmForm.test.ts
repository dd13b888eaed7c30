import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import { nextTick } from 'vue'
import FirmForm from '~~/components/firm/FirmForm.vue'
import type { Firm } from '~~/utils/contract/places'
import { allByRole, byRole } from '../../helpers/roles'

const OXBOW: Firm = {
  id: 'f1', name: 'Oxbow Tests', kind: 'requalifier', telephone: '555-0100', email: null, address: '27 Kiln Lane', rin: 'A123', placeId: 'p1', active: true, cylinders: 0,
}

async function open(props: Record<string, unknown> = {}) {
  const form = await mountSuspended(FirmForm, { props })
  return {
    form,
    async type(name: string, text: string) {
      const field = byRole(form.element, 'textbox', name) as HTMLInputElement
      field.value = text
      field.dispatchEvent(new Event('input'))
      await nextTick()
    },
    async save() {
      await form.find('form').trigger('submit')
      return form.emitted<[object]>('save')?.at(-1)?.[0]
    },
  }
}

describe('the form of a firm', () => {
  it('asks a test station alone for its RIN, and reads it as it is struck', async () => {
    const { form, type, save } = await open({ begin: 'requalifier' })
    await type('Name', ' Oxbow Tests ')
    await type('RIN', 'a1/32')
    expect(await save()).toEqual({ name: 'Oxbow Tests', kind: 'requalifier', telephone: null, email: null, address: null, rin: 'A123' })
    byRole(form.element, 'button', 'carrier').click()
    await nextTick()
    expect(allByRole(form.element, 'textbox', 'RIN')).toHaveLength(0)
    expect(await save()).toMatchObject({ kind: 'carrier', rin: null })
  })

  it('refuses three characters and five for a RIN, beside the field', async () => {
    const { form, type, save } = await open({ firm: OXBOW })
    for (const rin of ['A12', 'A1234']) {
      await type('RIN', rin)
      expect(await save()).toBeUndefined()
      expect(form.text()).toContain('four letters or figures')
    }
  })

  it('keeps the kind of a firm that is there, and says where its name is taken', async () => {
    const { form, save } = await open({ firm: OXBOW, errors: [{ path: 'name', message: 'is taken' }] })
    expect(allByRole(form.element, 'button', 'carrier')).toHaveLength(0)
    expect(form.text()).toContain('is taken')
    expect(await save()).toEqual({ name: 'Oxbow Tests', kind: 'requalifier', telephone: '555-0100', email: null, address: '27 Kiln Lane', rin: 'A123' })
  })
})
