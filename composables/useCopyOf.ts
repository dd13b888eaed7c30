/**
 * Of when the copy on this device was from which the last answers came; null while the server answers.
 *
 * Units: UTC milliseconds.
 */
export function useCopyOf() {
  return useState<number | null>('copy-of', () => null)
}
