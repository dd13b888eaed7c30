import { CHEMICAL_NAMES, FLAMMABLE_UNLISTED, LISTED_ENTRIES, NONFLAMMABLE_UNLISTED } from './data/unEntries'
import type { Division } from './data/unEntries'
import type { Refrigerant } from './types'

/** How a refrigerant is named for transport. */
export interface UnEntry {
  un: string
  /** As a shipping paper has it; an n.o.s. entry with its technical names. */
  properShippingName: string
  division: Division
  /** Read in the regulation or a text on it, or concluded and from memory. */
  status: 'read' | 'from-memory'
  /** What the shipper has to judge; null where a row of the table names the refrigerant and leaves nothing open. */
  judgement: string | null
  source: string
}

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
  if (listed) return { ...listed, status: 'read', judgement: listed.judgement ?? null, source: '49 CFR 172.101' }
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

function unlisted(refrigerant: Named, { un, name, division, source, read, judgement }: Choice): UnEntry {
  return {
    un, properShippingName: withTechnicalNames(name, refrigerant), division, source,
    status: read ? 'read' : 'from-memory', judgement: `${judgement} ${NO_ROW}`,
  }
}

function withTechnicalNames(name: string, { composition }: Named): string {
  const most = [...composition].sort((a, b) => b.massPercent - a.massPercent).slice(0, 2)
  return `${name} (${most.map(({ component }) => CHEMICAL_NAMES[component] ?? component).join(', ')})`
}
