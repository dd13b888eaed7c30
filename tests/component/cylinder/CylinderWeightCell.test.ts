import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import CylinderWeightCell from '~~/components/cylinder/CylinderWeightCell.vue'
import { byRole } from '../../helpers/roles'

const props = { label: 'Gross of 7K3 M9Q 2TX', unit: 'lb' as const }

async function cell(more: object = {}) {
  const wrapper = await mountSuspended(CylinderWeightCell, { props: { ...props, ...more } })
  const box = () => byRole(wrapper.element.parentElement!, 'textbox', /^Gross of 7K3 M9Q 2TX/) as HTMLInputElement
  return { wrapper, box }
}

describe('a weight in a table', () => {
  it('shows a reading that is set from outside, and none once it is taken away', async () => {
    const { wrapper, box } = await cell({ modelValue: null })
    await wrapper.setProps({ modelValue: { unit: 'lb', value: 40.5 } })
    expect(box().value).toBe('40.5')
    await wrapper.setProps({ modelValue: null })
    expect(box().value).toBe('')
  })

  it('takes no reading of another unit for one of its own: an empty box is no weight', async () => {
    const { wrapper, box } = await cell({ modelValue: null })
    await wrapper.setProps({ modelValue: { unit: 'kg', value: 18 } })
    expect(box().value).toBe('')
    expect(wrapper.emitted('update:modelValue')?.at(-1)).toEqual([null])
  })

  it('leaves what is typed alone while it is no weight yet', async () => {
    const { wrapper, box } = await cell({ modelValue: { unit: 'lb', value: 40 } })
    await wrapper.find('input').setValue('40.')
    await wrapper.find('input').setValue('4o')
    expect(wrapper.emitted('update:modelValue')?.at(-1)).toEqual([null])
    await wrapper.setProps({ modelValue: null })
    expect(box().value).toBe('4o')
  })
})
