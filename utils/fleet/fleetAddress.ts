import type { FleetQuery } from '../contract/custody'
import { FLEET_CHOICES, FLEET_IDS, FLEET_TEXTS } from '../contract/fleetQuestion'
import { readInstant } from '../address/queryInstant'
import { isMonth } from '../quantity/month'

/** Cylinders on one page of the fleet. */
const FLEET_PAGE = 100

/** What stands in the fleet's address, as a router hands it over. */
export type AddressQuery = Record<string, string | null | undefined | (string | null)[]>

/** The filters of the fleet that a person can clear one by one. */
export const FLEET_FILTERS = ['q', 'place', 'holder', 'refrigerant', 'condition', 'lifecycle', 'dueBefore', 'finding', 'owner', 'label'] as const
export type FleetFilter = (typeof FLEET_FILTERS)[number]

/** The parts that ask for the fleet of a past instant. */
const PAST_PARTS = ['asOf', 'knownAt'] as const

const ID = /^[\da-f]{8}-[\da-f]{4}-[1-8][\da-f]{3}-[89ab][\da-f]{3}-[\da-f]{12}$/

/**
 * The question that a fleet address asks. A part that cannot be read is left out, so that an old address still opens the fleet.
 *
 * Read here without the schema of the route, which the browser would have to fetch.
 */
export function readFleetAddress(address: AddressQuery): FleetQuery {
  const parts: [key: string, read: (text: string) => string | null][] = [
    ...Object.entries(FLEET_TEXTS).map(([key, longest]): typeof parts[number] => [key, text => text.length <= longest ? text : null]),
    ...Object.entries(FLEET_CHOICES).map(([key, known]): typeof parts[number] => [key, text => (known as readonly string[]).includes(text) ? text : null]),
    ...FLEET_IDS.map((key): typeof parts[number] => [key, text => ID.test(text.toLowerCase()) ? text.toLowerCase() : null]),
    ['dueBefore', text => isMonth(text) ? text : null],
    ...PAST_PARTS.map((key): typeof parts[number] => [key, readInstant]),
  ]
  const known = parts.flatMap(([key, read]) => {
    const value = address[key]
    const text = typeof value === 'string' ? read(value.trim()) : null
    return text ? [[key, text] as const] : []
  })
  return { limit: FLEET_PAGE, sort: 'urgency', order: 'asc', ...Object.fromEntries(known) }
}

/** The address with something changed: a null clears its part, and any change but of the page begins at the first page again. */
export function changeFleetAddress(address: AddressQuery, change: Partial<Record<keyof FleetQuery, string | null>>): Record<string, string> {
  const query = readFleetAddress(address)
  const next: Record<string, string | null | undefined> = {
    ...Object.fromEntries([...FLEET_FILTERS, ...PAST_PARTS].map(name => [name, query[name]])),
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
