import { describe, expect, it } from 'vitest'
import { requestUnits } from '~~/utils/custody/requestUnits'

const id = (end: string) => `0198f000-0000-7000-8000-0000000000${end}`
const half = (cylinder: string, other: string, pair: unknown) => ({ kind: 'transferred', cylinderId: id(cylinder), details: { counterpartId: id(other), transferId: pair } })
const alone = { kind: 'weighed', cylinderId: id('c1'), details: {} }

describe('what is stored together of one request', () => {
  it('is each event alone, but the halves of a pair, however far apart they stand', () => {
    expect(requestUnits([alone, half('c1', 'c2', id('d1')), alone, half('c2', 'c1', id('d1')), half('c1', 'c2', id('d2'))])).toEqual([[0], [1, 3], [2], [4]])
  })

  it('knows a pair by its id in any case, and an exchange as well', () => {
    expect(requestUnits([half('c1', 'c2', id('d1')), half('c2', 'c1', id('d1').toUpperCase())])).toEqual([[0, 1]])
    const exchanged = (cylinder: string, other: string) => ({ kind: 'exchanged', cylinderId: id(cylinder), details: { otherCylinderId: id(other), exchangeId: id('d3') } })
    expect(requestUnits([exchanged('c1', 'c2'), exchanged('c2', 'c1')])).toEqual([[0, 1]])
  })

  it('knows a malformed half by its pair, by the cylinder it names, or by who names its own', () => {
    expect(requestUnits([half('c1', 'c2', id('d1')), { kind: 'transfered', details: { transferId: id('d1') } }])).toEqual([[0, 1]])
    expect(requestUnits([half('c1', 'c2', id('d1')), half('c2', 'c1', 'no id')])).toEqual([[0, 1]])
    expect(requestUnits([half('c1', 'c2', undefined), half('c2', 'x', id('d1'))])).toEqual([[0, 1]])
    expect(requestUnits([half('c1', 'c2', 7), half('c3', 'c4', id('d1'))])).toEqual([[0], [1]])
  })

  it('takes what is no event at all as one alone', () => {
    expect(requestUnits([null, 'x', 3, {}, { details: null }])).toEqual([[0], [1], [2], [3], [4]])
  })
})
