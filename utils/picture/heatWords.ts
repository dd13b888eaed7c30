import type { LiquidFull } from '../capacity/liquidFull'
import type { FillTerm } from '../capacity/types'
import type { CapacityView } from '../custody/cylinderView'
import { fahrenheitFromCelsius } from '../quantity/temperature'

/**
 * A share of the volume in whole percent.
 *
 * Rounding: to the nearest; 100 % is only said of a cylinder with no vapor left, 0 % only of one with no liquid.
 *
 * @example volumeShare(0.9962) // '99 %'
 */
export function volumeShare(share: number): string {
  if (share >= 1) return '100\u00A0%'
  if (share <= 0) return '0\u00A0%'
  return `${Math.min(99, Math.max(1, Math.round(share * 100)))}\u00A0%`
}

type Behaviour = Pick<CapacityView, 'forRefrigerant' | 'hotLiquidShare'> & { terms: readonly FillTerm[] }

/** How full a cylinder is at 131 F, the hottest that the rules reckon with; null where that is not known. An empty one as filled to its limit. */
export function hotSentence(capacity: Behaviour, nothingInIt: boolean): string | null {
  const { forRefrigerant, hotLiquidShare: share } = capacity
  if (forRefrigerant === null) return null
  if (share === null) return isGasWhenHot(capacity) ? 'At 131 °F it is all gas: what counts is its pressure' : null
  const filled = nothingInIt ? 'Filled to the limit, at 131 °F' : 'At 131 °F'
  if (share >= 1) return `${filled} it is liquid-full: no vapor is left`
  if (share <= 0) return `${filled} it is all vapor`
  return `${filled} it is ${volumeShare(share)} full`
}

/** Whether there is no liquid at 131 F, so that no ceiling below liquid-full can be given. */
function isGasWhenHot({ terms }: Pick<Behaviour, 'terms'>): boolean {
  return terms.some(term => term.rule === 'hot-ceiling' && term.limitGrams === null && term.standing !== 'unsafe')
}

/** The temperature at which no vapor is left, in a few words. Rounding: down to the whole degree Fahrenheit. */
export function liquidFullWords(full: LiquidFull): string {
  if ('never' in full) return 'never: it turns to vapor first'
  return 'c' in full
    ? `${Math.floor(fahrenheitFromCelsius(full.c))}\u00A0°F`
    : `above\u00A0${Math.floor(fahrenheitFromCelsius(full.aboveC))}\u00A0°F`
}
