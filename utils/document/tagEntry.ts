import { unEntryNamed, type NamingCatalogue } from '../refrigerant/unEntry'
import type { TagEntry } from './contentsTag'

/** How the tag names a refrigerant for transport, or what is left to the shipper where nothing is held that would. */
export function tagEntry(designation: string, catalogue: NamingCatalogue): TagEntry {
  const named = unEntryNamed(designation, catalogue)
  if (named.entry === null) return { un: null, properShippingName: null, judgement: named.because, source: null }
  const { un, properShippingName, judgement, source } = named.entry
  return { un, properShippingName, judgement, source }
}
