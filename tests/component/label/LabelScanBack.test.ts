import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import LabelScanBack from '~~/components/label/LabelScanBack.vue'
import { byRole } from '../../helpers/roles'

const PRINTED = ['7K3M9Q2TX', '10100000E']

async function mount(scanned: string | null) {
  return await mountSuspended(LabelScanBack, { props: { codes: PRINTED, scanned } })
}

describe('scanning a printed label back', () => {
  it('is asked for until one of the printed labels comes back', async () => {
    const wrapper = await mount(null)
    expect(wrapper.text()).toContain('The printing is done when it comes back')
    await wrapper.setProps({ scanned: '10100000E' })
    expect(byRole(wrapper.element, 'status').textContent).toContain('the print is good')
    expect(wrapper.text()).toContain('101 000 00E was read')
  })

  it('is not satisfied by a label of another printing, and names it', async () => {
    const wrapper = await mount('7K3M9Q2T0')
    expect(byRole(wrapper.element, 'alert').textContent).toContain('7K3 M9Q 2T0 is none of those just printed')
    expect(wrapper.text()).toContain('Scan one back')
  })

  it('takes a code from its field as soon as the ninth character fits', async () => {
    const wrapper = await mount(null)
    await wrapper.find('input').setValue('7K3M9Q2T')
    expect(wrapper.emitted('code')).toBeUndefined()
    await wrapper.find('input').setValue('HTTPS://CYLINDERS.EXAMPLE/C/7K3M9Q2TX')
    expect(wrapper.emitted('code')).toEqual([['7K3M9Q2TX']])
  })
})
