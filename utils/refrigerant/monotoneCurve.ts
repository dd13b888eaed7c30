/** A point of a curve; the points of one curve stand in rising order of x. */
export type CurvePoint = { x: number, y: number }

/**
 * The value of a smooth curve through all points that never turns between them.
 *
 * Errors: RangeError outside the points, because nothing is known there.
 * Source: monotone piecewise cubic Hermite interpolation (Fritsch and Carlson, SIAM J. Numer. Anal. 17 (1980) 238), inner
 * slopes by the weighted harmonic mean (Fritsch and Butland, SIAM J. Sci. Stat. Comput. 5 (1984) 300), end slopes from three points.
 */
export function valueOnCurve(points: readonly CurvePoint[], x: number): number {
  const left = indexLeftOf(points, x)
  const a = pointAt(points, left)
  const b = pointAt(points, left + 1)
  const h = b.x - a.x
  const t = (x - a.x) / h
  const slopeA = slopeAt(points, left)
  const slopeB = slopeAt(points, left + 1)
  return a.y * (1 + 2 * t) * (1 - t) ** 2 + h * slopeA * t * (1 - t) ** 2
    + b.y * t ** 2 * (3 - 2 * t) + h * slopeB * t ** 2 * (t - 1)
}

function indexLeftOf(points: readonly CurvePoint[], x: number): number {
  const last = points.length - 1
  if (!(x >= pointAt(points, 0).x && x <= pointAt(points, last).x)) throw new RangeError(`Outside the curve: ${x}`)
  let low = 0
  let high = last
  while (high - low > 1) {
    const middle = (low + high) >> 1
    if (pointAt(points, middle).x <= x) low = middle
    else high = middle
  }
  return low
}

function slopeAt(points: readonly CurvePoint[], index: number): number {
  const last = points.length - 1
  if (last === 1) return secant(points, 0)
  if (index === 0) return endSlope(width(points, 0), width(points, 1), secant(points, 0), secant(points, 1))
  if (index === last) {
    return endSlope(width(points, last - 1), width(points, last - 2), secant(points, last - 1), secant(points, last - 2))
  }
  const before = secant(points, index - 1)
  const after = secant(points, index)
  if (before * after <= 0) return 0
  const h0 = width(points, index - 1)
  const h1 = width(points, index)
  const weightBefore = 2 * h1 + h0
  const weightAfter = h1 + 2 * h0
  return (weightBefore + weightAfter) / (weightBefore / before + weightAfter / after)
}

// The three-point slope, held back where it would turn the curve.
function endSlope(h0: number, h1: number, secant0: number, secant1: number): number {
  const slope = ((2 * h0 + h1) * secant0 - h0 * secant1) / (h0 + h1)
  if (slope * secant0 <= 0) return 0
  if (secant0 * secant1 <= 0 && Math.abs(slope) > 3 * Math.abs(secant0)) return 3 * secant0
  return slope
}

function width(points: readonly CurvePoint[], index: number): number {
  return pointAt(points, index + 1).x - pointAt(points, index).x
}

function secant(points: readonly CurvePoint[], index: number): number {
  return (pointAt(points, index + 1).y - pointAt(points, index).y) / width(points, index)
}

function pointAt(points: readonly CurvePoint[], index: number): CurvePoint {
  const point = points[index]
  if (point === undefined) throw new RangeError('A curve needs at least two points')
  return point
}
