import type { Condition } from '../capacity/types'
import type { Day } from '../quantity/day'
import { readingGrams } from '../quantity/mass'
import { creditCents, priceOn, type DatedPrice, type Rate } from './price'
import { refusals, type Offered, type ReclaimerTerms } from './terms'

/** A cylinder of the stock that could be shipped. */
export interface Candidate extends Omit<Offered, 'nothingInIt'> {
  id: string
  labelCode: string | null
  serial: string | null
  netGrams: number | null
  /** The place it can be fetched from: a shop with its racks. */
  placeId: string
  /** Whose the refrigerant is; null = the contractor's own. */
  ownerIds: (string | null)[]
  isOurSteel: boolean
  /** Why it may leave with nobody as it is, in words. */
  heldBack: string[]
}

/** A reclaimer with its terms of a day and all its prices. */
export interface Taker { id: string, terms: ReclaimerTerms, prices: readonly DatedPrice[] }

/** Cylinders of one refrigerant in one condition that a reclaimer would take, of one owner. */
export interface WorthLine {
  refrigerant: string | null
  condition: Condition
  /** Whose it is: null = ours; several where one cylinder holds what belongs to more than one. */
  owner: { is: 'ours' } | { is: 'customer', id: string } | { is: 'several' }
  cylinders: number
  /** The heaviest of them, as many as one shipment takes. */
  cylinderIds: string[]
  /** Without a known weight: they count for nothing here. */
  notWeighed: number
  /** Of those whose weight is known; null where none is. */
  netGrams: number | null
  /** Today's; null where none is recorded. */
  rate: Rate | null
  /** By line as a statement reckons; null without a price or a weight. */
  valueCents: number | null
  /** Of our own steel, which comes back empty. */
  comesFree: number
}

/** A reason for which a reclaimer would refuse cylinders, or we may not ship them. */
export interface WorthRefusal { text: string, cylinders: number, first: Pick<Candidate, 'id' | 'labelCode' | 'serial'>[] }

/** What a reclaimer would take from a place and what it would refuse. */
export interface WorthOffer { takerId: string, placeId: string, lines: WorthLine[], refused: WorthRefusal[], refusedCylinders: number }

/** Lines of an offer added up against the reclaimer's minimum. */
export interface WorthSum {
  cylinders: number
  notWeighed: number
  netGrams: number
  /** What is missing until it fetches; 0 where its minimum is reached or none was said. */
  shortGrams: number
  shortCylinders: number
  /** Of our own refrigerant, charges taken off; null where nothing has a price. A customer's is not ours to count. */
  ourCents: number | null
  /** Of that, what is charged: 0 or below. */
  chargedCents: number
  pickUpCents: number | null
  /** Ours less the pick-up; null where one of them is not known. */
  comesToCents: number | null
  /** Cylinders of ours that count for nothing, for want of a price or a weight. */
  withoutValue: number
  comesFree: number
}

/** As many lines as a shipment takes. */
export const MOST_ON_A_SHIPMENT = 200
const MOST_NAMED = 10

/** What each reclaimer would take on a day and what it would refuse, place by place. */
export function worthOffers(candidates: readonly Candidate[], takers: readonly Taker[], day: Day): WorthOffer[] {
  const places = [...grouped(candidates, ({ placeId }) => placeId)]
  return takers.flatMap(taker => places.map(([placeId, there]) => offerOf(taker, placeId, there, day)))
}

/** Lines added up. Rounding: what is missing of a minimum never below zero. */
export function worthSum(lines: readonly WorthLine[], terms: Pick<ReclaimerTerms, 'minimum' | 'minimumCylinders' | 'pickUpCents'>): WorthSum {
  const total = (figure: (line: WorthLine) => number) => lines.reduce((sum, line) => sum + figure(line), 0)
  const ours = lines.filter(({ owner }) => owner.is === 'ours')
  const priced = ours.flatMap(({ valueCents }) => valueCents ?? [])
  const ourCents = priced.length === 0 ? null : priced.reduce((sum, cents) => sum + cents, 0)
  const [netGrams, cylinders] = [total(line => line.netGrams ?? 0), total(line => line.cylinders)]
  return {
    cylinders, netGrams,
    notWeighed: total(line => line.notWeighed),
    shortGrams: Math.max(0, (terms.minimum ? readingGrams(terms.minimum) : 0) - netGrams),
    shortCylinders: Math.max(0, (terms.minimumCylinders ?? 0) - cylinders),
    ourCents,
    chargedCents: priced.filter(cents => cents < 0).reduce((sum, cents) => sum + cents, 0),
    pickUpCents: terms.pickUpCents,
    comesToCents: ourCents === null || terms.pickUpCents === null ? null : ourCents - terms.pickUpCents,
    withoutValue: ours.reduce((sum, line) => sum + (line.valueCents === null ? line.cylinders : line.notWeighed), 0),
    comesFree: total(line => line.comesFree),
  }
}

