import { mountSuspended } from '@nuxt/test-utils/runtime'
import { expect, it } from 'vitest'
import BaseCheckbox from '~~/components/base/BaseCheckbox.vue'
import { byRole } from '../../helpers/roles'

it('is named by its label and tells its hint apart', async () => {
  const wrapper = await mountSuspended(BaseCheckbox, { props: { label: 'Looked at it: sound', hint: 'no dents', bare: false } })
  const box = byRole(wrapper.element, 'checkbox', /^Looked at it: sound/)
  expect(wrapper.find(`[id="${box.getAttribute('aria-describedby')}"]`).text()).toBe('no dents')
  await wrapper.find('input').setValue(true)
  expect(wrapper.emitted('update:modelValue')).toEqual([[true]])
})

it('keeps its name where only the box is drawn', async () => {
  const wrapper = await mountSuspended(BaseCheckbox, { props: { label: 'Choose 7K3 M9Q 2TX', bare: true } })
  expect(byRole(wrapper.element, 'checkbox', 'Choose 7K3 M9Q 2TX')).toBeTruthy()
})
