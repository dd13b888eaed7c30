import { mountSuspended } from '@nuxt/test-utils/runtime'
import { expect, it } from 'vitest'
import FrameStatus from '~~/components/frame/FrameStatus.vue'
import { byRole } from '../../helpers/roles'

it('says in words whether the server is heard, and changes the mark as well', async () => {
  const wrapper = await mountSuspended(FrameStatus, { props: { text: 'Van 12, online' } })
  expect(byRole(wrapper.element, 'status', 'Van 12, online')).toBeTruthy()
  const online = wrapper.find('[aria-hidden]').classes()
  await wrapper.setProps({ text: '3 waiting to send', online: false })
  expect(wrapper.text()).toBe('3 waiting to send')
  expect(wrapper.find('[aria-hidden]').classes()).not.toEqual(online)
})
