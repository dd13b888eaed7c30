import type { EvacuationLevel, LevelVerdict, RequiredLevel } from './types'

/** The verdicts as the screen says them. */
export const VERDICT_WORDS: Record<LevelVerdict['verdict'], string> = { 'reached': 'Reached', 'not-reached': 'Not reached', 'unknown': 'Not judged yet' }

const SHORT_UNITS: Record<EvacuationLevel['unit'], string> = {
  'inHg-vacuum': 'inHg', 'mmHg-vacuum': 'mmHg', 'mmHg-absolute': 'mmHg', 'psig': 'psi', 'percent-of-charge': '% of the charge',
}

/**
 * By how much a level was not reached; '' where it was, or nobody knows.
 *
 * Rounding: up to a tenth, so that what is short is never called nothing.
 */
export function shortWords({ shortBy, absoluteMmHg }: LevelVerdict, { level, alternative }: Pick<RequiredLevel, 'level' | 'alternative'>): string {
  if (shortBy === null) return ''
  // What a gauge judged of a share of the charge is the vacuum that does instead.
  const judged = absoluteMmHg !== null && level.unit === 'percent-of-charge' && alternative ? alternative : level
  return `${(Math.ceil(shortBy * 10 - 1e-6) / 10).toFixed(1)} ${SHORT_UNITS[judged.unit]} short`
}

/** How long it held, as far as anybody said. */
export function heldWords({ heldMinutes, verdict }: LevelVerdict): string {
  if (heldMinutes !== null) return `It held for ${heldMinutes} ${heldMinutes === 1 ? 'minute' : 'minutes'}.`
  return verdict === 'unknown' ? '' : 'How long it held is not said.'
}
