import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import { nextTick, ref } from 'vue'
import ReclaimTermsForm from '~~/components/reclaim/ReclaimTermsForm.vue'
import type { ReclaimerTerms } from '~~/utils/reclaim/terms'
import { typedTerms } from '~~/utils/reclaim/termsTyped'
import { byRole } from '../../helpers/roles'

const TERMS: ReclaimerTerms = {
  refrigerants: [{ designation: 'R-22', conditions: ['clean', 'suspect'] }], takesMixed: false, takesUnknown: false, takesOverdue: true,
  specs: null, pressuresPsig: [400], mostContaminationPercent: null, minimum: { unit: 'lb', value: 500 }, minimumCylinders: null, pickUpCents: 8500, note: null,
}

async function open(terms: ReclaimerTerms | null = TERMS) {
  const typed = ref(typedTerms(terms, '2026-06-01'))
  const form = await mountSuspended(ReclaimTermsForm, { props: { modelValue: typed.value, refrigerants: ['R-22', 'R-134a'] } })
  async function type(name: string, text: string) {
    const field = byRole(form.element, 'textbox', name) as HTMLInputElement
    field.value = text
    field.dispatchEvent(new Event('input'))
    await nextTick()
  }
  async function save() {
    await form.find('form').trigger('submit')
    return form.emitted<[{ fromDay: string, terms: ReclaimerTerms }]>('save')?.at(-1)?.[0]
  }
  return { form, type, save }
}

describe('the form of what a reclaimer takes', () => {
  it('begins from what stands and says nothing wrong of it', async () => {
    const { form, save } = await open()
    expect((byRole(form.element, 'textbox', 'Fetches from, net') as HTMLInputElement).value).toBe('500')
    expect((byRole(form.element, 'textbox', 'A pick-up costs') as HTMLInputElement).value).toBe('85.00')
    expect(await save()).toEqual({ fromDay: '2026-06-01', terms: TERMS })
  })

  it('puts a refrigerant on the list, in the conditions that are ticked, and takes one off', async () => {
    const { form, save } = await open()
    await form.find<HTMLSelectElement>('select[aria-label="Put a refrigerant on the list"]').setValue('R-134a')
    await form.findAll('li')[1]!.findAll('input[type=checkbox]')[2]!.setValue(true)
    byRole(form.element, 'button', 'Take off R-22').click()
    await nextTick()
    expect((await save())?.terms.refrigerants).toEqual([{ designation: 'R-134a', conditions: ['clean', 'suspect', 'burnt'] }])
  })

  it('says beside the field what cannot be, only once it is sent, and loses nothing of what was typed', async () => {
    const { form, type, save } = await open()
    await type('Fetches from, net', '1,250')
    await type('Specifications', 'DOT-5')
    expect(form.text()).not.toContain('no specification')
    expect(await save()).toBeUndefined()
    expect(form.text()).toContain('“DOT-5” is no specification')
    expect(form.text()).toContain('“1,250” is not a weight that can be read in one way')
    expect((byRole(form.element, 'textbox', 'Specifications') as HTMLInputElement).value).toBe('DOT-5')
  })

  it('shows what the server refused beside its field', async () => {
    const { form } = await open()
    await form.setProps({ errors: [{ path: 'terms.note', message: 'must be at most 500 characters' }] })
    expect(form.text()).toContain('must be at most 500 characters')
  })
})
