import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import { nextTick } from 'vue'
import ReclaimOffer from '~~/components/reclaim/ReclaimOffer.vue'
import type { WorthLine, WorthOffer } from '~~/utils/reclaim/worth'
import { byRole } from '../../helpers/roles'

const TERMS = {
  refrigerants: [], takesMixed: true, takesUnknown: false, takesOverdue: false, specs: null, pressuresPsig: null, mostContaminationPercent: null,
  minimum: { unit: 'kg' as const, value: 15 }, minimumCylinders: null, pickUpCents: 2000, note: null,
}

function line(id: string, more: Partial<WorthLine> = {}): WorthLine {
  return {
    refrigerant: 'R-22', condition: 'clean', owner: { is: 'ours' }, cylinders: 1, cylinderIds: [id], notWeighed: 0, netGrams: 10_000,
    rate: { mills: 10_000, per: 'kg' }, valueCents: 10_000, comesFree: 1, ...more,
  }
}

async function open(lines: WorthLine[], more: Partial<WorthOffer> = {}) {
  const card = await mountSuspended(ReclaimOffer, { props: {
    offer: { takerId: 'h', placeId: 'n', lines, refused: [], refusedCylinders: 0, ...more }, firm: 'Halvern', place: 'North shop', terms: TERMS,
    owners: [{ id: 'dairy', name: 'Dunmarrow Dairy' }], unit: 'kg', mayStart: true,
  } })
  const text = () => card.text().replaceAll('\u00A0', ' ')
  async function start() {
    byRole(card.element, 'button', /^Start a shipment/).click()
    await nextTick()
    return card.emitted<[string[]]>('start')?.at(-1)?.[0]
  }
  return { card, text, start }
}

describe('what a reclaimer would take from a place', () => {
  it('says whether the minimum is reached, and begins a shipment with what is ours', async () => {
    const { text, start } = await open([line('a'), line('b', { condition: 'suspect' }), line('c', { owner: { is: 'customer', id: 'dairy' } })])
    expect(text()).toContain('20.00 kg of R-22 in North shop are worth a pick-up by Halvern.')
    expect(text()).toContain('Dunmarrow Dairy')
    expect(text()).toContain('stays theirs')
    expect(await start()).toEqual(['a', 'b'])
  })

  it('reckons anew with a line left out, and with a customer\'s taken along', async () => {
    const { card, text, start } = await open([line('a'), line('c', { owner: { is: 'customer', id: 'dairy' } })])
    expect(text()).toContain('10.00 kg of R-22 in North shop: 5.00 kg missing until Halvern fetches.')
    const [own, theirs] = card.findAll('table input[type=checkbox]')
    await theirs!.setValue(true)
    expect(text()).toContain('20.00 kg of R-22 in North shop are worth a pick-up by Halvern.')
    // What belongs to a customer is not ours to count.
    expect(text()).toContain('$100.00 at today\'s prices')
    expect(await start()).toEqual(['a', 'c'])
    await own!.setValue(false)
    expect(text()).toContain('No price is recorded for any of it.')
    expect(await start()).toEqual(['c'])
  })

  it('shows a dash where no price is recorded, never nothing for it', async () => {
    const { text } = await open([line('a', { rate: null, valueCents: null })])
    expect(text()).not.toContain('$0.00')
    expect(text()).toContain('no price is recorded')
  })

  it('names what would be refused, each reason with its cylinders', async () => {
    const { card, text } = await open([line('a')], { refusedCylinders: 12, refused: [{ text: 'The reclaimer does not take R-32.', cylinders: 12, first: [{ id: 'x', labelCode: '7K3M9Q2TX', serial: null }] }] })
    expect(text()).toContain('12 cylinders would be refused or held back')
    expect(byRole(card.element, 'link', '7K3 M9Q 2TX').getAttribute('href')).toBe('/c/7k3m9q2tx')
    expect(text()).toContain('and 11 more')
  })
})
