import { CATALOGUE } from '~~/utils/refrigerant/allRefrigerants'
import { shippingPapers, type PapersInput, type PapersLine } from '~~/utils/transport/shippingPapers'

/** A line of a shipment's papers: a DOT-4BA400 of 24.3 lb with 20.0 lb of R-22, but for what is given. */
export function papersLine(given: Partial<PapersLine> = {}): PapersLine {
  return {
    cylinderId: '0197a0a0-0000-7000-8000-000000000001', labelCode: '7K3M9Q2TX', serial: 'M83-4471',
    contents: { refrigerant: 'R-22', condition: 'clean', knownParts: ['R-22'], nothingInIt: false },
    isResidue: false, tareWeight: { unit: 'lb', value: 24.3 }, gross: { unit: 'lb', value: 44.3 }, netGrams: 9072,
    retest: 'March 2027', notes: [], classification: null, ...given,
  }
}

/** What the papers of a made-up shipment say. */
export function madePapers(lines: readonly PapersLine[], given: Partial<PapersInput> = {}) {
  return shippingPapers({
    number: 4, day: '1 Dec 2026', unit: 'lb',
    shipper: { name: 'Quillfen Cooling', address: '12 Mill Lane\nHarrowgate', telephone: '555-0100' },
    emergency: { telephone: '555-0199', contract: 'QF-88' },
    consignee: { name: 'Tarnbeck Reclaim', address: '9 Dock Road', telephone: '555-0142' },
    carriage: { by: 'carrier', carrier: { name: 'Northway Freight', address: null, telephone: '555-0177' } },
    note: null, lines, ...given,
  }, CATALOGUE)
}
