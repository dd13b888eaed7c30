import { exactGrams } from './mass'

/** A scale of the firm, with how far its reading may be off: the larger of its grams and its percent. */
export type Scale = { id: string, name: string, accuracyGrams: number, accuracyPercent: number, lastCheck: string | null }

/** The smallest weight a scale is good to, as its data sheet has it. */
export type ScaleStep = { unit: 'g' | 'oz' | 'lb' | 'kg', value: number }

/** How far a reading without a named scale may be off. Source: what refrigerant charging scales commonly state, from memory. */
export const DEFAULT_ACCURACY: { step: ScaleStep, percent: number } = { step: { unit: 'oz', value: 0.5 }, percent: 0.5 }

// Keeps 15.000000000000002 from becoming 16.
const FLOAT_NOISE_GRAMS = 1e-9

/** How far a gross weight may be off, in grams; without a scale the firm's default. Rounding: up to the whole gram. */
export function scaleAccuracyGrams(grossGrams: number, scale?: Scale): number {
  const grams = scale?.accuracyGrams ?? exactStepGrams(DEFAULT_ACCURACY.step)
  const percent = scale?.accuracyPercent ?? DEFAULT_ACCURACY.percent
  return wholeGramsUp(Math.max(grams, Math.abs(grossGrams) * percent / 100))
}

/** A step as a scale keeps it. Rounding: up to the whole gram. */
export function stepGrams(step: ScaleStep): number {
  return wholeGramsUp(exactStepGrams(step))
}

function exactStepGrams({ unit, value }: ScaleStep): number {
  switch (unit) {
    case 'g': return value
    case 'oz': return exactGrams({ unit: 'lb-oz', lb: 0, oz: value })
    case 'lb':
    case 'kg': return exactGrams({ unit, value })
  }
}

function wholeGramsUp(grams: number): number {
  return Math.max(0, Math.ceil(grams - FLOAT_NOISE_GRAMS))
}
