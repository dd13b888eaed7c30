import type { Finding } from '../finding'
import { COMMON_PRACTICE, sinceText } from './words'

/** A second refrigerant went in. */
export function secondRefrigerant(since: number | null): Finding {
  return {
    code: 'second-refrigerant', severity: 'stop', source: COMMON_PRACTICE, since: sinceText(since),
    text: 'More than one refrigerant has gone into it. Put nothing more in; send it to a reclaimer that takes mixtures, or empty it to a deep vacuum.',
  }
}

/** Another refrigerant has been in it, and only a deep vacuum makes way for this one. */
export function notEvacuatedFor(refrigerant: string, others: readonly string[]): Finding {
  return {
    code: 'second-refrigerant', severity: 'stop', source: COMMON_PRACTICE, since: null,
    text: `${others.join(' and ')} has been in it since its last deep vacuum. Empty it to a deep vacuum before ${refrigerant} goes in.`,
  }
}

/** What nobody can name and what somebody can were put together. */
export function unknownOntoKnown(since: number | null): Finding {
  return {
    code: 'unknown-onto-known', severity: 'stop', source: COMMON_PRACTICE, since: sinceText(since),
    text: 'An unknown refrigerant and another share it. Put nothing more in; have it identified, or empty it to a deep vacuum.',
  }
}

/** Two owners' refrigerant in one cylinder. */
export function twoOwners(): Finding {
  return {
    code: 'two-owners', severity: 'caution', source: '40 CFR 82.154(d)', since: null,
    text: 'Refrigerant of two owners is in it. It may go to a reclaimer only, not back into equipment.',
  }
}
