import { MM_PER_INCH } from './stock'

/** No cylinder that is labelled is narrower or wider. Units: millimetres. */
export const LEAST_DIAMETER_MM = 50
export const MOST_DIAMETER_MM = 2000

/** Below it a label is stuck on with its long edge along the cylinder, and vinyl follows the curve better than polyester. */
export const NARROW_MM = 150

/** How wide cylinders commonly are, by their water capacity. Source: from memory; measure yours. */
export const COMMON_DIAMETERS: readonly { inches: number, waterCapacity: string }[] = [
  { inches: 4, waterCapacity: 'WC about 5 lb' },
  { inches: 6, waterCapacity: 'WC about 12 lb' },
  { inches: 9, waterCapacity: 'WC about 26 lb' },
  { inches: 12, waterCapacity: 'WC about 48 lb' },
  { inches: 14, waterCapacity: 'WC about 123 lb' },
  { inches: 30, waterCapacity: 'WC about 1,000 lb' },
]

/**
 * A diameter typed in inches, in millimetres; null where it is none that a labelled cylinder has.
 *
 * @example diameterOf('9') // 228.6
 */
export function diameterOf(inches: string): number | null {
  const typed = inches.trim().replace(',', '.')
  if (!/^\d+(\.\d+)?$/.test(typed)) return null
  const mm = Math.round(Number(typed) * MM_PER_INCH * 10) / 10
  return mm >= LEAST_DIAMETER_MM && mm <= MOST_DIAMETER_MM ? mm : null
}
