import type { Day } from './day'

/** Whether a scale's last check can be counted on: not older than a year, or 'old', or nobody knows of one. Our own threshold. */
export type ScaleCheck = 'in-date' | 'old' | 'unknown'

/** How a scale's last check stands on a day: on the day a year after it, it still counts. */
export function scaleCheck(lastCheckOn: Day | null, today: Day): ScaleCheck {
  if (lastCheckOn === null) return 'unknown'
  const yearBefore = `${String(Number(today.slice(0, 4)) - 1).padStart(4, '0')}${today.slice(4)}`
  return lastCheckOn < yearBefore ? 'old' : 'in-date'
}
