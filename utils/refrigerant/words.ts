import type { GwpBasis } from './gwp'
import type { PressureClass } from './pressureClass'
import type { Refrigerant } from './types'

/** The pressure classes of 40 CFR 82.152 by name. */
export const PRESSURE_CLASS_NAMES: Record<PressureClass, string> = {
  'very-high': 'very high', 'high': 'high', 'medium': 'medium', 'low': 'low',
}

/**
 * A pressure class in a sentence.
 *
 * @example pressureClassInWords('very-high') // 'very high pressure'
 */
export function pressureClassInWords(pressureClass: PressureClass): string {
  return `${PRESSURE_CLASS_NAMES[pressureClass]} pressure`
}

/** What the basis of a GWP is called. */
export const GWP_BASIS_WORDS: Record<GwpBasis, string> = {
  'AR4': 'IPCC, fourth report (2007)',
  'AR5': 'IPCC, fifth report (2013)',
  'AR6': 'IPCC, sixth report (2021)',
  'exchange-value': 'US exchange value (40 CFR 84.64)',
  'EU-2024/573': 'EU 2024/573',
  'EU-517/2014': 'EU 517/2014, the one before',
}

/** The same where a column is narrow. */
export const GWP_BASIS_SHORT: Record<GwpBasis, string> = {
  'AR4': 'AR4', 'AR5': 'AR5', 'AR6': 'AR6', 'exchange-value': 'US', 'EU-2024/573': 'EU 2024', 'EU-517/2014': 'EU 2014',
}

const KIND_WORDS: Readonly<Record<string, string>> = {
  pure: 'single substance', zeotrope: 'blend, boils over a range', azeotrope: 'blend, boils as one',
}

/** What a refrigerant is, in the words of a table. */
export function kindInWords(kind: string): string {
  return KIND_WORDS[kind] ?? kind
}

/** What stands behind the figures of each accuracy group. */
export const ACCURACY_WORDS: Record<Refrigerant['accuracyGroup'], string> = {
  A: 'A single substance with an equation of state of its own.',
  B: 'A blend. Every pair of its parts was measured and fitted.',
  C: 'A blend. Some pairs of its parts were fitted from few measurements.',
  D: 'A blend. Some pairs of its parts have no published fit; that of a similar pair stands in.',
}

/** A GWP as it is written: whole from 10 on, below as far as it is known. */
export function formatGwp(value: number): string {
  return value < 10 ? String(Math.round(value * 1000) / 1000) : Math.round(value).toLocaleString('en-US')
}

/** Shares of a mixture in words. */
export function compositionInWords(composition: Refrigerant['composition']): string {
  return composition.map(({ component, massPercent }) => `${component}\u00A0${massPercent}\u00A0%`).join(', ')
}

/**
 * The name of a mixture that has no number of its own.
 *
 * Source: the form of ANSI/ASHRAE Standard 34 for blends without a number (from memory).
 *
 * @example mixtureName([{ component: 'R-32', massPercent: 50 }, { component: 'R-125', massPercent: 50 }]) // 'R-32/R-125 (50/50)'
 */
export function mixtureName(composition: Refrigerant['composition']): string {
  return `${composition.map(({ component }) => component).join('/')} (${composition.map(({ massPercent }) => massPercent).join('/')})`
}

/** What the safety class of a refrigerant means for a cylinder. */
export function safetyForCylinder({ safetyClass, flammable, toxic }: { safetyClass: string | null, flammable: boolean, toxic: boolean }): string[] {
  const unknown = safetyClass === null ? ['Its safety class is not known, so it counts as flammable and toxic.'] : []
  const burns = flammable
    ? ['It burns: only into a cylinder marked for flammables, with machines made for them (common practice, no source).']
    : ['Does not burn in air, by its class.']
  const poisons = toxic ? ['Class B, more toxic: a DOT-4E or DOT-39 may not hold it (49 CFR 173.304a(a)(1)).'] : []
  return [...unknown, ...burns, ...poisons]
}
