import { mountSuspended } from '@nuxt/test-utils/runtime'
import { expect, it } from 'vitest'
import BaseFinding from '~~/components/base/BaseFinding.vue'
import { byRole } from '../../helpers/roles'

it('says how grave it is, what it is, since when and by which rule', async () => {
  const wrapper = await mountSuspended(BaseFinding, {
    props: { severity: 'stop', text: 'The retest is late.', since: '1 October 2026', source: '49 CFR 180.205(c)' },
  })
  const item = byRole(wrapper.element, 'listitem', /^Stop: The retest is late\./)
  expect(item.textContent).toContain('since 1 October 2026')
  expect(item.textContent).toContain('49 CFR 180.205(c)')
})

it('calls a caution a caution', async () => {
  const wrapper = await mountSuspended(BaseFinding, { props: { severity: 'caution', text: 'Nearly full.', boxed: true } })
  expect(byRole(wrapper.element, 'listitem', 'Caution: Nearly full.')).toBeTruthy()
})
