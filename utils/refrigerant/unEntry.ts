import { CHEMICAL_NAMES, FLAMMABLE_UNLISTED, LISTED_ENTRIES, NONFLAMMABLE_UNLISTED } from './data/unEntries'
import type { Division, ListedEntry } from './data/unEntries'
import { isFlammable } from './safety'
import type { Catalogue, Refrigerant } from './types'

/** How a refrigerant is named for transport. */
export interface UnEntry {
  un: string
  /** As the table has it, with all the names between which the shipper chooses. */
  row: string
  /** The one of them that papers and packages bear. */
  name: string
  /** In words, for an entry that asks for them; empty where none does. */
  technicalNames: string[]
  /** The name with its technical names. */
  properShippingName: string
  division: Division
  subsidiary: string[]
  /** What the paper says besides. */
  words: string[]
  /** Read in the regulation or a text on it, or concluded and from memory. */
  status: 'read' | 'from-memory'
  /** What the shipper has to judge; null where a row of the table names the refrigerant and leaves nothing open. */
  judgement: string | null
  source: string
}

/** What of the catalogue names a refrigerant for transport. */
export type NamingCatalogue = Pick<Catalogue, 'refrigerants' | 'compositions'>

type Named = Pick<Refrigerant, 'designation' | 'composition' | 'safetyClass'> & { nbpC?: number }

// Above it a liquid of low pressure is no gas in transport.
const GAS_AT_C = 20

const NO_ROW = 'No row of the table names it: the shipper classifies it (49 CFR 173.22) and chooses the entry.'

/**
 * How a refrigerant is named for transport; null where it is no gas, or nothing is held that would name it.
 *
 * Source: 49 CFR 172.101; technical names of n.o.s. entries by 172.203(k). Which two components stand in it (those of most
 * mass) and the choice between n.o.s. entries are from memory, and the shipper's judgement.
 */
export function unEntryOf(refrigerant: Named): UnEntry | null {
  const { designation } = refrigerant
  const listed = LISTED_ENTRIES[designation]
  if (listed) return listedEntry(listed)
  if (!isGasInTransport(refrigerant)) return null
  const burning = FLAMMABLE_UNLISTED.get(designation)
  if (burning) {
    return unlisted(refrigerant, {
      un: 'UN3161', name: 'Liquefied gas, flammable, n.o.s.', division: '2.1', ...burning,
      judgement: 'Within the United States NA1954, Refrigerant gases, n.o.s., is open too.',
    })
  }
  const liquefied = NONFLAMMABLE_UNLISTED.get(designation)
  if (liquefied) return unlisted(refrigerant, { un: 'UN3163', name: 'Liquefied gas, n.o.s.', division: '2.2', ...liquefied })
  if (refrigerant.safetyClass !== 'A1') return null
  return unlisted(refrigerant, {
    un: 'UN1078', name: 'Refrigerant gases, n.o.s.', division: '2.2', read: false, source: '49 CFR 172.101, which has no row for it',
    judgement: 'UN3163, Liquefied gas, n.o.s., is as usual.',
  })
}

/** The same by designation, or why there is none. */
export function unEntryNamed(designation: string, catalogue: NamingCatalogue): { entry: UnEntry } | { entry: null, because: string } {
  const named = namedIn(designation, catalogue)
  const entry = unEntryOf(named ?? { designation, composition: [], safetyClass: null })
  if (entry) return { entry }
  return { entry: null, because: named ? noUnEntryBecause(named) : 'The catalogue does not have it: the shipper classifies it (49 CFR 173.22).' }
}

/** What is in a refrigerant in words of chemistry, most first; its own designation where nothing is held of it. */
export function technicalNamesOf(designation: string, catalogue: NamingCatalogue): string[] {
  const composition = namedIn(designation, catalogue)?.composition ?? [{ component: designation, massPercent: 100 }]
  return mostFirst(composition).map(chemicalName)
}

/** Whether a refrigerant burns so far as its safety class says; one whose class is not held counts as burning. */
export function countsAsBurning(designation: string, catalogue: NamingCatalogue): boolean {
  return isFlammable(namedIn(designation, catalogue)?.safetyClass ?? null)
}

/** Whether a refrigerant poisons by inhalation, or is treated so in transport. Source: 49 CFR 172.101, 172.102 special provision 13. */
export function isInhalationHazard(designation: string): boolean {
  const listed = LISTED_ENTRIES[designation]
  return listed !== undefined && (listed.division === '2.3' || listed.words !== undefined)
}

/** Why a refrigerant has no entry; it completes `unEntryOf` where that is null. */
export function noUnEntryBecause(refrigerant: Named): string {
  return isGasInTransport(refrigerant)
    ? 'No row of 49 CFR 172.101 names it, and its class of danger is not known well enough to suggest an entry: the shipper classifies it (49 CFR 173.22).'
    : 'It boils above 68 °F (20 °C), so that it does not travel as a gas (49 CFR 173.115, from memory). The shipper finds the class of the liquid.'
}

function isGasInTransport({ nbpC }: Named): boolean {
  return nbpC === undefined || nbpC <= GAS_AT_C
}

interface Choice { un: string, name: string, division: Division, source: string, read: boolean, judgement: string }

function unlisted({ composition }: Named, { un, name, division, source, read, judgement }: Choice): UnEntry {
  const technicalNames = mostFirst(composition).slice(0, 2).map(chemicalName)
  return {
    un, row: name, name, technicalNames, properShippingName: withTechnicalNames(name, technicalNames), division, subsidiary: [], words: [], source,
    status: read ? 'read' : 'from-memory', judgement: `${judgement} ${NO_ROW}`,
  }
}

function listedEntry({ un, row, division, subsidiary = [], words = [], judgement }: ListedEntry): UnEntry {
  const name = nameOnPaper(row)
  return {
    un, row, name, technicalNames: [], properShippingName: name, division, subsidiary: [...subsidiary], words: [...words],
    status: 'read', judgement: judgement ?? null, source: '49 CFR 172.101',
  }
}

/** Of names with “or” between them one is borne: the last, by which the trade knows it. Source: 49 CFR 172.101(c)(2). */
function nameOnPaper(row: string): string {
  return row.split(/,? or /).at(-1)!
}

/** A name with its technical names in parentheses. Source: 49 CFR 172.202(d), 172.203(k), 172.301(b). */
export function withTechnicalNames(name: string, technicalNames: readonly string[]): string {
  return technicalNames.length > 0 ? `${name} (${technicalNames.join(', ')})` : name
}

function namedIn(designation: string, catalogue: NamingCatalogue): Named | null {
  const blend = catalogue.compositions.get(designation)
  return catalogue.refrigerants.get(designation) ?? (blend ? { designation, composition: [...blend.components], safetyClass: null } : null)
}

function mostFirst(composition: Named['composition']): Named['composition'] {
  return [...composition].sort((a, b) => b.massPercent - a.massPercent)
}

function chemicalName({ component }: Named['composition'][number]): string {
  return CHEMICAL_NAMES[component] ?? component
}
