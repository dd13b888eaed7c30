import type { PlanAnswer, PlannedCylinder, PlannedShipment } from '../contract/plans'
import type { Named } from '../custody/cylinderView'
import { massWords } from '../custody/findings/words'
import { isEmptyByScale, mayShip } from '../custody/plan'
import { CONDITION_WORDS } from '../custody/words'
import { counted } from '../now/phrase'
import type { Day } from '../quantity/day'
import { exactGrams } from '../quantity/mass'
import { creditCents, formatMoney, formatRate, priceOn, type DatedPrice } from '../reclaim/price'
import { refusedBy, type ReclaimerTerms } from '../reclaim/terms'
import type { PlanCylinder } from './bars'
import type { Solve } from './linearProgram'
import { plannedCylinder } from './plannedCylinder'
import { ship, type Buyer, type Offer, type ShippingFound } from './ship'

/** A reclaimer with what it takes and pays. */
export interface PlanReclaimer { firm: Named, terms: ReclaimerTerms | null, prices: readonly DatedPrice[] }

/** What to ship to whom is asked with this. */
export interface ShippingQuestion {
  cylinders: readonly PlanCylinder[]
  /** Of other refrigerants by the last analysis, in percent, by cylinder; null where none tells. */
  contamination: ReadonlyMap<string, number | null>
  reclaimers: readonly PlanReclaimer[]
  day: Day
  nameOfFirm: (id: string) => string
}

/** Works out what to ship to whom, and says it as it is kept and shown. */
export async function shippingAnswer(question: ShippingQuestion, solve: Solve, seconds: number): Promise<PlanAnswer> {
  const judged = question.cylinders.map(cylinder => judge(question, cylinder))
  const buyers = question.reclaimers.map(buyerOf)
  const found = await ship(judged.flatMap(({ offer }) => offer ?? []), buyers, solve, seconds)
  const shipments = question.reclaimers.flatMap(reclaimer => shipmentTo(reclaimer, judged, found, question.day))
  const shipped = shipments.reduce((sum, { cylinderIds }) => sum + cylinderIds.length, 0)
  return {
    summary: [...summary(found, shipped), ...question.reclaimers.flatMap(reclaimer => whyNothing(reclaimer, judged, found))],
    freed: shipped, mostFreed: shipped, fewestTransfers: 0, transfers: [], shipments,
    cylinders: judged.map(({ cylinder, bars, offer }): PlannedCylinder => {
      const to = shipments.find(({ cylinderIds }) => cylinderIds.includes(cylinder.view.id))
      const planned = plannedCylinder(cylinder.view, question.nameOfFirm)
      if (to) return { ...planned, part: 'ships', why: [`To ${to.firm.name}, for ${formatMoney(offer!.worthCents.get(to.firm.id)!)}.`] }
      return { ...planned, why: offer && offer.worthCents.size > 0 ? [keptBecause(question, offer), ...bars] : bars }
    }),
  }
}

/** A cylinder with what speaks against shipping it, to anybody or to one firm, and what the others would pay. */
interface Judged { cylinder: PlanCylinder, bars: string[], offer: Offer | null }

function judge({ contamination, reclaimers, day, nameOfFirm }: ShippingQuestion, cylinder: PlanCylinder): Judged {
  const { view, standsOn } = cylinder
  const { contents } = view
  const own = contents.owners.filter(({ ownerId }) => ownerId !== null)
  const bars = [
    ...(standsOn === null ? [] : [`It stands on ${standsOn}.`]),
    ...(isEmptyByScale(view) ? ['Nothing is in it.'] : []),
    ...(contents.netGrams === null ? ['What is in it is not known by weight. Weigh it first.'] : []),
    ...(own.length > 0 ? [`The refrigerant is ${own.map(({ ownerId }) => nameOfFirm(ownerId!)).join(' and ')}'s.`] : []),
    ...mayShip(view).because.map(({ text }) => text),
  ]
  if (bars.length > 0) return { cylinder, bars, offer: null }
  const worthCents = new Map<string, number>()
  for (const { firm, terms, prices } of reclaimers) {
    const refused = refusedBy(terms, view, contamination.get(view.id) ?? null)
    const price = priceOn(prices, { refrigerant: contents.refrigerant, condition: contents.condition, day })
    if (refused[0]) bars.push(`${firm.name}: ${refused[0].text}`)
    else if (price === null) bars.push(`${firm.name}: no price is recorded for it.`)
    else worthCents.set(firm.id, creditCents(price.rate, contents.netGrams!))
  }
  return { cylinder, bars, offer: { id: view.id, netGrams: contents.netGrams!, worthCents } }
}

