import type { ReclaimerTerms } from './terms'
import { isReached, ourLines, worthSum, type WorthOffer, type WorthSum } from './worth'

/** An offer with the names of the reclaimer and the place, and the terms it is judged by. */
export interface NamedOffer { offer: WorthOffer, firm: string, place: string, terms: ReclaimerTerms, sum: WorthSum }

/** Offers with names, what is worth a pick-up first and by what it comes to; those of which nothing would go are left out. */
export function offersInOrder(
  offers: readonly WorthOffer[], takers: readonly { id: string, name: string, terms: ReclaimerTerms }[], places: readonly { id: string, name: string }[],
): NamedOffer[] {
  return offers.flatMap((offer) => {
    const taker = takers.find(({ id }) => id === offer.takerId)
    const place = places.find(({ id }) => id === offer.placeId)
    if (!taker || !place || offer.lines.length === 0) return []
    return [{ offer, firm: taker.name, place: place.name, terms: taker.terms, sum: worthSum(ourLines(offer.lines), taker.terms) }]
  }).sort((a, b) => Number(isReached(b.sum)) - Number(isReached(a.sum)) || comesTo(b.sum) - comesTo(a.sum)
    || b.sum.netGrams - a.sum.netGrams || `${a.firm} ${a.place}`.localeCompare(`${b.firm} ${b.place}`, 'en'))
}

// What is not known stands between what comes to something and what costs.
function comesTo({ comesToCents, ourCents }: WorthSum): number {
  return comesToCents ?? ourCents ?? 0
}
