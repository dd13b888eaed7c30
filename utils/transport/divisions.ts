import type { Division } from '../refrigerant/data/unEntries'

/** What a division of Class 2 is called. Source: 49 CFR 173.115. */
export const DIVISION_WORDS: Readonly<Record<Division, string>> = {
  2.1: 'flammable gas',
  2.2: 'non-flammable gas',
  2.3: 'gas poisonous by inhalation',
}
