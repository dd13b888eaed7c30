/** A point of a curve; the points of one curve stand in rising order of x. */
export type CurvePoint = { x: number, y: number }

/** A smooth curve through points, with its slope at each of them. Made once by {@link curveThrough} and never changed. */
export type Curve = { readonly x: readonly number[], readonly y: readonly number[], readonly slope: readonly number[] }

/**
 * The smooth curve through all points that never turns between them.
 *
 * Errors: RangeError where there are fewer than two points, or x does not rise.
 * Source: monotone piecewise cubic Hermite interpolation (Fritsch and Carlson, SIAM J. Numer. Anal. 17 (1980) 238), inner
 * slopes by the weighted harmonic mean (Fritsch and Butland, SIAM J. Sci. Stat. Comput. 5 (1984) 300), end slopes from three points.
 */
export function curveThrough(points: readonly CurvePoint[]): Curve {
  const x = points.map(point => point.x)
  const y = points.map(point => point.y)
  const widths = x.slice(1).map((right, index) => right - at(x, index))
  if (widths.length === 0 || !widths.every(width => width > 0)) throw new RangeError('A curve needs two points and a rising x')
  const secants = widths.map((width, index) => (at(y, index + 1) - at(y, index)) / width)
  return { x, y, slope: x.map((_, index) => slopeAt(widths, secants, index)) }
}

/**
 * The value of a curve at x.
 *
 * Errors: RangeError outside the points, because nothing is known there.
 */
export function valueOnCurve(curve: Curve, x: number): number {
  const last = curve.x.length - 1
  if (!(x >= at(curve.x, 0) && x <= at(curve.x, last))) throw new RangeError(`Outside the curve: ${x}`)
  const left = lastIndex(last - 1, index => at(curve.x, index) <= x)
  return valueInSegment(curve, left, (x - at(curve.x, left)) / (at(curve.x, left + 1) - at(curve.x, left)))
}

/**
 * The x at which a curve that only rises or only falls has a value; the last one where it stays level.
 *
 * Rounding: to the last digits of a double.
 * Errors: RangeError where the value is not between those of the first and the last point.
 */
export function whereOnCurve(curve: Curve, y: number): number {
  const last = curve.y.length - 1
  const sign = at(curve.y, last) >= at(curve.y, 0) ? 1 : -1
  if (!(sign * y >= sign * at(curve.y, 0) && sign * y <= sign * at(curve.y, last))) throw new RangeError(`Not on the curve: ${y}`)
  const left = lastIndex(last, index => sign * at(curve.y, index) <= sign * y)
  if (left === last || at(curve.y, left) === y) return at(curve.x, left)
  const t = shareOfSegment(curve, left, y, sign)
  return at(curve.x, left) + t * (at(curve.x, left + 1) - at(curve.x, left))
}

// Cubic of Hermite over 0 <= t <= 1.
function valueInSegment(curve: Curve, left: number, t: number): number {
  const h = at(curve.x, left + 1) - at(curve.x, left)
  return at(curve.y, left) * (1 + 2 * t) * (1 - t) ** 2 + h * at(curve.slope, left) * t * (1 - t) ** 2
    + at(curve.y, left + 1) * t ** 2 * (3 - 2 * t) + h * at(curve.slope, left + 1) * t ** 2 * (t - 1)
}

// More than the halvings that bring 0..1 under the spacing of doubles; tangents need about four.
const MOST_STEPS = 60

// Tangents where they stay between the bounds found so far, halves where they would not.
function shareOfSegment(curve: Curve, left: number, y: number, sign: number): number {
  const h = at(curve.x, left + 1) - at(curve.x, left)
  const rise = at(curve.y, left + 1) - at(curve.y, left)
  const linear = h * at(curve.slope, left)
  const atEnd = h * at(curve.slope, left + 1)
  const squared = 3 * rise - 2 * linear - atEnd
  const cubed = linear + atEnd - 2 * rise
  const target = y - at(curve.y, left)
  let low = 0
  let high = 1
  let t = target / rise
  for (let step = 0; step < MOST_STEPS; step++) {
    const excess = ((cubed * t + squared) * t + linear) * t - target
    if (sign * excess > 0) high = t
    else low = t
    const tangent = t - excess / ((3 * cubed * t + 2 * squared) * t + linear)
    const next = tangent > low && tangent < high ? tangent : (low + high) / 2
    if (Math.abs(next - t) <= Number.EPSILON) return next
    t = next
  }
  return t
}

/** The last index from 0 to `last` that meets a condition which the first meets and none meets after one that fails. */
function lastIndex(last: number, meets: (index: number) => boolean): number {
  let low = 0
  let high = last + 1
  while (high - low > 1) {
    const middle = (low + high) >> 1
    if (meets(middle)) low = middle
    else high = middle
  }
  return low
}

function slopeAt(widths: readonly number[], secants: readonly number[], index: number): number {
  const last = secants.length
  if (last === 1) return at(secants, 0)
  if (index === 0) return endSlope(at(widths, 0), at(widths, 1), at(secants, 0), at(secants, 1))
  if (index === last) return endSlope(at(widths, last - 1), at(widths, last - 2), at(secants, last - 1), at(secants, last - 2))
  const before = at(secants, index - 1)
  const after = at(secants, index)
  if (before * after <= 0) return 0
  const h0 = at(widths, index - 1)
  const h1 = at(widths, index)
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

function at(values: readonly number[], index: number): number {
  return values[index] as number
}
