import { nearestToDivision, readingGrams, type MassReading, type MassUnit } from '../../quantity/mass'
import type { CylinderView, LogLine } from '../cylinderView'

/** What was entered and what the scale showed agree, but for the rounding to whole grams of tare and reading. */
const ROUNDING_GRAMS = 1

/**
 * The last gross in the log as it was entered, where it still tells what is in the cylinder; else null.
 *
 * Shape: the log's lines, newest first.
 */
export function lastGross(view: CylinderView, lines: readonly LogLine[]): MassReading | null {
  const grams = weighedGrossGrams(view)
  if (grams === null) return null
  for (const line of lines) {
    const reading = line.correction ? null : grossOf(line.details)
    if (reading && isSame(reading, grams)) return reading
  }
  return null
}

/**
 * The same where the log is not at hand: the reading of a scale that gives the weighed net, in this unit or else in
 * whichever gives it; null where the net was not weighed.
 *
 * Rounding: to the whole gram. @example 18,144 g in pounds // 40.0 lb
 */
export function lastGrossByNet(view: CylinderView, unit: MassUnit): MassReading | null {
  const grams = weighedGrossGrams(view)
  if (grams === null) return null
  const units: MassUnit[] = [unit, 'lb', 'lb-oz', 'kg']
  return units.map(each => nearestToDivision(grams, each)).find(reading => isSame(reading, grams)) ?? { unit: 'kg', value: grams / 1000 }
}

function weighedGrossGrams({ contents, stamp }: CylinderView): number | null {
  const tareGrams = stamp?.tareWeightGrams ?? null
  return contents.netGrams === null || tareGrams === null || contents.basis !== 'weighed' ? null : tareGrams + contents.netGrams
}

function isSame(reading: MassReading, grams: number): boolean {
  return Math.abs(readingGrams(reading) - grams) <= ROUNDING_GRAMS
}

function grossOf(details: unknown): MassReading | null {
  const { gross, grossAfter } = Object(details) as { gross?: MassReading, grossAfter?: MassReading }
  return grossAfter ?? gross ?? null
}
