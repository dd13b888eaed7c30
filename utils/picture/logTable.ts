import type { LogLine } from '../custody/cylinderView'
import { daysBetween } from '../quantity/instant'

/** Days without an event that are drawn as a gap. */
const GAP_DAYS = 30

/** A stretch of time in which nothing was heard of a cylinder. */
export interface LogGap { days: number, fromMs: number, toMs: number }

/**
 * The gap that lies before a line in time, or null where it is short.
 *
 * Shape: the lines newest first; the line at `index` is the end of the gap.
 */
export function gapBefore(lines: readonly LogLine[], index: number, timeZone: string): LogGap | null {
  const [line, earlier] = [lines[index], lines[index + 1]]
  if (!line || !earlier) return null
  const [fromMs, toMs] = [Date.parse(earlier.effectiveAt), Date.parse(line.effectiveAt)]
  const days = daysBetween(fromMs, toMs, timeZone)
  return days > GAP_DAYS ? { days, fromMs, toMs } : null
}

/** How much later than it happened an event was recorded, in milliseconds; null below an hour. */
export function lateBy(line: LogLine): number | null {
  const late = Date.parse(line.recordedAt) - Date.parse(line.effectiveAt)
  return late >= 3_600_000 ? late : null
}
