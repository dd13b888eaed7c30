import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import { nextTick } from 'vue'
import ScaleForm from '~~/components/scale/ScaleForm.vue'
import type { ScaleLine } from '~~/utils/contract/scales'
import { allByRole, byRole } from '../../helpers/roles'

const BENCH: ScaleLine = { id: 's1', name: 'Bench', accuracy: { unit: 'oz', value: 0.5 }, accuracyPercent: 0.5, lastCheckOn: '2025-09-30', active: true }

async function open(scale: ScaleLine | null = null) {
  const form = await mountSuspended(ScaleForm, { props: { scale, today: '2026-12-01', unit: 'lb' } })
  return {
    form,
    async type(name: string, text: string) {
      const field = byRole(form.element, 'textbox', name) as HTMLInputElement
      field.value = text
      field.dispatchEvent(new Event('input'))
      await nextTick()
    },
    async day(text: string) {
      await form.find('input[type=date]').setValue(text)
    },
    async save() {
      await form.find('form').trigger('submit')
      return form.emitted<[object]>('save')?.at(-1)?.[0]
    },
  }
}

describe('the form of a scale', () => {
  it('takes an accuracy as the data sheet has it, and shows what it means', async () => {
    const { form, type, save } = await open()
    await type('Name', 'Dock scale')
    await type('Off by at most', '0,5')
    await type('Or, of the reading', '0.25')
    // 40 lb are 18,144 g, a quarter of a percent 45.4 g; half an ounce is 14.2 g.
    expect(form.text()).toContain('A reading of 40.0\u00A0lb may then be off by 46 g.')
    expect(await save()).toEqual({ name: 'Dock scale', accuracy: { unit: 'oz', value: 0.5 }, accuracyPercent: 0.25, lastCheckOn: null })
  })

  it('believes no scale that is said to be exact, and no figure it cannot read', async () => {
    const { form, type, save } = await open()
    await type('Name', 'Dock scale')
    expect(await save()).toBeUndefined()
    expect(form.text()).toContain('No scale is exact')
    await type('Off by at most', 'half')
    expect(await save()).toBeUndefined()
    expect(form.text()).toContain('“half” is not a figure')
  })

  it('takes a check of today and none to come', async () => {
    const { form, day, save } = await open(BENCH)
    await day('2026-12-02')
    expect(await save()).toBeUndefined()
    expect(form.text()).toContain('still to come')
    await day('2026-12-01')
    expect(await save()).toMatchObject({ lastCheckOn: '2026-12-01' })
  })

  it('does not ask for the accuracy of a scale that is there, and says why', async () => {
    const { form, save } = await open(BENCH)
    expect(allByRole(form.element, 'textbox', 'Off by at most')).toHaveLength(0)
    expect(form.text()).toContain('Its accuracy stays')
    expect(await save()).toEqual({ name: 'Bench', accuracy: { unit: 'oz', value: 0.5 }, accuracyPercent: 0.5, lastCheckOn: '2025-09-30' })
  })
})
