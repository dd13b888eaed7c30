import { formatMass, type MassUnit } from '../quantity/mass'
import type { StandingSum } from './placeBranches'

const MOST_NAMED = 4

/** What stands somewhere in words: how many, what they weigh as far as that is known. Rounding: to the nearest division. */
export function standingText({ cylinders, grossGrams, withoutWeight }: StandingSum, unit: MassUnit): string {
  if (cylinders === 0) return 'no cylinder'
  const count = `${cylinders} ${cylinders === 1 ? 'cylinder' : 'cylinders'}`
  if (withoutWeight === cylinders) return `${count}, not weighed`
  const gross = `${count}, ${formatMass(grossGrams, unit, 'nearest')} gross`
  return withoutWeight > 0 ? `${gross} and ${withoutWeight} not weighed` : gross
}

/** "R-410A 3, R-22 1, empty 2": the commonest first, and how many more refrigerants there are. */
export function refrigerantsText({ refrigerants }: StandingSum): string {
  const named = refrigerants.slice(0, MOST_NAMED).map(({ refrigerant, cylinders }) =>
    `${refrigerant === 'none' ? 'empty' : refrigerant ?? 'unknown'} ${cylinders}`)
  const more = refrigerants.length - MOST_NAMED
  return [...named, ...(more > 0 ? [`${more} more`] : [])].join(', ')
}
