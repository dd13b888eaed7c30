import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import LabelCurve from '~~/components/label/LabelCurve.vue'

async function mount() {
  return await mountSuspended(LabelCurve, { props: { modelValue: null } })
}

type Mounted = Awaited<ReturnType<typeof mount>>

async function press(wrapper: Mounted, text: string) {
  await wrapper.findAll('button').find(button => button.text().includes(text))!.trigger('click')
}

function last(wrapper: Mounted) {
  return wrapper.emitted('update:modelValue')?.at(-1)
}

describe('where a label is stuck', () => {
  it('asks for a diameter only where it goes round the cylinder', async () => {
    const wrapper = await mount()
    expect(wrapper.find('input').exists()).toBe(false)
    await press(wrapper, 'round the cylinder')
    await wrapper.find('input').setValue('6')
    expect(last(wrapper)).toEqual([152.4])
    await press(wrapper, 'a flat guard')
    expect(last(wrapper)).toEqual([null])
  })

  it('takes a common size by its water capacity, and says that it is from memory', async () => {
    const wrapper = await mount()
    await press(wrapper, 'round the cylinder')
    await press(wrapper, '9 in, WC about 26 lb')
    expect(last(wrapper)).toEqual([228.6])
    expect(wrapper.text()).toContain('from memory: measure yours')
  })

  it('says what it wants where the width is no number', async () => {
    const wrapper = await mount()
    await press(wrapper, 'round the cylinder')
    await wrapper.find('input').setValue('9')
    await wrapper.find('input').setValue('nine')
    expect(last(wrapper)).toEqual([null])
    expect(wrapper.text()).toContain('Write inches across')
  })
})