/** The lines that go along unless somebody chooses otherwise: what is ours. A customer's goes when the customer says so. */
export function ourLines(lines: readonly WorthLine[]): WorthLine[] {
  return lines.filter(({ owner }) => owner.is === 'ours')
}

/** Whether nothing is missing of a reclaimer's minimum. */
export function isReached({ cylinders, shortGrams, shortCylinders }: WorthSum): boolean {
  return cylinders > 0 && shortGrams === 0 && shortCylinders === 0
}

function offerOf(taker: Taker, placeId: string, there: readonly Candidate[], day: Day): WorthOffer {
  const judged = there.map(candidate => ({
    candidate,
    because: [...candidate.heldBack, ...refusals(taker.terms, { ...candidate, nothingInIt: false }).map(({ text }) => text)],
  }))
  const taken = judged.filter(({ because }) => because.length === 0).map(({ candidate }) => candidate)
  const refused = judged.filter(({ because }) => because.length > 0)
  const reasons = grouped(refused.flatMap(({ candidate, because }) => because.map(text => ({ text, candidate }))), ({ text }) => text)
  return {
    takerId: taker.id, placeId,
    lines: [...grouped(taken, lineKey).values()].map(group => lineOf(group, taker.prices, day)).sort(worthFirst),
    refused: [...reasons].map(([text, all]) => ({
      text, cylinders: all.length,
      first: all.slice(0, MOST_NAMED).map(({ candidate: { id, labelCode, serial } }) => ({ id, labelCode, serial })),
    })).sort((a, b) => b.cylinders - a.cylinders || a.text.localeCompare(b.text, 'en')),
    refusedCylinders: refused.length,
  }
}

function lineOf(group: readonly Candidate[], prices: readonly DatedPrice[], day: Day): WorthLine {
  const [first] = group as [Candidate]
  const { refrigerant, condition } = first
  const rate = priceOn(prices, { refrigerant, condition, day })?.rate ?? null
  const nets = group.flatMap(({ netGrams }) => netGrams ?? [])
  const heaviest = [...group].sort((a, b) => (b.netGrams ?? 0) - (a.netGrams ?? 0) || a.id.localeCompare(b.id))
  return {
    refrigerant, condition, rate,
    owner: ownerOf(first),
    cylinders: group.length,
    cylinderIds: heaviest.slice(0, MOST_ON_A_SHIPMENT).map(({ id }) => id),
    notWeighed: group.length - nets.length,
    netGrams: nets.length === 0 ? null : nets.reduce((sum, grams) => sum + grams, 0),
    valueCents: rate === null || nets.length === 0 ? null : nets.reduce((sum, grams) => sum + creditCents(rate, grams), 0),
    comesFree: group.filter(({ isOurSteel }) => isOurSteel).length,
  }
}

function ownerOf({ ownerIds }: Pick<Candidate, 'ownerIds'>): WorthLine['owner'] {
  const [owner = null, ...others] = [...new Set(ownerIds)]
  if (others.length > 0) return { is: 'several' }
  return owner === null ? { is: 'ours' } : { is: 'customer', id: owner }
}

function lineKey(candidate: Candidate): string {
  return JSON.stringify([candidate.refrigerant, candidate.condition, ownerOf(candidate)])
}

// What is worth most stands first, what has no price after it, what is charged last.
function worthFirst(a: WorthLine, b: WorthLine): number {
  return (b.valueCents ?? 0) - (a.valueCents ?? 0) || (b.netGrams ?? 0) - (a.netGrams ?? 0)
    || (a.refrigerant ?? '').localeCompare(b.refrigerant ?? '', 'en', { numeric: true }) || a.condition.localeCompare(b.condition)
}

function grouped<T>(items: readonly T[], key: (item: T) => string): Map<string, T[]> {
  const groups = new Map<string, T[]>()
  for (const item of items) {
    const name = key(item)
    const group = groups.get(name)
    if (group) group.push(item)
    else groups.set(name, [item])
  }
  return groups
}
