import { mountSuspended } from '@nuxt/test-utils/runtime'
import { expect, it } from 'vitest'
import CompareForm from '~~/components/compare/CompareForm.vue'
import { compareDraft, type CompareDraft } from '~~/utils/picture/compareDraft'
import { byRole } from '../../helpers/roles'

const ALL = ['R-22', 'R-32', 'R-125']

function mounted(query: Record<string, string>, errors: { path: string, message: string }[] = []) {
  return mountSuspended(CompareForm, { props: { draft: compareDraft(query), all: ALL, unit: 'lb' as const, errors } })
}

it('keeps what cannot be read where it was typed, with what is wrong beside it', async () => {
  const wrapper = await mounted({ refrigerant: 'R-999', waterCapacity: 'fortyseven' }, [
    { path: 'refrigerant', message: 'is not in the catalogue' }, { path: 'waterCapacity', message: 'must be a mass' },
  ])
  expect((wrapper.get('[name=waterCapacity]').element as HTMLInputElement).value).toBe('fortyseven')
  expect((wrapper.get('[name=refrigerant]').element as HTMLSelectElement).value).toBe('R-999')
  expect(wrapper.text()).toContain('Is not in the catalogue')
  expect(wrapper.get('[name=waterCapacity]').attributes('aria-invalid')).toBe('true')
})

it('says a weight in the other units while it is typed', async () => {
  const wrapper = await mounted({ waterCapacity: '47.7' })
  expect(wrapper.text()).toContain('47.7\u00A0lb = 47\u00A0lb\u00A011\u00A0oz = 21.64\u00A0kg')
})

it('asks by a composition in place of a name', async () => {
  const wrapper = await mounted({ composition: 'R-32:50,R-125:40', spec: 'DOT-4BA400' })
  expect(wrapper.text()).toContain('Together 90 %')
  await wrapper.get('input[aria-label="Component 2, percent by mass"]').setValue('50')
  expect(wrapper.text()).toContain('Together 100 %')
  await wrapper.get('form').trigger('submit')
  expect((wrapper.emitted('compare')![0]![0] as CompareDraft)).toMatchObject({
    refrigerant: '', spec: 'DOT-4BA400', composition: [{ component: 'R-32', percent: '50' }, { component: 'R-125', percent: '50' }],
  })
})

it('is a plain form to a browser without script', async () => {
  const wrapper = await mounted({ refrigerant: 'R-22' })
  const form = wrapper.get('form')
  expect(form.attributes()).toMatchObject({ method: 'get', action: '/fill-limit' })
  expect(form.findAll('[name]').map(field => field.attributes('name'))).toEqual(
    ['refrigerant', 'spec', 'servicePressurePsig', 'waterCapacity', 'tareWeight', 'gross', 'condition', 'share'],
  )
  expect(byRole(wrapper.element, 'button', 'Compare the rules')).toBeTruthy()
})
