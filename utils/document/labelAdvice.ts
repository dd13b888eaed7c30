/**
 * What to mind before a label is stuck on, for the printing screen.
 *
 * Source: general notes of label makers on acrylic adhesives and film (from memory); that frost and oil undo a label is
 * common practice, no source.
 */
export const LABEL_ADVICE: readonly string[] = [
  'Dry and free of oil: wipe the place with isopropyl alcohol and let it dry.',
  'At least 50\u00A0°F is best, and not under 40\u00A0°F. A frosted cylinder waits until the next day.',
  'One on the collar or guard, one on the upper body; never over the stamp, a relief device or under a strap.',
  'Press it down all over. It holds fully after about a day.',
]

/** How to print so that the symbol keeps its size. */
export const PRINT_ADVICE = 'Scale 100 %, margins none, headers off.'
