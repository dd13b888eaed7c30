import { countsAsBurning, isInhalationHazard, technicalNamesOf, type NamingCatalogue } from '../refrigerant/unEntry'
import type { ShippedContents } from './shippingDescription'

/** What is put before the shipper to confirm. */
export interface Proposal { identification: string, technicalNames: string[], because: string }

const WHOSE = 'Whoever ships it classifies it (49 CFR 173.22): confirm, or choose another entry.'

/**
 * An entry for mixed refrigerants of which the parts are known; null where they are not, or one of them poisons.
 *
 * Source: from memory, and the shipper's judgement: 49 CFR 172.101(c)(10)(iii) asks for the entry that describes the mixture
 * best, 172.203(k) for at least the two parts that contribute most to its danger.
 */
export function proposedFor({ condition, knownParts }: Pick<ShippedContents, 'condition' | 'knownParts'>, catalogue: NamingCatalogue): Proposal | null {
  if (condition !== 'mixed' || knownParts.length < 2 || knownParts.some(isInhalationHazard)) return null
  const technicalNames = [...new Set(knownParts.flatMap(part => technicalNamesOf(part, catalogue)))]
  const burning = knownParts.filter(part => countsAsBurning(part, catalogue))
  const mixed = `Known to be in it: ${knownParts.join(', ')}; how much of each is not.`
  if (burning.length > 0) {
    return {
      identification: 'UN3161', technicalNames,
      because: `${mixed} ${burning.join(', ')} may make its vapor burn, so that a flammable entry is proposed; within the United States NA1954, Refrigerant gases, n.o.s., is open too. ${WHOSE}`,
    }
  }
  return { identification: 'UN1078', technicalNames, because: `${mixed} By its safety class none of them burns by itself. ${WHOSE}` }
}
