import { describe, expect, it } from 'vitest'
import { changeFleetAddress, readFleetAddress } from '../../../../utils/fleet/fleetAddress'

describe('the address of a fleet list', () => {
  it('asks for the most urgent hundred where it says nothing', () => {
    expect(readFleetAddress({})).toEqual({ limit: 100, sort: 'urgency', order: 'asc' })
  })

  it('leaves out what it cannot read, so that an old address still opens', () => {
    expect(readFleetAddress({ sort: 'colour', place: 'van 12', dueBefore: '2027-13', finding: 'overfill', unheard: 'of' }))
      .toEqual({ limit: 100, sort: 'urgency', order: 'asc', finding: 'overfill' })
  })

  it('begins at the first page again when the question changes, and keeps the other filters', () => {
    expect(changeFleetAddress({ refrigerant: 'R-22', cursor: 'abc', sort: 'net' }, { finding: 'not-seen' }))
      .toEqual({ refrigerant: 'R-22', sort: 'net', finding: 'not-seen' })
  })

  it('clears one filter, and turns the page', () => {
    expect(changeFleetAddress({ refrigerant: 'R-22', q: 'K48' }, { q: null })).toEqual({ refrigerant: 'R-22' })
    expect(changeFleetAddress({ refrigerant: 'R-22' }, { cursor: 'next' })).toEqual({ refrigerant: 'R-22', cursor: 'next' })
  })
})
