import { describe, expect, it } from 'vitest'
import { selectionSum } from '../../../../utils/fleet/selectionSum'
import { cylinderRow } from '../../../helpers/cylinderRow'

describe('the sum of chosen cylinders', () => {
  // Tare 12474 g each; gross 12474 + 1000 and 12474 + 0.
  it('adds what is weighed and counts what is not', () => {
    const sum = selectionSum([cylinderRow({ netGrams: 1000 }), cylinderRow({ netGrams: 0 }), cylinderRow({ netGrams: null })])
    expect(sum).toEqual({ count: 3, netGrams: 1000, contents: [{ refrigerant: 'R-410A', count: 3, netGrams: 1000 }], grossGrams: 25_948, withoutWeight: 1 })
  })

  it('has no weight, not one of nothing, where none is known', () => {
    expect(selectionSum([cylinderRow({ netGrams: null })])).toMatchObject({ netGrams: null, contents: [{ netGrams: null }], grossGrams: null })
  })

  it('keeps refrigerants apart, the one in the most cylinders first', () => {
    const r22 = cylinderRow({ refrigerant: 'R-22', netGrams: 500 })
    const sum = selectionSum([cylinderRow({ netGrams: 1000 }), r22, r22, cylinderRow({ refrigerant: null, netGrams: 70 })])
    expect(sum.contents).toEqual([
      { refrigerant: 'R-22', count: 2, netGrams: 1000 }, { refrigerant: 'R-410A', count: 1, netGrams: 1000 }, { refrigerant: null, count: 1, netGrams: 70 },
    ])
  })

  it('counts an empty cylinder to no refrigerant', () => {
    const sum = selectionSum([cylinderRow({ nothingInIt: true, refrigerant: null, netGrams: 0 })])
    expect(sum).toMatchObject({ count: 1, contents: [], withoutWeight: 0 })
  })
})
