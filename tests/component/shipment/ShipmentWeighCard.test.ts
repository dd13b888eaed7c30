import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import ShipmentWeighCard from '~~/components/shipment/ShipmentWeighCard.vue'
import { shipmentLine, weighed } from '../../helpers/shipmentLine'

async function mount(line = shipmentLine('a', '0YHP9KRRT')) {
  const card = await mountSuspended(ShipmentWeighCard, { props: { line, unit: 'lb' }, attachTo: document.body })
  return { card, weigh: (text: string) => card.find('input').setValue(text), words: () => card.text().replaceAll('\u00A0', ' ') }
}

// Tare 12474 g is 27.5 lb, last net 10251 g: 22725 g gross, 50.1 lb. The stop weight is 29746.6 g, 65.58 lb.
describe('a cylinder of a shipment on the scale', () => {
  it('is shown with its last gross and its stop weight, and keeps what the scale shows', async () => {
    const { card, weigh, words } = await mount()
    expect(words()).toContain('Last gross50.1 lb')
    expect(words()).toContain('Stop weight65.5 lb')
    await weigh('50.1')
    expect(words()).toContain('22.6 lb net')
    await card.find('form').trigger('submit')
    expect(card.emitted('keep')).toEqual([[{ unit: 'lb', value: 50.1 }]])
    card.unmount()
  })

  it('says at once that it is above its fill limit, on the first division above the stop weight', async () => {
    const { card, weigh, words } = await mount()
    await weigh('65.5')
    expect(words()).not.toContain('Above its fill limit')
    await weigh('65.6')
    expect(words()).toContain('Above its fill limit: it may not leave.')
    card.unmount()
  })

  it('asks to weigh again where the weight has come far from the last known one', async () => {
    const { card, weigh, words } = await mount()
    await weigh('48.0')
    expect(words()).toContain('2.1 lb less than last known. Weigh it again.')
    card.unmount()
  })

  it('keeps nothing that was not typed, and starts anew with the next cylinder', async () => {
    const { card, weigh } = await mount()
    await card.find('form').trigger('submit')
    expect(card.emitted('keep')).toBeUndefined()
    await weigh('50.1')
    await card.setProps({ line: shipmentLine('b', '7K3M9Q2TX') })
    expect(card.find('input').element.value).toBe('')
    card.unmount()
  })

  it('shows what was kept of it, and what was weighed before something new was recorded', async () => {
    const { card, words } = await mount(shipmentLine('a', '0YHP9KRRT', { weighed: weighed(49.8) }))
    expect(words()).toContain('Kept49.8 lb')
    await card.setProps({ line: shipmentLine('a', '0YHP9KRRT', { weighed: weighed(49.8, { isStale: true }) }) })
    expect(words()).toContain('Weighed before49.8 lb')
    card.unmount()
  })
})
