import type { MassReading, MassUnit } from '../quantity/mass'
import { exactGrams } from '../quantity/mass'
import type { NamingCatalogue } from '../refrigerant/unEntry'
import { certification, type Certification } from './certification'
import { tradeException, type TradeException } from './materialsOfTrade'
import { missingForPapers, type MissingForPapers } from './missingForPapers'
import { placards, type Placards } from './placards'
import { residueReliefs, type Relief } from './residueReliefs'
import type { Classification } from './shipperEntries'
import { isHazardous, shippingDescription, type ShippedContents, type ShippingDescription } from './shippingDescription'

/** Somebody whom the papers name. */
export interface Party { name: string, address: string | null, telephone: string | null }

/** Who carries the load: a carrier, the firm on its own vehicle, or nobody has said. */
export type Carriage = { by: 'carrier', carrier: Party } | { by: 'own-vehicle' } | { by: 'not-said' }

/** A cylinder as the papers are made of it. */
export interface PapersLine {
  cylinderId: string
  labelCode: string | null
  serial: string | null
  contents: ShippedContents
  /** Only what is left of what was in it. */
  isResidue: boolean
  tareWeight: MassReading | null
  /** As read on the scale; null where it is not weighed yet. */
  gross: MassReading | null
  netGrams: number | null
  /** The month by which it is retested, in words. */
  retest: string
  /** What the dock has to know: 'mixed', 'retest overdue'. */
  notes: string[]
  classification: Classification | null
}

/** Whatever a shipment's papers are made of. */
export interface PapersInput {
  number: number
  /** The day they were made, as printed. */
  day: string
  unit: MassUnit
  shipper: Party
  emergency: { telephone: string | null, contract: string | null }
  consignee: Party
  carriage: Carriage
  note: string | null
  lines: readonly PapersLine[]
}

/** A line with how it is described. */
export interface DescribedLine extends Omit<PapersLine, 'classification'> {
  description: ShippingDescription
  /** Described by what the shipper has said, and not by what would be worked out. */
  isShippersWord: boolean
}

/** Cylinders that travel under one description, residue apart. */
export interface DescribedGroup {
  description: ShippingDescription
  isResidue: boolean
  cylinders: number
  /** null where one is not known. Units: grams, whole. */
  grossGrams: number | null
  netGrams: number | null
}

/** What a shipment's papers say: plain data that is kept as it was when the shipment left. */
export interface ShippingPapers extends Omit<PapersInput, 'lines'> {
  lines: DescribedLine[]
  /** What is hazardous stands first. Source: 49 CFR 172.201(a)(1). */
  groups: DescribedGroup[]
  totals: { cylinders: number, grossGrams: number | null, netGrams: number | null }
  placards: Placards
  tradeException: TradeException
  reliefs: Relief[]
  certification: Certification
  missing: MissingForPapers[]
}

/** Works out what the papers of a shipment say. */
export function shippingPapers({ lines: given, ...head }: PapersInput, catalogue: NamingCatalogue): ShippingPapers {
  const lines = given.map(line => describedLine(line, catalogue))
  return {
    ...head,
    lines,
    groups: groupsOf(lines),
    totals: { cylinders: lines.length, grossGrams: grossOf(lines), netGrams: netOf(lines) },
    placards: placards(lines, head.unit),
    tradeException: tradeException(lines, { carriedBy: head.carriage.by, unit: head.unit }),
    reliefs: residueReliefs(lines),
    certification: certification(head.carriage.by === 'own-vehicle'),
    missing: missingForPapers({ emergencyTelephone: head.emergency.telephone, lines }),
  }
}

function describedLine({ classification, ...line }: PapersLine, catalogue: NamingCatalogue): DescribedLine {
  return { ...line, description: shippingDescription(line.contents, catalogue, classification), isShippersWord: classification !== null }
}

function groupsOf(lines: readonly DescribedLine[]): DescribedGroup[] {
  // Of what nobody has classified the reasons stand apart.
  const keyOf = ({ description, isResidue }: DescribedLine) =>
    [description.text, isHazardous(description) && isResidue, description.needsChoice ? description.because : ''].join('\n')
  const firsts = new Map([...lines].reverse().map(line => [keyOf(line), line]))
  return [...firsts].map(([key, { description, isResidue }]): DescribedGroup => {
    const alike = lines.filter(line => keyOf(line) === key)
    return {
      description, isResidue: isHazardous(description) && isResidue, cylinders: alike.length,
      grossGrams: grossOf(alike), netGrams: netOf(alike),
    }
  }).sort((a, b) => Number(isHazardous(b.description)) - Number(isHazardous(a.description)) || a.description.text.localeCompare(b.description.text, 'en') || Number(a.isResidue) - Number(b.isResidue))
}

function grossOf(lines: readonly DescribedLine[]): number | null {
  return sumOf(lines.map(({ gross }) => gross && exactGrams(gross)))
}

function netOf(lines: readonly DescribedLine[]): number | null {
  return sumOf(lines.map(({ netGrams }) => netGrams))
}

/** Not known where one of them is not. Rounding: the sum, to the nearest gram. */
function sumOf(grams: readonly (number | null)[]): number | null {
  return grams.includes(null) ? null : Math.round(grams.reduce<number>((sum, one) => sum + one!, 0))
}
