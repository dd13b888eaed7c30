import { describe, expect, it } from 'vitest'
import { withBurning, withName } from '../../../../utils/picture/refrigerantList'

const LINES = [
  { designation: 'R-32', flammable: true }, { designation: 'R-410A', flammable: false }, { designation: 'R-1234ze(E)', flammable: true },
]

describe('finding a refrigerant in the list', () => {
  it.each([['410', ['R-410A']], ['r 410a', ['R-410A']], ['R410A', ['R-410A']], ['ze(e)', ['R-1234ze(E)']], ['', ['R-32', 'R-410A', 'R-1234ze(E)']], ['999', []]])(
    '"%s" finds %j', (typed, designations) => {
      expect(withName(LINES, typed).map(line => line.designation)).toEqual(designations)
    })

  it('leaves those that burn, those that do not, or all', () => {
    expect(withBurning(LINES, 'burns').map(line => line.designation)).toEqual(['R-32', 'R-1234ze(E)'])
    expect(withBurning(LINES, 'does-not-burn').map(line => line.designation)).toEqual(['R-410A'])
    expect(withBurning(LINES, 'all')).toHaveLength(3)
  })
})
