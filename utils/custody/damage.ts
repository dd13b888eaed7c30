/**
 * What an outside look may find that asks for a test before the next fill, whatever the date.
 *
 * Source: 49 CFR 180.205(d)(1) to (3): dents, corrosion, cracked or abraded areas, leakage, thermal damage, an accident,
 * overheating; 49 CFR 180.209(c) adds bulges on a 4-series cylinder. Gouges and valve damage: common practice, no source.
 */
export const DAMAGE_REASONS = [
  'dent', 'bulge', 'gouge', 'crack', 'abrasion', 'corrosion', 'leak', 'heat', 'valve', 'accident', 'other',
] as const

export type DamageReason = (typeof DAMAGE_REASONS)[number]

/** What was found, as the trade says it. */
export const DAMAGE_WORDS: Record<DamageReason, string> = {
  dent: 'dent',
  bulge: 'bulge',
  gouge: 'gouge or cut',
  crack: 'crack',
  abrasion: 'worn area',
  corrosion: 'corrosion',
  leak: 'leak',
  heat: 'heat or fire',
  valve: 'valve or guard damaged',
  accident: 'fall or accident',
  other: 'other damage',
}

/** Some of them in a row; empty where none is known. */
export function damageInWords(reasons: readonly DamageReason[]): string {
  return DAMAGE_REASONS.filter(reason => reasons.includes(reason)).map(reason => DAMAGE_WORDS[reason]).join(', ')
}
