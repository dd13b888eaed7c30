import type { Place, Standing } from '../contract/places'

/** What stands in a place or in a whole branch of places. Units: gross grams, of the cylinders whose gross is known. */
export type StandingSum = Omit<Standing, 'placeId'>

/** A place with what stands in it, and the places inside it. */
export interface PlaceBranch {
  place: Place
  /** In the place itself. */
  here: StandingSum
  /** In it and in all that is inside it. */
  within: StandingSum
  inside: PlaceBranch[]
}

const NOTHING: StandingSum = { cylinders: 0, grossGrams: 0, withoutWeight: 0, refrigerants: [] }

/**
 * The places as a tree, each with what stands in it; the order within one place stays.
 *
 * A place whose parent is not given stands at the top, and so does one that stands in itself by way of others.
 */
export function placeBranches(places: readonly Place[], standing: readonly Standing[]): PlaceBranch[] {
  const known = new Set(places.map(({ id }) => id))
  const hereIn = new Map(standing.map(({ placeId, ...sum }) => [placeId, sum]))
  const shown = new Set<string>()

  function branchOf(place: Place): PlaceBranch {
    shown.add(place.id)
    const inside = places.filter(each => each.parentId === place.id && !shown.has(each.id)).map(branchOf)
    const here = hereIn.get(place.id) ?? NOTHING
    return { place, here, within: sumOf([here, ...inside.map(({ within }) => within)]), inside }
  }

  const tops = places.filter(({ parentId }) => parentId === null || !known.has(parentId)).map(branchOf)
  return [...tops, ...places.flatMap(place => shown.has(place.id) ? [] : [branchOf(place)])]
}

/** The places that a place of ours may stand in: in use, no van and no firm's, and not within itself. A new one has no id yet. */
export function placesToStandIn(places: readonly Place[], id: string | null): Place[] {
  const barred = new Set<string>()
  function bar(at: string) {
    if (barred.has(at)) return
    barred.add(at)
    places.filter(({ parentId }) => parentId === at).forEach(each => bar(each.id))
  }
  if (id !== null) bar(id)
  return places.filter(each => each.active && each.kind !== 'firm' && each.kind !== 'van' && !barred.has(each.id))
}

/** What keeps a place from being closed, in words; null where nothing does. */
export function whyNotClose({ here, inside }: PlaceBranch): string | null {
  if (here.cylinders > 0) return `${here.cylinders} ${here.cylinders === 1 ? 'cylinder stands' : 'cylinders stand'} there.`
  const open = inside.filter(({ place }) => place.active)
  return open.length > 0 ? `${open[0]!.place.name} is inside it and in use.` : null
}

function sumOf(all: readonly StandingSum[]): StandingSum {
  const byName = new Map<string | null, number>()
  for (const { refrigerant, cylinders } of all.flatMap(each => each.refrigerants)) byName.set(refrigerant, (byName.get(refrigerant) ?? 0) + cylinders)
  return {
    cylinders: all.reduce((sum, each) => sum + each.cylinders, 0),
    grossGrams: all.reduce((sum, each) => sum + each.grossGrams, 0),
    withoutWeight: all.reduce((sum, each) => sum + each.withoutWeight, 0),
    refrigerants: [...byName].map(([refrigerant, cylinders]) => ({ refrigerant, cylinders })).sort((one, other) => other.cylinders - one.cylinders),
  }
}
