import { exactGrams, formatMass, type MassReading, type MassUnit } from '../quantity/mass'
import { unclassified, type ShippingDescription } from './shippingDescription'
import { PLACARD_FROM_GRAMS } from './vanLoad'

/** What a line of the papers adds to a vehicle. */
export interface LoadedLine {
  description: Pick<ShippingDescription, 'identification' | 'division' | 'words' | 'needsChoice'>
  /** Only what is left of what was in it. */
  isResidue: boolean
  gross: MassReading | null
}

export type PlacardName = 'FLAMMABLE GAS' | 'NON-FLAMMABLE GAS' | 'POISON GAS'

/** Which placards a load wants on the vehicle; of this load alone. */
export interface Placards {
  state: 'needed' | 'not-needed' | 'not-known'
  /** On each side and each end of the vehicle. */
  names: PlacardName[]
  /** Gross of what counts and is weighed. */
  countedGrams: number
  notWeighed: number
  /** In words, each with its source. */
  notes: string[]
}

/** Readings are added unrounded, so that a limit met to the last division counts as met. */
export const FLOAT_NOISE_GRAMS = 0.001

const SECTION = '49 CFR 172.504'
const DANGEROUS_BELOW_GRAMS: Record<MassUnit, number> = bothUnits(2205, 1000)

/**
 * From this gross of divisions 2.1 and 2.2 on a vehicle is placarded: the pounds of the regulation for whoever weighs in
 * pounds, its kilograms for who weighs in these. Units: grams. Source: 49 CFR 172.504(c): 454 kg (1,001 pounds).
 */
export function placardFromGrams(unit: MassUnit): number {
  return unit === 'kg' ? 454_000 : PLACARD_FROM_GRAMS
}

/**
 * The placards of a load. Division 2.3 wants one in any quantity; 2.1 and 2.2 together from a gross on; residue that does
 * not poison by inhalation is not counted.
 *
 * Source: 49 CFR 172.504(a) to (f).
 */
export function placards(lines: readonly LoadedLine[], unit: MassUnit): Placards {
  const hazardous = lines.filter(line => line.description.identification !== null)
  const counted = hazardous.filter(line => !line.isResidue || isPoisonous(line))
  const tableTwo = counted.filter(({ description }) => description.division !== '2.3')
  const countedGrams = grossSum(tableTwo)
  const notWeighed = tableTwo.filter(({ gross }) => gross === null).length
  const notClassified = unclassified(lines).length
  const isHeavy = countedGrams + FLOAT_NOISE_GRAMS >= placardFromGrams(unit)
  const poison = counted.some(({ description }) => description.division === '2.3')
  const burning = isHeavy && tableTwo.some(({ description }) => description.division === '2.1')
  const other = isHeavy && tableTwo.some(({ description }) => description.division === '2.2')
  const names: PlacardName[] = [...poison ? ['POISON GAS' as const] : [], ...burning ? ['FLAMMABLE GAS' as const] : [], ...other ? ['NON-FLAMMABLE GAS' as const] : []]
  const threshold = unit === 'kg' ? '454 kg' : '1,001 lb'
  return {
    state: names.length > 0 ? 'needed' : notWeighed + notClassified > 0 ? 'not-known' : 'not-needed',
    names, countedGrams, notWeighed,
    notes: [
      ...tableTwo.length > 0 ? [`${formatMass(countedGrams, unit, isHeavy ? 'nearest' : 'down')} gross of divisions 2.1 and 2.2 are counted; from ${threshold} on one vehicle they are placarded (${SECTION}(c)).`] : [],
      ...notWeighed > 0 ? [`${notWeighed === 1 ? '1 cylinder is' : `${notWeighed} cylinders are`} not weighed and not counted.`] : [],
      ...notClassified > 0 ? [`${notClassified === 1 ? '1 cylinder is' : `${notClassified} cylinders are`} not classified and not counted.`] : [],
      ...counted.length < hazardous.length ? [`${hazardous.length - counted.length} with only a residue need not be counted (${SECTION}(d)).`] : [],
      ...poison ? [`POISON GAS is shown for any quantity (${SECTION}(e), table 1).`] : [],
      ...burning && other ? [`NON-FLAMMABLE GAS may be left off where FLAMMABLE GAS is shown (${SECTION}(f)(3)).`, dangerous(tableTwo, unit)] : [],
      ...hazardous.length > 0 ? ['What else is on the vehicle counts as well.'] : [],
    ],
  }
}

function dangerous(lines: readonly LoadedLine[], unit: MassUnit): string {
  const most = unit === 'kg' ? '1,000 kg' : '2,205 lb'
  const heavy = (['2.1', '2.2'] as const).filter(division => sumOf(lines, division) >= DANGEROUS_BELOW_GRAMS[unit])
  return heavy.length > 0
    ? `DANGEROUS may not stand in place of the placard of division ${heavy.join(' and ')}: ${most} or more of it are loaded at one place (${SECTION}(b)).`
    : `DANGEROUS may stand in place of both, as long as less than ${most} of each are loaded at one place (${SECTION}(b)).`
}

function sumOf(lines: readonly LoadedLine[], division: '2.1' | '2.2'): number {
  return grossSum(lines.filter(({ description }) => description.division === division)) + FLOAT_NOISE_GRAMS
}

/** The gross of all lines that are weighed. Units: grams, unrounded. */
export function grossSum(lines: readonly Pick<LoadedLine, 'gross'>[]): number {
  return lines.reduce((sum, { gross }) => sum + (gross === null ? 0 : exactGrams(gross)), 0)
}

/** Whether a line poisons by inhalation. Source: 49 CFR 171.8, from memory: also what a special provision calls an inhalation hazard. */
export function isPoisonous({ description }: Pick<LoadedLine, 'description'>): boolean {
  return description.division === '2.3' || description.words.length > 0
}

function bothUnits(pounds: number, kilograms: number): Record<MassUnit, number> {
  const inPounds = exactGrams({ unit: 'lb', value: pounds })
  return { 'lb': inPounds, 'lb-oz': inPounds, 'kg': kilograms * 1000 }
}
