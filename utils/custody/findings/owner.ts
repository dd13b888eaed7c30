import type { Finding } from '../finding'
import type { Ownership } from '../cylinderView'

/** Why used refrigerant would come to a new owner. */
export type OwnerChangeCase = 'drawn-elsewhere' | 'anothers-equipment' | 'two-owners' | 'said-of-another' | 'given-away'

/** Of every refrigerant, and of HFCs besides. */
const SOURCE = '40 CFR 82.154(d); 42 U.S.C. 7675(h)(2)(B)'

const RULE = 'Used refrigerant comes to a new owner only once a certified reclaimer has reclaimed it, or solely to be reclaimed or destroyed.'
const FREE = 'Back into equipment of its own owner it may go.'

const TEXTS: Record<OwnerChangeCase, string> = {
  'drawn-elsewhere': `It was drawn for something else than its owner's equipment. ${RULE} ${FREE}`,
  'anothers-equipment': `The equipment is not its owner's. ${RULE} ${FREE}`,
  'two-owners': `Refrigerant of two owners is in it, and nobody can tell whose was drawn. It may go to a reclaimer only, not back into equipment.`,
  'said-of-another': `The log has it as another's than the one who is named here. ${RULE}`,
  'given-away': `Refrigerant is in it, and the firm is no reclaimer. ${RULE} Empty it first, or give it to a reclaimer.`,
}

/**
 * Used refrigerant would come, or came, to a new owner.
 *
 * What the paragraph lets pass besides is not asked about here: refrigerant of vehicles under subpart B, a whole circuit,
 * parent and subsidiary, one federal agency.
 */
export function ownerChange(because: OwnerChangeCase): Finding {
  return { code: 'owner-change', severity: 'stop', source: SOURCE, since: null, text: TEXTS[because] }
}

/**
 * Whether what is drawn comes to a new owner, and why; null where not, as far as was said.
 *
 * Back into the system that it came from, and as a sample, it stays its owner's.
 * @param owners of what is in the cylinder; null = the contractor.
 */
export function newOwnerBecause(owners: readonly (string | null)[], { purpose, toOwnerId }: { purpose: 'same-system' | 'same-owner' | 'sampling' | 'other', toOwnerId?: string }): OwnerChangeCase | null {
  if (purpose === 'sampling') return null
  if (purpose === 'other') return 'drawn-elsewhere'
  if (owners.length > 1) return 'two-owners'
  return purpose === 'same-owner' && toOwnerId !== undefined && owners[0] !== toOwnerId ? 'anothers-equipment' : null
}

const WHOSE: Record<Exclude<Ownership, 'own'>, string> = {
  rental: 'It is rented', deposit: 'It is on deposit', customer: 'It is a customer’s',
}

/** Another's cylinder was filled, and nobody has said that its owner agrees. */
export function ownerConsent(ownership: Exclude<Ownership, 'own'>): Finding {
  return {
    code: 'owner-consent', severity: 'caution', source: '49 CFR 173.301(e)', since: null,
    text: `${WHOSE[ownership]}, and no consent of its owner to this fill was recorded. Without it, it may not be offered for transport. Ask, and correct this entry.`,
  }
}
