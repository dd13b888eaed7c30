import type { Answering, Asked } from '~~/composables/offlineAnswers'
import type { JobsAnswer } from '~~/utils/contract/jobs'
import type { PeopleAnswer } from '~~/utils/contract/people'
import type { Firm, FirmsAnswer, Place, PlacesAnswer } from '~~/utils/contract/places'
import type { PolicyAnswer } from '~~/utils/contract/policy'
import type { RefrigerantsAnswer, SaturationAnswer } from '~~/utils/contract/refrigerants'
import type { ScalesAnswer } from '~~/utils/contract/scales'
import type { VanAnswer } from '~~/utils/contract/vans'
import { DEFAULT_FILL_POLICY } from '~~/utils/capacity/types'
import { isGivenAway } from '~~/utils/custody/lifecycle'
import { kitNames } from '~~/utils/kit/kitContext'
import { asListed } from '~~/utils/refrigerant/designation'
import { DEFAULT_RETEST_SETTINGS } from '~~/utils/requalification/retestSettings'

type Answer = (answering: Answering, asked: Asked) => Promise<unknown | undefined>

/** How the copy answers for a list of the firm, or for one of a list by its id; null where it does not. */
export function offlineLists(list: string, id: string | null): Answer | null {
  if (id !== null) return list === 'vans' ? answering => theVan(answering, id) : null
  return LISTS[list] ?? null
}

const LISTS: Record<string, Answer | undefined> = { places, firms, people, policy, scales, refrigerants, jobs }

async function places(answering: Answering, asked: Asked): Promise<PlacesAnswer> {
  const items = await counted(answering, answering.firm.places.filter(used(asked)), ({ id }) => id)
  return { items, nextCursor: null, total: items.length }
}

async function firms(answering: Answering, asked: Asked): Promise<FirmsAnswer> {
  const found = answering.firm.firms.filter(used(asked)).filter(({ kind }) => asked['kind'] === undefined || kind === asked['kind'])
  const items = await counted(answering, found, ({ placeId }) => placeId)
  return { items, nextCursor: null, total: items.length }
}

// What came out is with the server; which job it was is enough to record a fill. A copy of before has no jobs.
async function jobs({ firm }: Answering, { limit: _, ...asked }: Asked): Promise<JobsAnswer | undefined> {
  if (Object.keys(asked).length > 0) return undefined
  return { items: (firm.jobs ?? []).map(job => ({ ...job, cylinders: null, recoveredGrams: null, notKnown: 0 })), nextCursor: null }
}

async function people({ firm }: Answering, asked: Asked): Promise<PeopleAnswer> {
  return { items: firm.people.filter(used(asked)) }
}

async function scales({ firm }: Answering, asked: Asked): Promise<ScalesAnswer> {
  const items = firm.scales.filter(used(asked))
  return { items, nextCursor: null, total: items.length }
}

async function policy({ firm: { policy: told }, nowMs }: Answering): Promise<PolicyAnswer> {
  return {
    asOf: nowMs,
    ...told,
    fillPolicy: told.fillPolicies.findLast(({ fromAt }) => fromAt <= nowMs)?.policy ?? DEFAULT_FILL_POLICY,
    retest: told.retests.findLast(({ fromAt }) => fromAt <= nowMs)?.retest ?? DEFAULT_RETEST_SETTINGS,
    rowsBehind: 0,
  }
}

async function refrigerants(): Promise<RefrigerantsAnswer> {
  const [{ CATALOGUE }, { catalogueLines }] = await Promise.all([import('~~/utils/refrigerant/allRefrigerants'), import('~~/utils/refrigerant/lines')])
  const { items, compositions } = catalogueLines(CATALOGUE)
  return { items, nextCursor: null, total: items.length, compositions }
}

/** Saturation of a refrigerant; where it is not in the catalogue, or outside of its table, the server says so. */
export async function saturation(designation: string, { temperatureC }: Asked): Promise<SaturationAnswer | undefined> {
  const [{ CATALOGUE }, { hasLiquidAt, saturationAt }] = await Promise.all([import('~~/utils/refrigerant/allRefrigerants'), import('~~/utils/refrigerant/saturation')])
  const refrigerant = CATALOGUE.refrigerants.get(asListed(designation, CATALOGUE.refrigerants.keys()))
  const celsius = Number(temperatureC ?? NaN)
  return refrigerant && hasLiquidAt(refrigerant, celsius) ? saturationAt(refrigerant, celsius) : undefined
}

async function theVan(answering: Answering, id: string): Promise<VanAnswer | undefined> {
  const { reader, firm, isWhole } = answering
  const place = firm.places.find(one => one.id === id && one.kind === 'van')
  if (!place || !isWhole) return undefined
  const said = firm.vans.find(({ vanId }) => vanId === id)
  const checkIn = said?.checkIn ?? null
  const checked = checkIn && { checkedBy: kitNames(firm).person(checkIn.checkedBy), checkedAt: checkIn.checkedAt }
  const [[van], aboard, held, missed] = await Promise.all([
    counted(answering, [place], one => one.id),
    reader.at(id),
    place.technicianId === null ? [] : reader.heldBy(place.technicianId),
    reader.byIds(checkIn?.missing ?? []),
  ])
  const unseen = missed.filter(state => state.retired === null && !isGivenAway(state)
    && (state.lastSeenAt === null || state.lastSeenAt <= Date.parse(checkIn!.checkedAt)))
  const [aboardRows, heldRows, unseenRows] = await Promise.all([
    reader.rowsOf(aboard), reader.rowsOf(held.filter(({ placeId }) => placeId !== id)), reader.rowsOf(unseen),
  ])
  return {
    van: van!,
    aboard: aboardRows,
    heldElsewhere: heldRows,
    materials: said?.materials ?? null,
    toLookFor: unseenRows.map(cylinder => ({ cylinder, ...checked! })),
    lastCheckIn: checked,
  }
}

function used({ active }: Asked): (one: { active: boolean }) => boolean {
  return one => active === undefined || one.active === (active === 'true')
}

async function counted<T extends Omit<Place, 'cylinders'> | Omit<Firm, 'cylinders'>>(
  { count }: Answering, items: readonly T[], placeOf: (item: T) => string,
): Promise<(T & { cylinders: number })[]> {
  const counts = await count(items.map(placeOf))
  return items.map((item, index) => ({ ...item, cylinders: counts[index] ?? 0 }))
}
