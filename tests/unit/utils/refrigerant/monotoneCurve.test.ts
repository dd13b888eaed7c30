import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { CurvePoint } from '~~/utils/refrigerant/monotoneCurve'
import { curveThrough, valueOnCurve as valueOn, whereOnCurve } from '~~/utils/refrigerant/monotoneCurve'

function valueOnCurve(points: readonly CurvePoint[], x: number): number {
  return valueOn(curveThrough(points), x)
}

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

describe('where a curve has a value', () => {
  const rising = curveThrough(STEPS)
  const falling = curveThrough(STEPS.map(({ x, y }) => ({ x, y: -y })))

  it('is the point of a row that has it', () => {
    for (const { x, y } of STEPS) {
      expect(whereOnCurve(rising, y)).toBe(x)
      expect(whereOnCurve(falling, -y)).toBe(x)
    }
  })

  it('is where the curve has it elsewhere, rising or falling', () => {
    fc.assert(fc.property(fc.double({ min: 0, max: 4, noNaN: true }), (y) => {
      expect(valueOn(rising, whereOnCurve(rising, y))).toBeCloseTo(y, 12)
      expect(whereOnCurve(falling, -y)).toBe(whereOnCurve(rising, y))
    }))
  })

  it('is worked by hand on a straight line', () => {
    const line = curveThrough([{ x: 0, y: 12 }, { x: 1, y: 10 }, { x: 5, y: 2 }])
    expect(whereOnCurve(line, 7)).toBeCloseTo(2.5, 12)
    expect(whereOnCurve(line, 11.5)).toBeCloseTo(0.25, 12)
  })

  it('is the last one where the curve stays level', () => {
    const level = curveThrough([{ x: 0, y: 0 }, { x: 1, y: 3 }, { x: 2, y: 3 }, { x: 3, y: 3 }, { x: 4, y: 9 }])
    expect(whereOnCurve(level, 3)).toBe(3)
    expect(whereOnCurve(level, 2.999)).toBeLessThan(1)
    expect(whereOnCurve(level, 3.001)).toBeGreaterThan(3)
  })

  it('is nowhere for a value that the curve does not take', () => {
    for (const y of [-0.001, 4.001, Number.NaN]) expect(() => whereOnCurve(rising, y)).toThrow(RangeError)
  })
})

describe('the points of a curve', () => {
  it('are at least two, in rising order', () => {
    expect(() => curveThrough([{ x: 0, y: 1 }])).toThrow(RangeError)
    expect(() => curveThrough([{ x: 0, y: 1 }, { x: 0, y: 2 }])).toThrow(RangeError)
    expect(() => curveThrough([{ x: 1, y: 1 }, { x: 0, y: 2 }])).toThrow(RangeError)
    expect(valueOn(curveThrough([{ x: 0, y: 1 }, { x: 2, y: 2 }]), 1)).toBeCloseTo(1.5, 12)
  })
})
