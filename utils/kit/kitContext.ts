import type { Access } from '../access/roles'
import { DEFAULT_FILL_POLICY } from '../capacity/types'
import type { KitFirm } from '../contract/kit'
import type { SaidByOthers } from '../custody/saidByOthers'
import type { Names, ViewContext } from '../custody/view'
import { asListed } from '../refrigerant/designation'
import type { Catalogue } from '../refrigerant/types'
import { DEFAULT_RETEST_SETTINGS, type RetestSettings } from '../requalification/retestSettings'

/** What is asked, by whom and when. */
export interface KitAsking { nowMs: number, access: Access | null, askedRefrigerant?: string | null }

/** The names by which the firm knows places, persons and firms; what nobody knows reads as its id. */
export function kitNames({ places, people, firms }: Pick<KitFirm, 'places' | 'people' | 'firms'>): Names {
  const placeOf = byId(places)
  const personOf = byId(people)
  const firmOf = byId(firms)
  const named = (known: { name: string, kind: string } | undefined, id: string) => known ? { id, name: known.name, kind: known.kind } : { id, name: id }
  return {
    place: id => named(placeOf.get(id), id),
    person: id => ({ id, name: personOf.get(id)?.name ?? id }),
    firm: id => named(firmOf.get(id), id),
  }
}

/** What a view takes from outside the log, out of a phone's copy of the firm. */
export function kitContext(firm: KitFirm, names: Names, catalogue: Catalogue, said: SaidByOthers, { nowMs, access, askedRefrigerant }: KitAsking): ViewContext {
  const { policy } = firm
  const policyAt = (ms: number) => policy.fillPolicies.findLast(entry => entry.fromAt <= ms)?.policy ?? DEFAULT_FILL_POLICY
  const retestAt = (ms: number): RetestSettings => policy.retests.findLast(entry => entry.fromAt <= ms)?.retest ?? DEFAULT_RETEST_SETTINGS
  const placeOfFirm = new Map(firm.places.flatMap(place => place.firmId ? [[place.firmId, place.id]] : []))
  return {
    nowMs,
    timeZone: policy.timeZone,
    policyNow: policyAt(nowMs),
    policyAt,
    catalogue,
    scales: byId(policy.scales),
    retest: retestAt(nowMs),
    retestAt,
    placeOfFirm: id => placeOfFirm.get(id) ?? null,
    askedRefrigerant: askedRefrigerant ? asListed(askedRefrigerant, catalogue.refrigerants.keys()) : null,
    access,
    ...said,
    names,
  }
}

function byId<T extends { id: string }>(all: readonly T[]): Map<string, T> {
  return new Map(all.map(one => [one.id, one]))
}
