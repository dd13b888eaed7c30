import { formatMass } from '../quantity/mass'
import { inHgBelow, micronsFromMmHg } from '../quantity/vacuum'
import { mostLeftMmHg, STANDARD_ATMOSPHERE_INHG } from './evacuationTable'
import type { Appliance, ChargeBand, Circumstances, EvacuationLevel, MachineMade } from './types'

/** What is opened. */
export const APPLIANCE_WORDS: Record<Appliance, string> = {
  other: 'any other appliance',
  small: 'small appliance',
  mvac: 'air conditioner of a vehicle',
}

/** Why it is opened. */
export const CIRCUMSTANCES_WORDS: Record<Circumstances, string> = {
  'major': 'major repair or disposal',
  'minor-repair': 'repair that is not major',
  'oil-change': 'oil change',
  'leaking': 'it leaks, the level cannot be reached',
}

/** When the recovery machine was made. */
export const MACHINE_MADE_WORDS: Record<MachineMade, string> = {
  'since-1993-11-15': '15 Nov 1993 or later',
  'before-1993-11-15': 'before 15 Nov 1993',
}

/** The table's two bands of charge. */
export const CHARGE_BAND_WORDS: Record<ChargeBand, string> = {
  'under-200-lb': 'under 200 lb',
  'from-200-lb': '200 lb or more',
}

/** What stands behind a level's figure. */
export const LEVEL_UNIT_WORDS: Record<EvacuationLevel['unit'], string> = {
  'inHg-vacuum': 'inHg vacuum',
  'mmHg-vacuum': 'mmHg vacuum',
  'mmHg-absolute': 'mmHg absolute',
  'psig': 'psig at most',
  'percent-of-charge': '% of the charge',
}

/** What is done about a level: its figure stands behind it. */
export function levelVerb({ unit }: EvacuationLevel): string {
  return unit === 'percent-of-charge' ? 'recover' : unit === 'psig' ? 'bring it to' : 'evacuate to'
}

/** A level in a line. */
export function levelWords({ unit, value }: EvacuationLevel): string {
  return unit === 'percent-of-charge' ? `${value} % of the charge` : `${value} ${LEVEL_UNIT_WORDS[unit]}`
}

/** A charge in both units, or that nobody knows it. */
export function formatCharge(grams: number | null): string {
  return grams === null ? 'not known' : `${formatMass(grams, 'lb', 'nearest')} (${formatMass(grams, 'kg', 'nearest')})`
}

/** What a level is on each gauge that a truck may carry. */
export interface OnGauges { inHg: number, mmHgAbsolute: number, microns: number }

/**
 * A level as each gauge shows it, at a barometer; null where no gauge can show it.
 *
 * Rounding: towards the deeper vacuum, inHg up to 0.01, mmHg and thousands of microns down to whole ones. A compound
 * gauge never has to show less than 0.
 */
export function onGauges(level: EvacuationLevel, barometerInHg: number = STANDARD_ATMOSPHERE_INHG): OnGauges | null {
  const most = mostLeftMmHg(level)
  if (most === null || level.unit === 'psig') return null
  const whole = Math.floor(most + FLOAT_NOISE)
  return {
    inHg: Math.max(0, Math.ceil((inHgBelow(most, barometerInHg) - FLOAT_NOISE) * 100) / 100),
    mmHgAbsolute: whole,
    microns: micronsFromMmHg(whole),
  }
}

// 29.9 less 10 is not quite 19.9 to a computer.
const FLOAT_NOISE = 1e-9
