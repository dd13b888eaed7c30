import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import { defineComponent, h, ref } from 'vue'
import CylinderWeightEntry from '~~/components/cylinder/CylinderWeightEntry.vue'
import type { MassReading, MassUnit } from '~~/utils/quantity/mass'

/** Two weight fields of one form that share the person's unit. */
async function twoFields(before: MassReading | null, after: MassReading | null, personsUnit: MassUnit) {
  const unit = ref(personsUnit)
  const readings = { before: ref(before), after: ref(after) }
  const field = (key: 'before' | 'after') => () => h(CylinderWeightEntry, {
    'label': key,
    'modelValue': readings[key].value,
    'onUpdate:modelValue': (next: MassReading | null) => {
      readings[key].value = next
    },
    'unit': unit.value,
    'onUpdate:unit': (next: MassUnit | undefined) => {
      unit.value = next ?? unit.value
    },
  })
  const wrapper = await mountSuspended(defineComponent({ setup: () => () => h('div', [field('before')(), field('after')()]) }))
  return { wrapper, readings }
}

describe('weight fields that share a person\'s unit', () => {
  it('keep a recorded reading as it was entered, whatever the reader\'s own unit', async () => {
    const { wrapper, readings } = await twoFields({ unit: 'lb-oz', lb: 17, oz: 1.5 }, { unit: 'kg', value: 13.15 }, 'lb')
    expect(readings.before.value).toEqual({ unit: 'lb-oz', lb: 17, oz: 1.5 })
    expect(readings.after.value).toEqual({ unit: 'kg', value: 13.15 })
    expect(wrapper.findAll('input').map(input => input.element.value)).toEqual(['17', '1.5', '13.15'])
  })

  it('do not read what stands in one as another unit when the other changes', async () => {
    const { wrapper, readings } = await twoFields({ unit: 'kg', value: 20 }, null, 'kg')
    await wrapper.findAll('fieldset')[1]!.findAll('button').find(button => button.text() === 'lb')!.trigger('click')
    expect(readings.before.value).toEqual({ unit: 'kg', value: 20 })
  })

  it('follow the person to another unit while they are empty', async () => {
    const { wrapper } = await twoFields(null, null, 'kg')
    await wrapper.findAll('fieldset')[1]!.findAll('button').find(button => button.text() === 'lb oz')!.trigger('click')
    expect(wrapper.findAll('input')).toHaveLength(4)
  })
})
