import type { Firm } from '../contract/places'

/** What a firm is to us, as people read it: one of them, and several. */
export const FIRM_KIND_WORDS: Record<Firm['kind'], { one: string, several: string }> = {
  reclaimer: { one: 'reclaimer', several: 'Reclaimers' },
  requalifier: { one: 'test station', several: 'Test stations' },
  supplier: { one: 'supplier', several: 'Suppliers' },
  customer: { one: 'customer', several: 'Customers' },
  carrier: { one: 'carrier', several: 'Carriers' },
}

/** The kinds of firms, in the order they are listed in. */
export const FIRM_KINDS_IN_ORDER = Object.keys(FIRM_KIND_WORDS) as Firm['kind'][]
