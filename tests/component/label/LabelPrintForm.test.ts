import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import LabelPrintForm from '~~/components/label/LabelPrintForm.vue'
import type { LabelStockId } from '~~/utils/label/stock'
import { allByRole, byRole } from '../../helpers/roles'

async function mount(changes: { stock?: LabelStockId, address?: string | null } = {}) {
  return await mountSuspended(LabelPrintForm, {
    props: { count: 4, address: '/api/labels.pdf?codes=7K3M9Q2TX', symbol: { kind: 'ok', text: 'A symbol of 29.0 mm.' }, stock: 'roll-4x2', start: 1, withAdvice: false, ...changes },
  })
}

describe('how labels are printed', () => {
  it('offers every stock, a first label on a sheet only, and the advice on a roll only', async () => {
    const roll = await mount()
    expect(byRole(roll.element, 'combobox', 'Stock').querySelectorAll('option')).toHaveLength(10)
    expect(allByRole(roll.element, 'combobox', 'Begin at label')).toHaveLength(0)
    expect(allByRole(roll.element, 'checkbox')).toHaveLength(1)
    const sheet = await mount({ stock: 'a4-21' })
    expect(byRole(sheet.element, 'combobox', 'Begin at label').querySelectorAll('option')).toHaveLength(21)
    expect(allByRole(sheet.element, 'checkbox')).toHaveLength(0)
  })

  it('opens the PDF and says that it was printed', async () => {
    const wrapper = await mount()
    const link = wrapper.find('a')
    expect([link.text(), link.attributes('href')]).toEqual(['Open 4 labels as a PDF', '/api/labels.pdf?codes=7K3M9Q2TX'])
    await link.trigger('click')
    expect(wrapper.emitted('print')).toHaveLength(1)
  })

  it('opens none where the symbol would not be read, and says why', async () => {
    const wrapper = await mount({ address: null })
    expect(wrapper.find('a').exists()).toBe(false)
    expect(byRole(wrapper.element, 'status').textContent).toContain('A symbol of')
  })
})
