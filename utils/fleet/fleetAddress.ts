import { fleetQuery, type FleetQuery } from '../contract/custody'

/** Cylinders on one page of the fleet. */
export const FLEET_PAGE = 100

/** What stands in the fleet's address, as a router hands it over. */
export type AddressQuery = Record<string, string | null | undefined | (string | null)[]>

/** The filters of the fleet that a person can clear one by one. */
export const FLEET_FILTERS = ['q', 'place', 'holder', 'refrigerant', 'condition', 'lifecycle', 'dueBefore', 'finding', 'owner', 'label'] as const
export type FleetFilter = (typeof FLEET_FILTERS)[number]

/** The question that a fleet address asks. A part that cannot be read is left out, so that an old address still opens the fleet. */
export function readFleetAddress(address: AddressQuery): FleetQuery {
  const known: Record<string, unknown> = { limit: FLEET_PAGE }
  for (const [key, schema] of Object.entries(fleetQuery.shape)) {
    const value = address[key]
    if (key !== 'limit' && typeof value === 'string' && value !== '' && schema.safeParse(value).success) known[key] = value
  }
  return fleetQuery.parse(known)
}

/** The address with something changed: a null clears its part, and any change but of the page begins at the first page again. */
export function changeFleetAddress(address: AddressQuery, change: Partial<Record<keyof FleetQuery, string | null>>): Record<string, string> {
  const query = readFleetAddress(address)
  const next: Record<string, string | null | undefined> = {
    ...Object.fromEntries(FLEET_FILTERS.map(name => [name, query[name]])),
    sort: query.sort === 'urgency' ? null : query.sort,
    order: query.order === 'asc' ? null : query.order,
    ...change,
  }
  return Object.fromEntries(Object.entries(next).filter((part): part is [string, string] => typeof part[1] === 'string' && part[1] !== ''))
}

/** The question as the server takes it: without what was left open. */
export function fleetRequest(query: FleetQuery): Record<string, string | number> {
  return Object.fromEntries(Object.entries(query).filter((part): part is [string, string | number] => part[1] !== undefined))
}

/** Whether two addresses ask for the same filters in the same order. */
export function isSameAddress(one: AddressQuery, other: AddressQuery): boolean {
  const [first, second] = [changeFleetAddress(one, {}), changeFleetAddress(other, {})]
  const keys = Object.keys(first)
  return keys.length === Object.keys(second).length && keys.every(key => first[key] === second[key])
}
