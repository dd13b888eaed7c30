import type { ScaleStep } from './scale'

const NO_BREAK_SPACE = '\u00A0'

/**
 * How far a scale may be off, in words.
 *
 * @example accuracyWords({ unit: 'oz', value: 0.5 }, 0.5) // 'the larger of 0.5 oz and 0.5 % of the reading'
 */
export function accuracyWords(step: ScaleStep, percent: number): string {
  const weight = `${step.value}${NO_BREAK_SPACE}${step.unit}`
  const share = `${percent}${NO_BREAK_SPACE}% of the reading`
  if (percent === 0) return weight
  return step.value === 0 ? share : `the larger of ${weight} and ${share}`
}
