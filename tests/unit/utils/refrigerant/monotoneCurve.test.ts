import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { valueOnCurve } from '~~/utils/refrigerant/monotoneCurve'

const STEPS = [{ x: 0, y: 0 }, { x: 1, y: 1 }, { x: 3, y: 1.5 }, { x: 4, y: 4 }]

describe('a curve through the rows of a table', () => {
  it('meets every row', () => {
    for (const { x, y } of STEPS) expect(valueOnCurve(STEPS, x)).toBeCloseTo(y, 12)
  })

  it('gives a straight line back', () => {
    const line = [{ x: 0, y: 2 }, { x: 1, y: 4 }, { x: 4, y: 10 }, { x: 5, y: 12 }]
    expect(valueOnCurve(line, 2.5)).toBeCloseTo(7, 12)
    expect(valueOnCurve(line, 0.25)).toBeCloseTo(2.5, 12)
  })

  it('weighs the neighbouring slopes harmonically, worked by hand', () => {
    // Between (1, 1) and (2, 4) of y = x squared at 0, 1, 2, 3: slopes 2/(1/1+1/3) = 1.5 and 2/(1/3+1/5) = 3.75;
    // at the middle (1 + 4)/2 + (1.5 - 3.75)/8 = 2.21875.
    const square = [0, 1, 2, 3].map(x => ({ x, y: x * x }))
    expect(valueOnCurve(square, 1.5)).toBeCloseTo(2.21875, 12)
  })

  it('weighs the slopes by the widths where rows stand unevenly, worked by hand', () => {
    // Slopes 1, 3, 3 over widths 1, 2, 1; at 1: (5 + 4) / (5/1 + 4/3) = 27/19; at 3: 3; at the middle
    // (1 + 7)/2 + 2 x (27/19 - 3)/8 = 274/76.
    const uneven = [{ x: 0, y: 0 }, { x: 1, y: 1 }, { x: 3, y: 7 }, { x: 4, y: 10 }]
    expect(valueOnCurve(uneven, 2)).toBeCloseTo(274 / 76, 12)
  })

  it('takes three points for the slope at an end, worked by hand', () => {
    // At 0: (3 x 1 - 3) / 2 = 0, held at 0; at 1: 1.5; at the middle 1/2 + (0 - 1.5)/8 = 0.3125.
    const square = [0, 1, 2, 3].map(x => ({ x, y: x * x }))
    expect(valueOnCurve(square, 0.5)).toBeCloseTo(0.3125, 12)
    // At 3: (3 x 5 - 3) / 2 = 6; at 2: 3.75; at the middle (4 + 9)/2 + (3.75 - 6)/8 = 6.21875.
    expect(valueOnCurve(square, 2.5)).toBeCloseTo(6.21875, 12)
  })

  it('never turns between rows that rise', () => {
    fc.assert(fc.property(fc.double({ min: 0, max: 4, noNaN: true }), fc.double({ min: 0, max: 4, noNaN: true }), (a, b) => {
      const [low, high] = a < b ? [a, b] : [b, a]
      expect(valueOnCurve(STEPS, low)).toBeLessThanOrEqual(valueOnCurve(STEPS, high) + 1e-12)
    }))
  })

  it('says nothing outside its rows', () => {
    expect(() => valueOnCurve(STEPS, -0.001)).toThrow(RangeError)
    expect(() => valueOnCurve(STEPS, 4.001)).toThrow(RangeError)
    expect(() => valueOnCurve(STEPS, Number.NaN)).toThrow(RangeError)
  })
})
