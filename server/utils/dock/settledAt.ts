/** A clock that is off by less is taken as right. */
const SKEW_IGNORED_MS = 60_000

/**
 * When an entry was made: by the phone's clock, set right where that says how it stands; never before the link was made,
 * nor after now. Units: UTC milliseconds.
 */
export function settledAt(at: string, { deviceNow, now, earliest }: { deviceNow?: string, now: number, earliest: number }): number {
  const skew = deviceNow === undefined ? 0 : Date.parse(deviceNow) - now
  const right = Date.parse(at) - (Math.abs(skew) < SKEW_IGNORED_MS ? 0 : skew)
  return Math.min(now, Math.max(earliest, right))
}
