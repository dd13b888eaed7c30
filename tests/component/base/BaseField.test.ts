import { mountSuspended } from '@nuxt/test-utils/runtime'
import { h } from 'vue'
import { describe, expect, it } from 'vitest'
import BaseChips from '~~/components/base/BaseChips.vue'
import BaseField from '~~/components/base/BaseField.vue'
import BaseInput from '~~/components/base/BaseInput.vue'
import BaseSelect from '~~/components/base/BaseSelect.vue'
import BaseTextarea from '~~/components/base/BaseTextarea.vue'
import { byRole } from '../../helpers/roles'

const OPTIONS = [{ value: 'rack-2', label: 'Rack 2' }]

describe('a field', () => {
  it.each([
    ['textbox', () => h(BaseInput)],
    ['combobox', () => h(BaseSelect, { options: OPTIONS })],
    ['textbox', () => h(BaseTextarea)],
  ])('gives its label, hint and error to the %s in it', async (role, control) => {
    const wrapper = await mountSuspended(BaseField, {
      props: { label: 'Serial', hint: 'as stamped', error: 'K48213 is in the fleet already.' },
      slots: { default: control },
    })
    const input = byRole(wrapper.element, role, 'Serial')
    expect(input.getAttribute('aria-invalid')).toBe('true')
    const described = input.getAttribute('aria-describedby')!.split(' ').map(id => wrapper.element.querySelector(`[id="${id}"]`)!.textContent)
    expect(described.join(' ')).toContain('K48213 is in the fleet already.')
    expect(described.join(' ')).toContain('as stamped')
  })

  it('is not called wrong without an error', async () => {
    const wrapper = await mountSuspended(BaseField, { props: { label: 'Serial' }, slots: { default: () => h(BaseInput) } })
    const input = byRole(wrapper.element, 'textbox', 'Serial')
    expect(input.hasAttribute('aria-invalid')).toBe(false)
    expect(input.hasAttribute('aria-describedby')).toBe(false)
  })

  it('stands as a legend over a set of controls', async () => {
    const wrapper = await mountSuspended(BaseField, {
      props: { label: 'Marked for flammables?', group: true },
      slots: { default: () => h(BaseChips, { label: 'Marked', chips: [{ value: 'yes', label: 'yes' }] }) },
    })
    expect(byRole(wrapper.element, 'group', 'Marked for flammables?').tagName).toBe('FIELDSET')
  })

  it('hands what is typed to the page', async () => {
    const wrapper = await mountSuspended(BaseInput, { props: { modelValue: '' } })
    await wrapper.find('input').setValue('K48213')
    expect(wrapper.emitted('update:modelValue')).toEqual([['K48213']])
  })

  it('hands what is chosen to the page', async () => {
    const wrapper = await mountSuspended(BaseSelect, { props: { options: OPTIONS, empty: 'Choose a place' } })
    await wrapper.find('select').setValue('rack-2')
    expect(wrapper.emitted('update:modelValue')).toEqual([['rack-2']])
  })
})
