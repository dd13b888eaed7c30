import type { MassReading } from './mass'
import { exactGrams } from './mass'

/** A scale of the firm, with how far its reading may be off: the larger of its grams and its percent. */
export type Scale = { id: string, name: string, accuracyGrams: number, accuracyPercent: number, lastCheck: string | null }

/** The smallest weight a scale is good to, as its data sheet has it. */
export type ScaleStep = { unit: 'g' | 'oz' | 'lb' | 'kg', value: number }

// From memory: what refrigerant charging scales commonly state, the larger of half an ounce and half a percent of the reading.
const DEFAULT_ACCURACY: MassReading = { unit: 'lb-oz', lb: 0, oz: 0.5 }
const DEFAULT_ACCURACY_PERCENT = 0.5

// Keeps 15.000000000000002 from becoming 16.
const FLOAT_NOISE_GRAMS = 1e-9

/** How far a gross weight may be off, in grams; without a scale the firm's default. Rounding: up to the whole gram. */
export function scaleAccuracyGrams(grossGrams: number, scale?: Scale): number {
  const grams = scale?.accuracyGrams ?? exactGrams(DEFAULT_ACCURACY)
  const percent = scale?.accuracyPercent ?? DEFAULT_ACCURACY_PERCENT
  return Math.max(0, Math.ceil(Math.max(grams, Math.abs(grossGrams) * percent / 100) - FLOAT_NOISE_GRAMS))
}
