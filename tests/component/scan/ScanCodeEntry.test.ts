import { mountSuspended } from '@nuxt/test-utils/runtime'
import { expect, it } from 'vitest'
import { defineComponent, h, ref } from 'vue'
import ScanCodeEntry from '../../../components/scan/ScanCodeEntry.vue'

// The page keeps what is typed, as the scan screen does.
function page(keypad: boolean) {
  const found: string[] = []
  return {
    found,
    component: defineComponent(() => {
      const typed = ref('')
      return () => h(ScanCodeEntry, {
        'modelValue': typed.value,
        'onUpdate:modelValue': (text: string) => {
          typed.value = text
        },
        keypad,
        'onWhole': (code: string) => {
          found.push(code)
        },
      })
    }),
  }
}

it('gives a code out with its ninth character, without another press', async () => {
  const { component, found } = page(false)
  const wrapper = await mountSuspended(component)
  await wrapper.get('input').setValue('7k3 m9q 2t')
  expect(found).toEqual([])
  await wrapper.get('input').setValue('7k3 m9q 2tx')
  expect(found).toEqual(['7K3M9Q2TX'])
})

it('does the same when its own keys are pressed', async () => {
  const { component, found } = page(true)
  const wrapper = await mountSuspended(component)
  for (const key of '7K3M9Q2TX') await wrapper.findAll('button').find(button => button.text() === key)!.trigger('click')
  expect(found).toEqual(['7K3M9Q2TX'])
})

it('keeps a code back whose ninth character does not fit', async () => {
  const { component, found } = page(false)
  const wrapper = await mountSuspended(component)
  await wrapper.get('input').setValue('7K3M9Q2TW')
  expect(found).toEqual([])
  expect(wrapper.text()).toContain('The ninth character does not fit')
})
