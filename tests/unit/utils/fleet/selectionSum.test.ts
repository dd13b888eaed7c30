import { describe, expect, it } from 'vitest'
import { selectionSum } from '../../../../utils/fleet/selectionSum'
import { cylinderRow } from '../../../helpers/cylinderRow'

describe('the sum of chosen cylinders', () => {
  it('adds what is weighed and counts what is not', () => {
    const sum = selectionSum([cylinderRow({ netGrams: 1000 }), cylinderRow({ netGrams: 0 }), cylinderRow({ netGrams: null })])
    expect(sum).toEqual({ count: 3, netGrams: 1000, grossGrams: 25_948, refrigerant: 'R-410A', withoutWeight: 1 })
  })

  it('has no weight, not one of nothing, where none is known', () => {
    expect(selectionSum([cylinderRow({ netGrams: null })]).netGrams).toBeNull()
  })

  it('names the refrigerant only where there is one', () => {
    expect(selectionSum([cylinderRow(), cylinderRow({ refrigerant: 'R-22' })]).refrigerant).toBeNull()
    expect(selectionSum([cylinderRow(), cylinderRow({ nothingInIt: true, refrigerant: null, netGrams: null })]).refrigerant).toBe('R-410A')
  })
})
