import { describe, expect, it } from 'vitest'
import { selectionOffer, selectionPath, SELECTION_ACTS, stepPath } from '../../../../utils/fleet/selectionAct'
import { cylinderRow } from '../../../helpers/cylinderRow'

const SHOP = { id: 'shop', name: 'North shop' }
const VAN = { id: 'van', name: 'Van 12' }
const VANS = new Set(['van'])
const ALL = new Set(SELECTION_ACTS)

const empty = { place: SHOP, nothingInIt: true, netGrams: 0, refrigerant: null }
const late = cylinderRow({ ...empty, worstFinding: { code: 'retest-overdue', severity: 'stop' }, findingCodes: ['retest-overdue'] })
// 17,272 g are its limit.
const full = cylinderRow({ place: SHOP, netGrams: 17_272, roomGrams: 0, worstFinding: { code: 'nearly-full', severity: 'caution' }, findingCodes: ['nearly-full'] })
const bare = cylinderRow({ place: SHOP, labelCode: null })
const usual = cylinderRow({ place: SHOP })

describe('what is offered first for chosen cylinders', () => {
  it('is a test lot for empty ones that are late, a shipment for full ones, labels for those without', () => {
    expect(selectionOffer([late, late], ALL, VANS).primary).toBe('test')
    expect(selectionOffer([full], ALL, VANS).primary).toBe('ship')
    expect(selectionOffer([bare], ALL, VANS).primary).toBe('label')
  })

  it('is to ship what is late and still holds something', () => {
    expect(selectionOffer([cylinderRow({ place: SHOP, findingCodes: ['retest-overdue'] })], ALL, VANS).primary).toBe('ship')
  })

  it('is to move them where they stand on a van, full or late as they are', () => {
    expect(selectionOffer([{ ...full, place: VAN }, { ...late, place: VAN }], ALL, VANS).primary).toBe('move')
  })

  it('is what most of them need, and of as many the test', () => {
    expect(selectionOffer([full, full, late], ALL, VANS).primary).toBe('ship')
    expect(selectionOffer([full, late], ALL, VANS).primary).toBe('test')
  })

  it('is to move them where none needs anything of these', () => {
    expect(selectionOffer([usual], ALL, VANS)).toEqual({ primary: 'move', others: ['plan', 'label', 'ship', 'test'] })
  })

  it('is nothing that the person may not do', () => {
    expect(selectionOffer([full], new Set(['move']), VANS)).toEqual({ primary: 'move', others: [] })
    expect(selectionOffer([full, full, late], new Set(['test', 'label']), VANS)).toEqual({ primary: 'test', others: ['label'] })
    expect(selectionOffer([full], new Set(), VANS)).toEqual({ primary: null, others: [] })
  })
})

it('takes the chosen cylinders along to the screen that does it', () => {
  expect(SELECTION_ACTS.map(act => selectionPath(act, ['a', 'b']))).toEqual([
    '/retests?with=a,b', '/shipments?with=a,b', '/labels?cylinders=a,b', '/batch?act=move&expect=a,b', '/plans?with=a,b',
  ])
})

it('leads the next step of one cylinder to its list or label, or to its page', () => {
  expect(stepPath(full, ALL)).toBe(`/shipments?with=${full.id}`)
  expect(stepPath(full, new Set(['move']))).toBe('/c/7k3m9q2tx')
  expect(stepPath(usual, ALL)).toBe('/c/7k3m9q2tx')
})
