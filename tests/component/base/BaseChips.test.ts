import { mountSuspended } from '@nuxt/test-utils/runtime'
import { expect, it } from 'vitest'
import BaseChips from '~~/components/base/BaseChips.vue'
import { byRole } from '../../helpers/roles'

it('says which is chosen, counts even none, and chooses another', async () => {
  const wrapper = await mountSuspended(BaseChips, {
    props: { label: 'Filter', modelValue: 'all', chips: [{ value: 'all', label: 'All', count: 34 }, { value: 'late', label: 'Late', count: 0 }] },
  })
  expect(byRole(wrapper.element, 'group', 'Filter')).toBeTruthy()
  expect(byRole(wrapper.element, 'button', /^All ?34$/).getAttribute('aria-pressed')).toBe('true')
  const late = byRole(wrapper.element, 'button', /^Late ?0$/)
  expect(late.getAttribute('aria-pressed')).toBe('false')
  late.click()
  expect(wrapper.emitted('update:modelValue')).toEqual([['late']])
})
