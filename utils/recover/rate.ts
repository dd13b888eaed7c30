import { exactGrams } from '../quantity/mass'
import type { WayReading } from './readings'

// How many readings tell a rate, over what span, and for how long: our choice.
const MOST_LOOKED_AT = 6
const LEAST_READINGS = 3
const LEAST_SPAN_MS = 60_000
const OLDEST_MS = 15 * 60_000
/** Two divisions of a scale that shows 0.1 lb: less may be its flicker. Our choice. */
const LEAST_GAIN_GRAMS = exactGrams({ unit: 'lb', value: 0.2 })
const MS_PER_MINUTE = 60_000
/** Longer than a working day nobody plans by. Our choice. */
const MOST_MINUTES = 600

/**
 * Minutes until the scale shows the stop weight at the present rate; null where the readings do not tell.
 *
 * The rate is the median of the rates between any two of the last six readings, of two in the middle the faster one:
 * a single slip of the finger does not move it. Nothing is said by fewer than three readings, within less than a minute,
 * by a gain within the scale's flicker, or where the last one is older than a quarter of an hour.
 *
 * Units: grams, UTC milliseconds. Rounding: down, less what has passed since the last reading; never below 0.
 */
export function minutesToStop(readings: readonly WayReading[], stopGrams: number, nowMs: number): number | null {
  const looked = readings.slice(-MOST_LOOKED_AT).map(({ at, gross }) => ({ atMs: Date.parse(at), grams: exactGrams(gross) }))
  const [first, last] = [looked[0], looked.at(-1)]
  if (!first || !last || looked.length < LEAST_READINGS) return null
  const passedMs = Math.max(0, nowMs - last.atMs)
  if (last.atMs - first.atMs < LEAST_SPAN_MS || passedMs > OLDEST_MS || last.grams - first.grams < LEAST_GAIN_GRAMS) return null
  const rate = medianRate(looked)
  if (rate <= 0 || last.grams >= stopGrams) return null
  const minutes = Math.floor(((stopGrams - last.grams) / rate - passedMs) / MS_PER_MINUTE)
  return minutes > MOST_MINUTES ? null : Math.max(0, minutes)
}

function medianRate(weights: readonly { atMs: number, grams: number }[]): number {
  const rates = weights
    .flatMap((from, index) => weights.slice(index + 1).map(to => ({ ms: to.atMs - from.atMs, grams: to.grams - from.grams })))
    .filter(({ ms }) => ms > 0)
    .map(({ ms, grams }) => grams / ms)
    .sort((a, b) => a - b)
  return rates[Math.floor(rates.length / 2)] ?? 0
}
