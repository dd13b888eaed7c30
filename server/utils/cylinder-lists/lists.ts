/** A list on which cylinders stand until they are back: a shipment to a reclaimer, or a lot for the test station. */
export type ListKind = 'shipment' | 'test-lot'

/** One list. */
export interface ListRef { kind: ListKind, id: string }

interface ListTables {
  heads: string
  /** Column of the firm that the cylinders go to. */
  firm: string
  lines: string
  key: string
  word: string
}

/** Where each kind of list is kept, and what people call it. */
export const LISTS: Readonly<Record<ListKind, ListTables>> = {
  'shipment': { heads: 'shipments', firm: 'to_firm_id', lines: 'shipment_lines', key: 'shipment_id', word: 'shipment' },
  'test-lot': { heads: 'test_lots', firm: 'requalifier_id', lines: 'test_lot_lines', key: 'lot_id', word: 'test lot' },
}
