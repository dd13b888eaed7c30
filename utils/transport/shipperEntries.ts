import type { Division } from '../refrigerant/data/unEntries'

/** An entry that a shipper may choose for what no row names. */
export interface ShipperEntry {
  identification: string
  name: string
  division: Division
  /** Whether technical names have to stand with it: symbol G of the table. */
  asksForNames: boolean
}

/** What a shipper chooses where the contents are nothing that this subchapter regulates as a gas. */
export const NOT_A_GAS = 'not-a-gas'

/** The entries between which a shipper of refrigerant chooses. Source: 49 CFR 172.101, hazardous materials table. */
export const SHIPPER_ENTRIES = [
  { identification: 'UN1078', name: 'Refrigerant gases, n.o.s.', division: '2.2', asksForNames: true },
  { identification: 'UN3163', name: 'Liquefied gas, n.o.s.', division: '2.2', asksForNames: true },
  { identification: 'UN3161', name: 'Liquefied gas, flammable, n.o.s.', division: '2.1', asksForNames: true },
  { identification: 'NA1954', name: 'Refrigerant gases, n.o.s.', division: '2.1', asksForNames: false },
  { identification: 'UN1965', name: 'Hydrocarbon gas mixture, liquefied, n.o.s.', division: '2.1', asksForNames: false },
  { identification: 'UN1075', name: 'Liquefied petroleum gas', division: '2.1', asksForNames: false },
] as const satisfies readonly ShipperEntry[]

/** What a shipper says of contents that the program cannot classify, or classifies otherwise. */
export interface Classification {
  identification: (typeof SHIPPER_ENTRIES)[number]['identification'] | typeof NOT_A_GAS
  technicalNames: string[]
  /** Why; null where the shipper confirms what was proposed. */
  reason: string | null
}

/** A classification as it is kept: with the contents that it was given for. */
export interface KeptClassification extends Classification { of: string }

/** An entry by its number; undefined where none of this number is open. */
export function shipperEntry(identification: string): ShipperEntry | undefined {
  return SHIPPER_ENTRIES.find(entry => entry.identification === identification)
}
