import { describe, expect, it } from 'vitest'
import {
  codes, contentsAfter, CUSTOMER, DAY, did, filled, folded, kg, lastFindings, lastMovements, OTHER_CYLINDER, registered, SHIPMENT, SHOP, STAMP, START, SUPPLIER, SUPPLIER_PLACE,
  TECHNICIAN, VAN, viewAfter, VIEW_CONTEXT, weighed, type Told,
} from '~~/tests/helpers/custody'
import { cacheRow } from '~~/utils/custody/row'

const EXCHANGE = '0198f000-0000-7000-8000-0000000000d2'
const went = (more: Told['more'] = {}) => did('exchanged', { direction: 'out', otherCylinderId: OTHER_CYLINDER, exchangeId: EXCHANGE, firmId: SUPPLIER }, more)
const came = (more: Told['more'] = {}) => did('exchanged', { direction: 'in', otherCylinderId: OTHER_CYLINDER, exchangeId: EXCHANGE, firmId: SUPPLIER }, { placeId: SHOP, ...more })

describe('a cylinder that goes to a firm in exchange', () => {
  const story = [registered(), did('moved', { toPlaceId: VAN, toHolderId: TECHNICIAN }), filled('R-22', 15), went({ placeId: SHOP })]

  it('is at the firm and the firm\'s, and nobody carries it', () => {
    expect(folded(...story).state).toMatchObject({ placeId: SUPPLIER_PLACE, holderId: null, ownerId: SUPPLIER, ownership: 'deposit' })
    expect(viewAfter(story).lifecycle).toBe('in-service')
  })

  it('takes its known contents out of stock as returned with it', () => {
    expect(contentsAfter(...story)).toMatchObject({ refrigerant: 'R-22', netGrams: 3000, inStock: false })
    expect(lastMovements(...story)).toEqual(['returned-with R-22 -3000'])
  })

  it('takes out nothing that is not known, and nothing from an empty one', () => {
    expect(lastMovements(registered({ contents: { refrigerant: 'R-22', condition: 'clean' } }), went())).toEqual([])
    expect(lastMovements(registered(), went())).toEqual([])
  })

  it('is not looked for, and may not be filled or taken', () => {
    const shown = viewAfter(story, { nowMs: START + 400 * DAY })
    expect(codes(shown)).not.toContain('not-seen')
    expect(shown.capacity.refusals.map(({ code }) => code)).toEqual(['away'])
    expect(shown.mayNot.map(({ kind }) => kind)).toEqual(expect.arrayContaining(['moved', 'filled', 'drawn', 'transferred', 'exchanged']))
  })

  it('has no retest that is ours to see to, until it is here again', () => {
    // Made in March 2024: due in March 2029, five years later.
    const nowMs = Date.UTC(2029, 4, 1)
    expect(codes(viewAfter(story.slice(0, -1), { nowMs }))).toContain('retest-overdue')
    expect(codes(viewAfter(story, { nowMs }))).toEqual(['half-transfer'])
    expect(cacheRow(folded(...story).state, VIEW_CONTEXT)).toMatchObject({ dueMonth: null, findingCodes: ' half-transfer ' })
    const noDate = [registered({ stamp: { ...STAMP, madeMonth: null } }), went()]
    expect(codes(viewAfter(noDate.slice(0, 1)))).toContain('retest-unknown')
    expect(codes(viewAfter(noDate))).toEqual(['half-transfer'])
    expect(cacheRow(folded(...noDate).state, VIEW_CONTEXT).findingCodes).toBe(' half-transfer ')
    expect(codes(viewAfter([...story, weighed(15, { occurredAt: nowMs })], { nowMs }))).toContain('retest-overdue')
  })

  it('stays a rented one where it was rented', () => {
    expect(folded(registered({ ownership: 'rental', ownerId: SUPPLIER }), went()).state.ownership).toBe('rental')
  })

  it('weighed here again is back in stock, with a finding', () => {
    expect(lastFindings(...story, weighed(15))).toEqual(['away'])
    expect(lastMovements(...story, weighed(15))).toEqual(['opening R-22 3000'])
    expect(folded(...story, weighed(15)).state).toMatchObject({ away: null, contents: { inStock: true } })
  })

  it('received again comes with what nobody knows', () => {
    const back = [...story, did('received', { fromFirmId: SUPPLIER }, { placeId: SHOP })]
    expect(contentsAfter(...back)).toMatchObject({ refrigerant: null, condition: 'unknown', netGrams: null, inStock: true })
    expect(lastMovements(...back)).toEqual([])
  })
})

describe('a cylinder that comes from a firm in exchange', () => {
  it('is where it was put and the contractor\'s own', () => {
    const story = [registered({ ownership: 'customer', ownerId: SUPPLIER }), came()]
    expect(folded(...story).state).toMatchObject({ placeId: SHOP, holderId: null, ownerId: null, ownership: 'own' })
  })

  it('brings its known contents in as received with it, in place of an opening', () => {
    const story = [registered({ ownership: 'customer', ownerId: CUSTOMER, contents: { refrigerant: 'R-22', condition: 'clean' }, gross: kg(15) }), came()]
    expect(lastMovements(...story)).toEqual(['opening R-22 -3000 f1', 'received-with R-22 3000'])
    expect(contentsAfter(...story)).toMatchObject({ netGrams: 3000, shares: [{ ownerId: null, grams: 3000 }] })
  })

  it('brings nothing in where nothing is in it or its weight is not known', () => {
    expect(lastMovements(registered(), came())).toEqual([])
    expect(lastMovements(registered({ contents: { refrigerant: 'R-22', condition: 'clean' } }), came())).toEqual([])
  })

  it('from a reclaimer comes as one that is returned', () => {
    const story = [registered({ contents: { refrigerant: 'R-22', condition: 'clean' }, gross: kg(15) }), did('sent-for-reclaim', { shipmentId: SHIPMENT, gross: kg(15) }), came()]
    expect(folded(...story).state.away).toBeNull()
    expect(contentsAfter(...story)).toMatchObject({ refrigerant: null, netGrams: null, inStock: true })
    expect(lastMovements(...story)).toEqual([])
  })
})
