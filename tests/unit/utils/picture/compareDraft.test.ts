import { describe, expect, it } from 'vitest'
import { compareAddress, compareDraft, compareFaults, compareQuery, massForAddress, stampAsked } from '~~/utils/picture/compareDraft'
import { filled, registered, viewAfter } from '../../../helpers/custody'

describe('the address of a comparison', () => {
  it('loses nothing that cannot be read: it comes back as it was typed', () => {
    const query = { refrigerant: 'R-999', spec: 'four BA', waterCapacity: 'fortyseven', gross: '1,022', condition: 'wet', share: 'much' }
    expect(compareQuery(compareDraft(query), 'lb')).toEqual(query)
  })

  it('leaves out what holds nothing and what is the usual', () => {
    expect(compareQuery(compareDraft({ refrigerant: 'R-22', condition: 'clean', flammableMarked: 'false' }), 'lb')).toEqual({ refrigerant: 'R-22' })
  })

  it('names a composition in place of a refrigerant', () => {
    const draft = { ...compareDraft({ refrigerant: 'R-22' }), composition: [{ component: 'R-32', percent: '50' }, { component: ' R-125 ', percent: '50' }, { component: '', percent: '' }] }
    expect(compareQuery(draft, 'lb')).toEqual({ composition: 'R-32:50,R-125:50' })
    expect(compareDraft({ composition: 'R-32:50,R-125' }).composition).toEqual([{ component: 'R-32', percent: '50' }, { component: 'R-125', percent: '' }])
  })

  it.each([
    ['47.7', 'lb', '47.7lb'], ['47,7', 'lb-oz', '47.7lb'], ['21.6', 'kg', '21.6kg'],
    ['47.7 lb', 'kg', '47.7lb'], ['41 lb 13 oz', 'lb', '41lb13oz'], ['', 'lb', ''],
  ] as const)('writes the weight %j of a reader of %s as %j', (typed, unit, text) => {
    expect(massForAddress(typed, unit)).toBe(text)
  })

  it('says what is missing, field by field', () => {
    expect(compareFaults({}).map(({ path }) => path)).toEqual(['refrigerant', 'spec', 'waterCapacity'])
    expect(compareFaults({ composition: 'R-32:50,R-125:50', spec: 'DOT-4BA400', waterCapacity: '47.7lb' })).toEqual([])
  })
})

describe('the stamp above its answer', () => {
  it('stands as it was typed, and says what was not', () => {
    expect(plain(stampAsked({ refrigerant: 'R-22', spec: 'DOT-4BA400', waterCapacity: '47.7lb' })))
      .toBe('DOT-4BA400, WC 47.7 lb, TW not given, not marked for flammables')
    expect(plain(stampAsked({
      spec: 'DOT-3AA', servicePressurePsig: '1800', waterCapacity: '47lb11oz', tareWeight: '44.4kg', gross: '60kg', condition: 'burnt', share: '0.75', flammableMarked: 'true',
    }))).toBe('DOT-3AA, 1800 psig, WC 47 lb 11 oz, TW 44.40 kg, gross 60.00 kg, burnt, share 0.75, marked for flammables')
  })
})

function plain(text: string) {
  return text.replaceAll('\u00A0', ' ')
}

describe('the comparison of a cylinder', () => {
  it('takes its stamp as it was read, and what the scale showed', () => {
    const view = viewAfter([registered(), filled('R-22', 20)])
    expect(compareAddress(view)).toEqual({ path: '/fill-limit', query: {
      refrigerant: 'R-22', spec: 'DOT-4BA', servicePressurePsig: '400', waterCapacity: '20kg', tareWeight: '12kg', gross: '20kg', flammableMarked: 'true',
    } })
  })

  it('takes the tare that a retest set', () => {
    const view = viewAfter([registered(), filled('R-22', 20)])
    const retared = { ...view, stamp: { ...view.stamp!, tareWeightGrams: 11_950 } }
    expect(compareAddress(retared).query).toMatchObject({ tareWeight: '11.95kg', gross: '19.95kg' })
  })
})
