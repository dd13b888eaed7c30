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

/** What a shipper's word was given for: it counts only as long as the contents are the same. */
export function contentsKey({ refrigerant, condition, knownParts }: ShippedContents): string {
  return JSON.stringify([refrigerant, condition, knownParts])
}
