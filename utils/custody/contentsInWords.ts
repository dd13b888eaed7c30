import type { CylinderView } from './cylinderView'
import { massWords } from './findings/words'

/** What a cylinder holds by the log, as a sentence for whoever is about to decide on it. */
export function contentsInWords({ contents }: Pick<CylinderView, 'contents'>): string {
  const { nothingInIt, refrigerant, netGrams, condition, inStock } = contents
  if (nothingInIt) return 'Nothing is in it.'
  const what = refrigerant ?? (condition === 'mixed' ? 'mixed refrigerants' : 'a refrigerant that nobody has named')
  const held = netGrams === null ? `${what}; how much is not known` : `${massWords(netGrams, 'nearest')} of ${what}`
  return inStock ? `It holds ${held}.` : `It left with ${held}.`
}
