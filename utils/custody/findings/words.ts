import { formatMass, type MassRounding } from '../../quantity/mass'

/** The source of what the trade does without a text to point at. */
export const COMMON_PRACTICE = 'common practice, no source'

/** What rests on how this log is kept, not on a rule from outside. */
export const OWN_RULE = 'the rules of this log'

/** A mass in both units, for whoever reads it. */
export function massWords(grams: number, rounding: MassRounding): string {
  return `${formatMass(grams, 'lb', rounding)} (${formatMass(grams, 'kg', rounding)})`
}

/** What somebody typed, closed like a sentence. */
export function sentence(typed: string): string {
  return /[.!?]$/.test(typed) ? typed : `${typed}.`
}

/** The instant since when a finding stands, or null. */
export function sinceText(ms: number | null): string | null {
  return ms === null ? null : new Date(ms).toISOString()
}
