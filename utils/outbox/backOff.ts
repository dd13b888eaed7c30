/** How long it is waited before the next try, longer each time. Units: milliseconds. Our choice. */
const WAITS_MS = [5_000, 15_000, 60_000, 300_000]

/** How long is waited after so many tries in a row that failed. Units: milliseconds. */
export function waitAfter(failures: number): number {
  return WAITS_MS[Math.min(Math.max(failures, 1), WAITS_MS.length) - 1]!
}
