import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import BaseButton from '~~/components/base/BaseButton.vue'
import { byRole } from '../../helpers/roles'

describe('a button', () => {
  it('is a button that posts nothing unless it is told to', async () => {
    const wrapper = await mountSuspended(BaseButton, { slots: { default: () => 'Weigh' } })
    const button = byRole(wrapper.element, 'button', 'Weigh')
    expect(button.getAttribute('type')).toBe('button')
    await wrapper.trigger('click')
    expect(wrapper.emitted('click')).toHaveLength(1)
  })

  it('is a link where it leads somewhere', async () => {
    const wrapper = await mountSuspended(BaseButton, { props: { to: '/fleet' }, slots: { default: () => 'Fleet' } })
    expect(byRole(wrapper.element, 'link', 'Fleet').getAttribute('href')).toBe('/fleet')
  })

  it('takes no second press while it works, and says so', async () => {
    const wrapper = await mountSuspended(BaseButton, { props: { busy: true, busyText: 'Recording' }, slots: { default: () => 'Record' } })
    const button = byRole(wrapper.element, 'button', /Recording/)
    expect(button.getAttribute('aria-busy')).toBe('true')
    await wrapper.trigger('click')
    expect(wrapper.emitted('click')).toBeUndefined()
  })
})
