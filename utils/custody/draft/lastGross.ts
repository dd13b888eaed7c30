import { readingGrams, type MassReading } from '../../quantity/mass'
import type { CylinderView, LogLine } from '../cylinderView'

/** What was entered and what the scale showed agree, but for the rounding to whole grams of tare and reading. */
const ROUNDING_GRAMS = 1

/**
 * The last gross in the log as it was entered, where it still tells what is in the cylinder; else null.
 *
 * Shape: the log's lines, newest first.
 */
export function lastGross(view: CylinderView, lines: readonly LogLine[]): MassReading | null {
  const { netGrams, basis } = view.contents
  const tareGrams = view.stamp?.tareWeightGrams ?? null
  if (netGrams === null || tareGrams === null || basis !== 'weighed') return null
  for (const line of lines) {
    const reading = line.correction ? null : grossOf(line.details)
    if (reading && Math.abs(readingGrams(reading) - tareGrams - netGrams) <= ROUNDING_GRAMS) return reading
  }
  return null
}

function grossOf(details: unknown): MassReading | null {
  const { gross, grossAfter } = Object(details) as { gross?: MassReading, grossAfter?: MassReading }
  return grossAfter ?? gross ?? null
}
