import type { ContentsState } from '../custody/state'
import type { ShippedContents } from './shippingDescription'

type Held = Pick<ContentsState, 'refrigerant' | 'condition' | 'nothingInIt' | 'knownSinceVacuum'>

/** What of a cylinder's contents decides how it travels; what was emptied and not evacuated travels by what was in it. */
export function shippedContents({ refrigerant, condition, nothingInIt, knownSinceVacuum }: Held): ShippedContents {
  const [only, ...others] = knownSinceVacuum
  return {
    refrigerant: refrigerant ?? (nothingInIt && only !== undefined && others.length === 0 ? only : null),
    condition: nothingInIt && others.length > 0 ? 'mixed' : condition,
    knownParts: knownSinceVacuum,
    nothingInIt,
  }
}
