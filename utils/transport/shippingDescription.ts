import type { Division } from '../refrigerant/data/unEntries'
import { unEntryNamed, withTechnicalNames, type NamingCatalogue, type UnEntry } from '../refrigerant/unEntry'
import { proposedFor, type Proposal } from './proposal'
import { NOT_A_GAS, shipperEntry, type Classification } from './shipperEntries'

/** What of a cylinder's contents decides how it travels. */
export interface ShippedContents {
  /** null where mixed or not known. */
  refrigerant: string | null
  condition: string
  /** Designations of all that is known to be in it; what came first stands first. */
  knownParts: readonly string[]
  /** Evacuated: nothing that would travel is in it. */
  nothingInIt: boolean
}

/** On what a description rests: a row that names the refrigerant, somebody's judgement, or what nobody looked up. */
export type TransportBasis = 'listed' | 'judgement' | 'from-memory'

/** How one cylinder is described on the papers. */
export interface ShippingDescription {
  /** null where nothing that is regulated as a gas travels, or where nobody has said what does. */
  identification: string | null
  /** Without its technical names. */
  properShippingName: string | null
  technicalNames: string[]
  division: Division | null
  subsidiary: string[]
  /** Stands after the description: 'Inhalation Hazard'. */
  words: string[]
  /** The basic description in its order, and what stands after it; in words where there is none. */
  text: string
  basis: TransportBasis
  /** Why so, and what else is open, in words. */
  because: string
  source: string
  /** It may not leave before the shipper has said how it travels. */
  needsChoice: boolean
  /** What is proposed to the shipper; null where nothing can be. */
  proposal: Proposal | null
}

const SHIPPER = '49 CFR 173.22'

/**
 * How contents are described on a shipping paper. What the shipper has said stands above what would be worked out.
 *
 * Source: 49 CFR 172.202(a), (b): identification number, proper shipping name, division with subsidiary ones in
 * parentheses, nothing in between; gases have no packing group (172.101). Technical names: 172.202(d), 172.203(k).
 *
 * @example shippingDescription(contents, CATALOGUE).text // 'UN1018, Refrigerant gas R 22, 2.2'
 */
export function shippingDescription(contents: ShippedContents, catalogue: NamingCatalogue, choice: Classification | null = null): ShippingDescription {
  if (contents.nothingInIt && contents.knownParts.length === 0) return nothingDescribed(contents)
  const named = contents.refrigerant === null || contents.condition === 'mixed' ? null : unEntryNamed(contents.refrigerant, catalogue)
  const proposal = named?.entry ? proposalOf(named.entry) : named === null ? proposedFor(contents, catalogue) : null
  if (choice) return chosen(choice, proposal)
  if (named?.entry) return fromEntry(named.entry, proposal)
  if (named) return unclassifiedBecause(named.because, null)
  return unclassifiedBecause(proposal?.because ?? unknownBecause(contents), proposal)
}

/** The lines that may not leave before the shipper has said how they travel. */
export function unclassified<Line extends { description: Pick<ShippingDescription, 'needsChoice'> }>(lines: readonly Line[]): Line[] {
  return lines.filter(line => line.description.needsChoice)
}

/** Whether what is described has to be told as a hazardous material. */
export function isHazardous({ identification }: Pick<ShippingDescription, 'identification'>): boolean {
  return identification !== null
}

function fromEntry(entry: UnEntry, proposal: Proposal | null): ShippingDescription {
  return {
    ...described({
      identification: entry.un, properShippingName: entry.name, technicalNames: entry.technicalNames,
      division: entry.division, subsidiary: entry.subsidiary, words: entry.words,
    }),
    basis: entry.status === 'from-memory' ? 'from-memory' : entry.technicalNames.length > 0 ? 'judgement' : 'listed',
    because: entry.judgement ?? 'A row of the table names it.',
    source: entry.source,
    needsChoice: false,
    proposal,
  }
}

function chosen({ identification, technicalNames, reason }: Classification, proposal: Proposal | null): ShippingDescription {
  const said = reason === null ? 'The shipper has confirmed what was proposed.' : `The shipper’s judgement: ${reason}`
  const decided = { basis: 'judgement' as const, because: said, source: SHIPPER, needsChoice: false, proposal }
  const entry = identification === NOT_A_GAS ? undefined : shipperEntry(identification)
  if (!entry) return { ...undescribed('No gas of Class 2, by the shipper’s judgement'), ...decided }
  const { name, division } = entry
  return { ...described({ identification, properShippingName: name, technicalNames, division, subsidiary: [], words: [] }), ...decided }
}

function unclassifiedBecause(because: string, proposal: Proposal | null): ShippingDescription {
  return { ...undescribed('Not classified'), basis: 'judgement', because, source: SHIPPER, needsChoice: true, proposal }
}

function nothingDescribed({ condition }: ShippedContents): ShippingDescription {
  const because = condition === 'unknown'
    ? 'Nothing is recorded in it.'
    : 'It was evacuated, and nothing was put in since. Whether it is clean enough to travel as an empty one is the shipper’s to say (49 CFR 173.29(b)).'
  return { ...undescribed('Nothing in it'), basis: 'judgement', because, source: '49 CFR 173.29', needsChoice: false, proposal: null }
}

function unknownBecause({ condition }: ShippedContents): string {
  return condition === 'mixed'
    ? 'Refrigerants are mixed in it, and which is not all known: whoever ships it finds out and classifies it.'
    : 'What is in it is not known: whoever ships it finds out and classifies it.'
}

type Basic = Pick<ShippingDescription, 'technicalNames' | 'subsidiary' | 'words'> & { identification: string, properShippingName: string, division: Division }

function described(basic: Basic): Basic & { text: string } {
  const { identification, properShippingName, technicalNames, division, subsidiary, words } = basic
  const danger = subsidiary.length > 0 ? `${division} (${subsidiary.join(', ')})` : division
  return { ...basic, text: [identification, withTechnicalNames(properShippingName, technicalNames), danger, ...words].join(', ') }
}

function undescribed(text: string) {
  return { identification: null, properShippingName: null, technicalNames: [], division: null, subsidiary: [], words: [], text }
}

function proposalOf({ un, technicalNames, judgement }: UnEntry): Proposal {
  return { identification: un, technicalNames, because: judgement ?? 'A row of the table names it.' }
}
