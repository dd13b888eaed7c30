import { formatMass, type MassUnit } from '../quantity/mass'
import { formatMoney } from './price'
import { isReached, type WorthLine, type WorthSum } from './worth'

/** What an offer comes to: one sentence with its number, and why. */
export interface WorthWords { kind: 'ok' | 'att' | 'unk', sentence: string, reason: string }

/** What chosen lines of an offer are worth, in words. Rounding: masses to the nearest division, what is missing up. */
export function worthWords(lines: readonly WorthLine[], sum: WorthSum, { firm, place, unit }: { firm: string, place: string, unit: MassUnit }): WorthWords {
  const mass = formatMass(sum.netGrams, unit, 'nearest')
  const names = [...new Set(lines.map(({ refrigerant }) => refrigerant))]
  const what = names.length === 1 && names[0] ? `${mass} of ${names[0]}` : `${mass} in ${counted(sum.cylinders)}`
  if (sum.cylinders === 0) return { kind: 'unk', sentence: `Nothing for ${firm} in ${place}.`, reason: 'Choose a line, or look at what it would refuse.' }
  if (!isReached(sum)) return { kind: 'unk', sentence: `${what} in ${place}: ${missing(sum, unit)} until ${firm} fetches.`, reason: reasonOf(sum) }
  const isLoss = sum.comesToCents !== null && sum.comesToCents < 0
  return { kind: isLoss ? 'att' : 'ok', sentence: `${what} in ${place} ${isLoss ? 'cost' : 'are worth'} a pick-up by ${firm}.`, reason: reasonOf(sum) }
}

/** What is missing of a minimum. @example missing(sum, 'lb') // '64.0 lb and 2 cylinders missing' */
function missing({ shortGrams, shortCylinders }: WorthSum, unit: MassUnit): string {
  const short = [...(shortGrams > 0 ? [formatMass(shortGrams, unit, 'up')] : []), ...(shortCylinders > 0 ? [counted(shortCylinders)] : [])]
  return `${short.join(' and ')} missing`
}

function reasonOf(sum: WorthSum): string {
  return [value(sum), ...unknowns(sum), `${counted(sum.comesFree)} of ours ${sum.comesFree === 1 ? 'comes' : 'come'} free.`].join(' ')
}

function value({ ourCents, chargedCents, pickUpCents, comesToCents }: WorthSum): string {
  if (ourCents === null) return 'No price is recorded for any of it.'
  const charged = chargedCents < 0 ? `, with ${formatMoney(-chargedCents)} of charges taken off` : ''
  const gross = `${formatMoney(ourCents)} at today's prices${charged}`
  if (pickUpCents === null) return `${gross}; what the pick-up costs is not recorded.`
  return pickUpCents === 0 ? `${gross}; the pick-up is free.` : `${gross}, less ${formatMoney(pickUpCents)} for the pick-up: ${formatMoney(comesToCents!)}.`
}

function unknowns({ withoutValue }: WorthSum): string[] {
  return withoutValue === 0 ? [] : [`${counted(withoutValue)} without a price or a weight ${withoutValue === 1 ? 'counts' : 'count'} for nothing in this.`]
}

function counted(cylinders: number): string {
  return `${cylinders} ${cylinders === 1 ? 'cylinder' : 'cylinders'}`
}
