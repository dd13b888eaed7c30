import type { Catalogue } from '../refrigerant/types'
import { noUnEntryBecause, unEntryOf } from '../refrigerant/unEntry'
import type { TagEntry } from './contentsTag'

/** How the tag names a refrigerant for transport, or what is left to the shipper where nothing is held that would. */
export function tagEntry(designation: string, catalogue: Pick<Catalogue, 'refrigerants' | 'compositions'>): TagEntry {
  const refrigerant = catalogue.refrigerants.get(designation)
  const blend = catalogue.compositions.get(designation)
  const named = refrigerant ?? (blend && { designation, composition: [...blend.components], safetyClass: null })
  const entry = named && unEntryOf(named)
  if (entry) return { un: entry.un, properShippingName: entry.properShippingName, judgement: entry.judgement, source: entry.source }
  const judgement = named ? noUnEntryBecause(named) : 'The catalogue does not have it: the shipper classifies it (49 CFR 173.22).'
  return { un: null, properShippingName: null, judgement, source: null }
}
