import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import CylinderStopWeightHero from '~~/components/cylinder/CylinderStopWeightHero.vue'

// 66.06 lb: 66.0 lb, 66 lb 0 oz and 29.96 kg when rounded down.
const props = { verdict: { kind: 'ok' as const, text: 'Room for 15.5 lb of R-410A' }, stopGrams: 29_964, unit: 'lb' as const }

function text(wrapper: { text: () => string }) {
  return wrapper.text().replaceAll('\u00A0', ' ')
}

describe('the stop weight', () => {
  it('stands in the reader’s unit and beside it in the others, all rounded down', async () => {
    const wrapper = await mountSuspended(CylinderStopWeightHero, { props })
    expect(text(wrapper)).toBe('Room for 15.5 lb of R-410AStop when the scale reads66.0lb66 lb 0 oz29.96 kg')
  })

  it('stands in pounds and ounces', async () => {
    const wrapper = await mountSuspended(CylinderStopWeightHero, { props: { ...props, unit: 'lb-oz' } })
    expect(text(wrapper)).toContain('reads66lb0oz66.0 lb29.96 kg')
  })

  it('gives its reason where there is none', async () => {
    const wrapper = await mountSuspended(CylinderStopWeightHero, {
      props: { verdict: { kind: 'stop', text: 'Do not fill.' }, stopGrams: null, unit: 'lb', reason: 'The retest is 62 days late.' },
    })
    expect(wrapper.text()).toBe('Do not fill.The retest is 62 days late.')
  })
})
