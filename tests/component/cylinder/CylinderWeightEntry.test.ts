import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import { defineComponent, h } from 'vue'
import CylinderWeightEntry from '~~/components/cylinder/CylinderWeightEntry.vue'
import { byRole } from '../../helpers/roles'

const props = { label: 'Scale reads now' }

describe('the weight field', () => {
  it('gives the reading as typed and the same weight in the other units', async () => {
    const wrapper = await mountSuspended(CylinderWeightEntry, { props })
    await wrapper.find('input').setValue('66.0')
    expect(wrapper.emitted('update:modelValue')!.at(-1)).toEqual([{ unit: 'lb', value: 66 }])
    expect(wrapper.emitted('reason')!.at(-1)).toEqual([null])
    // 66 lb = 66 x 0.45359237 kg = 29.937 kg
    expect(byRole(wrapper.element, 'status').textContent!.replaceAll('\u00A0', ' ')).toBe('66 lb 0 oz · 29.94 kg')
  })

  it('gives no reading and the reason while the text is no weight, and keeps the text', async () => {
    const wrapper = await mountSuspended(CylinderWeightEntry, { props: { ...props, modelValue: { unit: 'lb', value: 50.5 } } })
    await wrapper.find('input').setValue('50,5,1')
    await wrapper.find('fieldset').trigger('focusout')
    expect(wrapper.emitted('update:modelValue')!.at(-1)).toEqual([null])
    expect(wrapper.emitted('reason')!.at(-1)![0]).toContain('two ways')
    expect(wrapper.find('input').element.value).toBe('50,5,1')
    expect(wrapper.find('input').attributes('aria-invalid')).toBe('true')
  })

  it('calls nothing wrong before it is typed', async () => {
    const wrapper = await mountSuspended(CylinderWeightEntry, { props })
    await wrapper.find('fieldset').trigger('focusout')
    expect(wrapper.find('input').attributes('aria-invalid')).toBeUndefined()
    expect(wrapper.emitted('reason')!.at(-1)).toEqual(['The weight is not typed yet.'])
  })

  it('says that it is missing once its form is sent off without it, where nothing is recorded without it', async () => {
    const inForm = async (required: boolean) => {
      const wrapper = await mountSuspended(defineComponent({
        setup: () => () => h('form', { onSubmit: (event: Event) => event.preventDefault() }, h(CylinderWeightEntry, { ...props, required })),
      }), { attachTo: document.body })
      const said = () => [wrapper.find('input').attributes('aria-invalid'), wrapper.text().includes('The weight is not typed yet.')]
      const before = said()
      await wrapper.find('form').trigger('submit')
      const after = said()
      await wrapper.find('input').setValue('30')
      const typed = said()
      wrapper.unmount()
      return { before, after, typed }
    }
    expect(await inForm(true)).toEqual({ before: [undefined, false], after: ['true', true], typed: [undefined, false] })
    expect((await inForm(false)).after).toEqual([undefined, false])
  })

  it('takes pounds and ounces in two boxes', async () => {
    const wrapper = await mountSuspended(CylinderWeightEntry, { props })
    byRole(wrapper.element, 'button', 'lb oz').click()
    await wrapper.vm.$nextTick()
    byRole(wrapper.element, 'textbox', 'Scale reads now, pounds')
    const [pounds, ounces] = wrapper.findAll('input')
    await pounds!.setValue('41')
    expect(wrapper.emitted('update:modelValue')?.at(-1)?.[0] ?? null).toBeNull()
    await ounces!.setValue('13')
    expect(wrapper.emitted('update:modelValue')!.at(-1)).toEqual([{ unit: 'lb-oz', lb: 41, oz: 13 }])
  })

  it('keeps what is typed when the scale turns out to show kilograms', async () => {
    const wrapper = await mountSuspended(CylinderWeightEntry, { props })
    await wrapper.find('input').setValue('30')
    byRole(wrapper.element, 'button', 'kg').click()
    await wrapper.vm.$nextTick()
    expect(wrapper.emitted('update:modelValue')!.at(-1)).toEqual([{ unit: 'kg', value: 30 }])
  })

  it('shows a reading that the page sets', async () => {
    const wrapper = await mountSuspended(CylinderWeightEntry, { props: { ...props, modelValue: null } })
    await wrapper.setProps({ modelValue: { unit: 'kg', value: 22.9 } })
    expect(wrapper.find('input').element.value).toBe('22.9')
    expect(byRole(wrapper.element, 'button', 'kg').getAttribute('aria-pressed')).toBe('true')
  })

  it('shows the word of the page beside it', async () => {
    const wrapper = await mountSuspended(CylinderWeightEntry, { props: { ...props, error: 'This is below the tare of 27.9 lb.' } })
    const described = wrapper.find('input').attributes('aria-describedby')!.split(' ')[0]!
    expect(wrapper.find(`[id="${described}"]`).text()).toBe('This is below the tare of 27.9 lb.')
  })
})
