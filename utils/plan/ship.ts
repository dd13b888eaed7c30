import { isChosen, programText, type Row, type Solution, type Solve, type Terms } from './linearProgram'

/** A cylinder with what each firm that takes it would pay for what is in it; below nothing where it is charged. Units: grams, cents. */
export interface Offer { id: string, netGrams: number, worthCents: ReadonlyMap<string, number> }

/** A firm with what a pick-up by it costs and takes. Units: grams, cents. */
export interface Buyer { id: string, pickUpCents: number, leastGrams: number, leastCylinders: number }

/** Who gets which cylinders, what it comes to, and what no plan can pass. */
export interface ShippingFound { to: ReadonlyMap<string, readonly string[]>, cents: number, mostCents: number }

/**
 * What to ship to whom for the most money: credits less charges and pick-ups, each shipment with its firm's minimum met.
 *
 * Errors: none; where no plan is worth anything, nothing goes to anybody.
 */
export async function ship(offers: readonly Offer[], buyers: readonly Buyer[], solve: Solve, seconds: number): Promise<ShippingFound> {
  const goes = offers.flatMap((offer, from) => buyers.flatMap((buyer, to) => offer.worthCents.has(buyer.id) ? [{ offer, buyer, to, variable: `s${from}_${to}` }] : []))
  if (goes.length === 0) return { to: new Map(), cents: 0, mostCents: 0 }
  const comes = (to: number) => `o${to}`
  const aim: Terms = [
    ...goes.map(({ offer, buyer, variable }) => [offer.worthCents.get(buyer.id)!, variable] as const),
    ...buyers.map(({ pickUpCents }, to) => [-pickUpCents, comes(to)] as const),
  ]
  const rows: Row[] = [
    ...offers.map((offer): Row => ({ terms: goes.filter(go => go.offer === offer).map(({ variable }) => [1, variable] as const), is: '<=', figure: 1 })),
    ...goes.map(({ to, variable }): Row => ({ terms: [[1, variable], [-1, comes(to)]], is: '<=', figure: 0 })),
    ...buyers.flatMap(({ leastGrams, leastCylinders }, to): Row[] => {
      const mine = goes.filter(go => go.to === to)
      return [
        { terms: [...mine.map(({ offer, variable }) => [offer.netGrams, variable] as const), [-leastGrams, comes(to)]], is: '>=', figure: 0 },
        // One at least: nobody is paid for fetching nothing.
        { terms: [...mine.map(({ variable }) => [1, variable] as const), [-Math.max(1, leastCylinders), comes(to)]], is: '>=', figure: 0 },
      ]
    }),
  ]
  const solution = await solve(programText({ goal: 'Maximize', aim, rows, binaries: [...goes.map(({ variable }) => variable), ...buyers.map((_, to) => comes(to))] }), { seconds })
  const bound = goes.reduce((most, { offer }) => most.set(offer.id, Math.max(0, ...offer.worthCents.values())), new Map<string, number>())
  const found = answerOf(offers, buyers, goes, solution)
  return { ...found, mostCents: solution.status === 'optimal' ? found.cents : [...bound.values()].reduce((sum, cents) => sum + cents, 0) }
}

type Go = { offer: Offer, buyer: Buyer, variable: string }

// Of the solver's answer only the choices are taken; what they come to is reckoned anew, and a minimum that is not met counts for nothing.
function answerOf(offers: readonly Offer[], buyers: readonly Buyer[], goes: readonly Go[], solution: Solution): Pick<ShippingFound, 'to' | 'cents'> {
  const taken = new Set<string>()
  const to = new Map<string, string[]>()
  let cents = 0
  for (const buyer of buyers) {
    const mine = goes.filter(go => go.buyer === buyer && isChosen(solution, go.variable) && !taken.has(go.offer.id))
    const netGrams = mine.reduce((sum, { offer }) => sum + offer.netGrams, 0)
    if (mine.length < Math.max(1, buyer.leastCylinders) || netGrams < buyer.leastGrams) continue
    mine.forEach(({ offer }) => taken.add(offer.id))
    to.set(buyer.id, mine.map(({ offer }) => offer.id))
    cents += mine.reduce((sum, { offer }) => sum + offer.worthCents.get(buyer.id)!, 0) - buyer.pickUpCents
  }
  return cents > 0 ? { to, cents } : { to: new Map(), cents: 0 }
}