function buyerOf({ firm, terms }: PlanReclaimer): Buyer {
  return {
    id: firm.id,
    pickUpCents: terms?.pickUpCents ?? 0,
    leastGrams: terms?.minimum ? Math.ceil(exactGrams(terms.minimum)) : 0,
    leastCylinders: terms?.minimumCylinders ?? 0,
  }
}

function shipmentTo({ firm, terms, prices }: PlanReclaimer, judged: readonly Judged[], { to }: ShippingFound, day: Day): PlannedShipment[] {
  const cylinderIds = to.get(firm.id)
  if (cylinderIds === undefined) return []
  const goes = judged.filter(({ cylinder }) => cylinderIds.includes(cylinder.view.id))
  const pickUpCents = terms?.pickUpCents ?? null
  return [{
    firm, cylinderIds: [...cylinderIds],
    netGrams: goes.reduce((sum, { offer }) => sum + offer!.netGrams, 0),
    creditCents: goes.reduce((sum, { offer }) => sum + offer!.worthCents.get(firm.id)!, 0),
    pickUpCents,
    isMinimumMet: true,
    says: [
      ...ratesIn(goes, prices, day),
      ...(pickUpCents === null ? ['What a pick-up costs is not known and counts for nothing here. Ask first.'] : []),
    ],
  }]
}

/** At which rates, a sentence for each refrigerant and condition. */
function ratesIn(goes: readonly Judged[], prices: readonly DatedPrice[], day: Day): string[] {
  const said = goes.flatMap(({ cylinder: { view: { contents: { refrigerant, condition } } } }) => {
    const price = priceOn(prices, { refrigerant, condition, day })
    return price ? [`${refrigerant ?? 'Not named'}, ${CONDITION_WORDS[condition]}: ${formatRate(price.rate)}.`] : []
  })
  return [...new Set(said)]
}

function summary({ cents, mostCents }: ShippingFound, shipped: number): string[] {
  if (shipped === 0) return ['Nothing is worth shipping as it stands.']
  return [
    `${counted(shipped, 'cylinder', 'cylinders')} to ship for ${formatMoney(cents)}, pick-ups paid.`,
    cents === mostCents ? 'No other way of shipping them brings more, by the terms and prices recorded.' : `It is the best found in the time given: no plan brings more than ${formatMoney(mostCents)}.`,
  ]
}

/** Why a firm that would take something gets nothing: its minimum, or its cost. */
function whyNothing({ firm, terms }: PlanReclaimer, judged: readonly Judged[], { to }: ShippingFound): string[] {
  const offers = judged.flatMap(({ offer }) => offer?.worthCents.has(firm.id) ? [offer] : [])
  if (to.has(firm.id) || offers.length === 0) return []
  const { leastGrams, leastCylinders, pickUpCents } = buyerOf({ firm, terms, prices: [] })
  const netGrams = offers.reduce((sum, offer) => sum + offer.netGrams, 0)
  if (netGrams < leastGrams) return [`${firm.name} fetches from ${massWords(leastGrams, 'nearest')} on; what it takes comes to ${massWords(netGrams, 'nearest')}. Its minimum is not met.`]
  if (offers.length < leastCylinders) return [`${firm.name} fetches from ${counted(leastCylinders, 'cylinder', 'cylinders')} on; it takes ${offers.length} of these. Its minimum is not met.`]
  const credit = offers.reduce((sum, offer) => sum + Math.max(0, offer.worthCents.get(firm.id)!), 0)
  return [`${firm.name} would pay ${formatMoney(credit)} at most for what it takes${pickUpCents > 0 ? `, and a pick-up costs ${formatMoney(pickUpCents)}` : ''}. What is planned brings more.`]
}

function keptBecause({ reclaimers }: ShippingQuestion, { worthCents }: Offer): string {
  const [best] = [...worthCents].sort((a, b) => b[1] - a[1])
  const name = reclaimers.find(({ firm }) => firm.id === best![0])!.firm.name
  return best![1] > 0 ? `${name} would pay ${formatMoney(best![1])}, but a shipment there is not worth it now.` : `${name} would charge ${formatMoney(-best![1])} for it.`
}
