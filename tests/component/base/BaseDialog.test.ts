import { mountSuspended } from '@nuxt/test-utils/runtime'
import { nextTick } from 'vue'
import { expect, it } from 'vitest'
import BaseDialog from '~~/components/base/BaseDialog.vue'
import { byRole } from '../../helpers/roles'

const props = { title: 'Ship 12 cylinders, 278.2 lb', verb: 'Ship 12' }

it('opens by its model, named by the count and the weight', async () => {
  const wrapper = await mountSuspended(BaseDialog, { props: { ...props, modelValue: false }, attachTo: document.body })
  const dialog = wrapper.find('dialog').element
  expect(dialog.open).toBe(false)
  await wrapper.setProps({ modelValue: true })
  expect(dialog.open).toBe(true)
  expect(byRole(wrapper.element, 'dialog', 'Ship 12 cylinders, 278.2 lb')).toBeTruthy()
  wrapper.unmount()
})

it('does it by the verb and leaves it by the other button', async () => {
  const wrapper = await mountSuspended(BaseDialog, { props: { ...props, modelValue: true } })
  byRole(wrapper.element, 'button', 'Ship 12').click()
  expect(wrapper.emitted('confirm')).toHaveLength(1)
  byRole(wrapper.element, 'button', 'Leave it').click()
  await nextTick()
  expect(wrapper.emitted('update:modelValue')).toEqual([[false]])
})
