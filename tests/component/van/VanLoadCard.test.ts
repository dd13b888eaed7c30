import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import VanLoadCard from '~~/components/van/VanLoadCard.vue'
import { byRole } from '../../helpers/roles'

// 440 lb = 199,580.6 g at 453.59237 g a pound.
async function card(gross: (number | null)[], otherGrams: number | null) {
  const aboard = gross.map(grams => ({ tareWeightGrams: 12_000, netGrams: grams === null ? null : grams - 12_000 }))
  const { element } = await mountSuspended(VanLoadCard, { props: { aboard, otherGrams, unit: 'lb' } })
  return byRole(element as HTMLElement, 'region', 'Gross aboard')
}

describe('the load of a van on the screen', () => {
  it('counts what else is carried into the 440 lb', async () => {
    // 60,000 g and 20,000 g are 176.4 lb.
    expect((await card([60_000], 20_000)).textContent).toContain('176.4\u00A0lb of 440.0\u00A0lb')
  })

  it('gives figures that subtract, the load rounded up like what is too much of it', async () => {
    // 210,253 g are 463.53 lb.
    const said = (await card([90_000, 90_000], 30_253)).textContent
    expect(said).toContain('463.6\u00A0lb of 440.0\u00A0lb')
    expect(said).toContain('23.6\u00A0lb above')
  })

  it('says what is not known, and does not call the load fine then', async () => {
    const said = (await card([60_000, null], null)).textContent
    expect(said).toContain('1 cylinder is not weighed and not counted here.')
    expect(said).toContain('What else is carried is not said')
  })

  it('says above the limit what to do', async () => {
    const over = await card([100_000, 99_000], 10_000)
    expect(over.querySelector('[aria-label="What to do"]')!.textContent).toContain('Leave at least')
    expect((await card([60_000], 0)).querySelector('[aria-label="What to do"]')).toBeNull()
  })
})
