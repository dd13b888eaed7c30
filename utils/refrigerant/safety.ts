const FLAMMABLE_CLASSES: ReadonlySet<string> = new Set(['A2L', 'A2', 'A3', 'B2L', 'B2', 'B3'])

/**
 * Whether a refrigerant of a safety class may only go into a cylinder marked for flammables; an unknown class counts as flammable.
 *
 * Source: ANSI/ASHRAE Standard 34, safety groups.
 */
export function isFlammable(safetyClass: string | null): boolean {
  return safetyClass === null || FLAMMABLE_CLASSES.has(safetyClass)
}

/**
 * Whether a safety class is of the higher toxicity (B); an unknown class counts as toxic.
 *
 * Source: ANSI/ASHRAE Standard 34, safety groups.
 */
export function isToxic(safetyClass: string | null): boolean {
  return safetyClass === null || safetyClass.startsWith('B')
}
