import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import { nextTick, reactive } from 'vue'
import ReclaimPriceForm from '~~/components/reclaim/ReclaimPriceForm.vue'
import ReclaimPriceTable from '~~/components/reclaim/ReclaimPriceTable.vue'
import type { PriceTyped } from '~~/utils/reclaim/priceTyped'
import { byRole } from '../../helpers/roles'

const TYPED: PriceTyped = { refrigerant: 'R-22', condition: 'clean', pays: 'they', amount: '5.25', per: 'lb', fromDay: '2026-06-01', untilDay: '' }

async function open(typed: Partial<PriceTyped> = {}) {
  const form = await mountSuspended(ReclaimPriceForm, { props: { modelValue: reactive({ ...TYPED, ...typed }), refrigerants: ['R-22', 'R-134a'] } })
  return {
    form,
    async save() {
      await form.find('form').trigger('submit')
      return form.emitted<[object]>('save')?.at(-1)?.[0]
    },
  }
}

describe('the form of a price', () => {
  it('turns what is charged below zero, without a sign being typed', async () => {
    const { form, save } = await open({ refrigerant: '', condition: 'mixed', amount: '2.5' })
    expect(await save()).toMatchObject({ refrigerant: null, condition: 'mixed', mills: 2500 })
    byRole(form.element, 'button', 'It charges us').click()
    await nextTick()
    expect(await save()).toMatchObject({ mills: -2500 })
  })

  it('refuses an amount that can be read in two ways, and days out of their order', async () => {
    const { form, save } = await open({ amount: '1,250', untilDay: '2026-05-31' })
    expect(await save()).toBeUndefined()
    expect(form.text()).toContain('can be read in two ways')
    expect(form.text()).toContain('Not before its first day.')
  })
})

describe('the table of prices', () => {
  it('says today\'s price, what follows, what is charged, and where there is none', async () => {
    const price = (id: string, fromDay: string, untilDay: string | null, mills: number, more = {}) =>
      ({ id, refrigerant: 'R-22' as string | null, condition: 'clean', fromDay, untilDay, rate: { mills, per: 'lb' as const }, recordedAt: 0, ...more })
    const table = await mountSuspended(ReclaimPriceTable, { props: { today: '2026-06-15', prices: [
      price('a', '2026-01-01', null, 5000), price('b', '2026-07-01', null, 5500),
      price('c', '2026-01-01', null, -2500, { refrigerant: null, condition: 'mixed' }), price('d', '2026-01-01', '2026-05-31', 900, { refrigerant: 'R-407C' }),
    ] } })
    const rows = table.findAll('tbody tr').map(row => row.text().replaceAll('\u00A0', ' ').replace(/\s+/g, ' '))
    expect(rows[0]).toContain('$5.00 a lb')
    expect(rows[0]).toContain('$5.50 a lb from 1 Jul 2026')
    expect(rows[1]).toContain('no price today')
    expect(rows[1]).toContain('No price from 1 Jun 2026 on.')
    expect(rows[2]).toContain('charged')
    expect(rows[2]).toContain('−$2.50 a lb')
  })
})
