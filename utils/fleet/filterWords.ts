import type { FleetQuery } from '../contract/custody'
import type { FindingCode } from '../custody/finding'
import { CONDITION_WORDS, FINDING_WORDS, STAGE_WORDS } from '../custody/words'
import { addMonths, formatMonth } from '../quantity/month'
import { FLEET_FILTERS, type FleetFilter } from './fleetAddress'

/** One filter that is set, as the end of "No cylinder is ...". */
export interface FilterWords { key: FleetFilter, words: string }

const FINDING_FILTER_WORDS: Record<string, string> = {
  'stop': 'under a stop',
  'caution': 'in need of attention',
  'overfill': 'overfilled',
  'nearly-full': 'full or nearly full',
  'not-seen': 'unseen lately',
  'weight-not-known': 'without a known weight',
  'retest-overdue': 'late for its retest',
  'retest-soon': 'soon due for its retest',
}

type Named = { id: string, name: string }

/** Who and what a filter may name by its id. */
export interface FilterNames { places: readonly Named[], people: readonly Named[], firms: readonly Named[] }

/** The filters of a fleet question, each in words. */
export function filtersInWords(query: FleetQuery, names: FilterNames): FilterWords[] {
  return FLEET_FILTERS.flatMap((key) => {
    const value = query[key]
    return value === undefined ? [] : [{ key, words: words(key, value, names) }]
  })
}

/** The change that clears one filter. */
export function withoutFilter(key: FleetFilter): Partial<Record<FleetFilter, null>> {
  return { [key]: null }
}

function words(key: FleetFilter, value: string, { places, people, firms }: FilterNames): string {
  const nameOf = (list: readonly Named[]) => list.find(one => one.id === value)?.name
  switch (key) {
    case 'q': return `found by “${value}”`
    case 'place': return `at ${nameOf(places) ?? 'that place'}`
    case 'holder': return `with ${nameOf(people) ?? 'that person'}`
    case 'refrigerant': return `holding ${value}`
    case 'condition': return `of condition ${CONDITION_WORDS[value as keyof typeof CONDITION_WORDS]}`
    case 'lifecycle': return STAGE_WORDS[value as keyof typeof STAGE_WORDS]
    case 'dueBefore': return `due by the end of ${formatMonth(addMonths(value, -1))}`
    case 'finding': return FINDING_FILTER_WORDS[value] ?? `marked “${FINDING_WORDS[value as FindingCode] ?? value}”`
    case 'owner': return `owned by ${nameOf(firms) ?? 'that owner'}`
    case 'label': return `labelled ${value}`
  }
}
