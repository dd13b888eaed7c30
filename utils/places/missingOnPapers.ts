import type { Firm } from '../contract/places'

/** What shipping papers would want of a firm and nobody has written down, as a sentence; null where nothing is, or no papers name it. */
export function missingOnPapers({ kind, telephone, address }: Pick<Firm, 'kind' | 'telephone' | 'address'>): string | null {
  const wanted = kind === 'reclaimer' || kind === 'carrier' ? [...(address === null ? ['address'] : []), ...(telephone === null ? ['telephone'] : [])] : []
  return wanted.length === 0 ? null : `Papers name it with its ${wanted.join(' and ')}, which ${wanted.length === 1 ? 'is' : 'are'} not known. An admin adds what is missing.`
}
