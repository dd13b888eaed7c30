import { formatMass, type MassUnit } from '../quantity/mass'
import { formatMoney } from '../reclaim/price'
import type { FourWeights } from './fourWeights'

/** How a reclaimer's figures for one line lie beside ours. */
export interface DifferenceWord { agrees: boolean, text: string }

/**
 * What is to be said of a reclaimer's weights beside ours: where they differ beyond both scales, by how much; null where
 * no weight of theirs can be held against one of ours.
 */
export function differenceWord({ gross, net }: Pick<FourWeights, 'gross' | 'net'>, unit: MassUnit): DifferenceWord | null {
  if (gross === null && net === null) return null
  const apart = [{ name: 'gross', difference: gross }, { name: 'net', difference: net }].flatMap(({ name, difference }) => {
    if (!difference?.isBeyond) return []
    return `${name} ${difference.grams > 0 ? '+' : ''}${formatMass(difference.grams, unit, 'nearest')}`
  })
  return apart.length ? { agrees: false, text: apart.join(', ') } : { agrees: true, text: 'within both scales' }
}

/** By how much a statement credits otherwise than its own figures give; '' where it does not. */
export function creditWord(differenceCents: number | null): string {
  if (!differenceCents) return ''
  return `statement ${differenceCents > 0 ? '+' : ''}${formatMoney(differenceCents)}`
}
