import type { ShipmentLine } from '../contract/shipments'
import { formatMass, type MassUnit } from '../quantity/mass'
import { settlementDifferenceGrams } from './settlementDifference'

/** How a reclaimer's figures for one line lie beside ours. */
export interface SettlementWord { agrees: boolean, text: string }

/** The grams that a reclaimer reports of one line; null for what it left out. */
export interface Reported { theirGrossGrams: number | null, acceptedNetGrams: number | null }

/**
 * What is to be said of a reclaimer's weights beside ours: where they differ beyond both scales, by how much; null
 * where no weight of theirs can be held against one of ours.
 */
export function settlementWord(sent: ShipmentLine['sent'], reported: Reported | null, unit: MassUnit): SettlementWord | null {
  if (!sent || !reported) return null
  const pairs = [
    { name: 'gross', ours: sent.grossGrams, theirs: reported.theirGrossGrams },
    { name: 'net', ours: sent.netGrams, theirs: reported.acceptedNetGrams },
  ].filter(pair => pair.ours !== null && pair.theirs !== null)
  if (pairs.length === 0) return null
  const apart = pairs.flatMap(({ name, ours, theirs }) => {
    const grams = settlementDifferenceGrams(ours, theirs, sent.grossGrams)
    return grams === null ? [] : `${name} ${grams > 0 ? '+' : ''}${formatMass(grams, unit, 'nearest')}`
  })
  return apart.length ? { agrees: false, text: apart.join(', ') } : { agrees: true, text: 'within both scales' }
}
