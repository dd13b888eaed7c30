import { can } from '../../../utils/access/permissions'
import type { Access } from '../../../utils/access/roles'
import type { NowAnswer } from '../../../utils/contract/now'
import { fleetQuestions } from '../../../utils/now/fleetQuestions'
import type { NowFacts } from '../../../utils/now/nowFacts'
import { nowLines } from '../../../utils/now/nowLines'
import { topicsFor, type NowTopic } from '../../../utils/now/nowTopics'
import type { MassUnit } from '../../../utils/quantity/mass'
import { dateBounds } from '../custody/dateBounds'
import { logHead } from '../custody/logHead'
import type { Database } from '../database/database'
import { directory, type Directory } from '../directory/directory'
import { differingShipments } from '../shipments/paperDifferences'
import { cylinderFacts, fewEmptyFacts, fullFacts, unlabelledFacts, unseenFacts } from './cylinderFacts'
import { lateFacts } from './lateFacts'
import { listFacts, shortVanFacts, vanFacts } from './listFacts'
import { entryFacts, logCheckFacts, mailFacts, peopleAndPlaces, ruleFacts, scaleFacts } from './recordFacts'
import { planFacts } from './planFacts'
import { unsignedFacts } from './signatureFacts'
import { worthFacts } from './worthFacts'

/** What waits for a person, by their roles: nothing of another's is looked up. */
export async function nowAnswer(db: Database, access: Access, unit: MassUnit, nowMs: number): Promise<NowAnswer> {
  // Before all else: what is recorded meanwhile is then asked for once more.
  const { seq } = await logHead(db)
  // Read anew: who comes back from sending an invitation finds it here.
  const from = await directory(db, true)
  const topics = topicsFor(access.roles)
  const facts = await factsFor(db, from, topics, access.personId, nowMs)
  const reader = { unit, now: nowMs, timeZone: from.timeZone, mayI: (permission: Parameters<typeof can>[1]) => can(access, permission) }
  return { seq, asOf: new Date(nowMs).toISOString(), lines: nowLines(facts, topics, reader) }
}

async function factsFor(db: Database, from: Directory, topics: ReadonlySet<NowTopic>, personId: string, nowMs: number): Promise<NowFacts> {
  const bounds = dateBounds(from, nowMs)
  const when = <T>(topic: NowTopic, look: () => Promise<T>) => topics.has(topic) ? look() : undefined
  const [cylinders, unseen, full, worthPickUp, fewEmpty, unlabelled, vans, shortVans, lists, plansOpen, toCountersign, unsigned, cameLate, papersDiffer, logCheck, entries, mailFailed] = await Promise.all([
    cylinderFacts(db, fleetQuestions(topics, personId), bounds, nowMs),
    when('not-seen', () => unseenFacts(db, from, bounds, nowMs)),
    when('full', () => fullFacts(db, bounds)),
    when('worth-pick-up', () => worthFacts(db, nowMs)),
    when('few-empty', () => fewEmptyFacts(db, bounds)),
    when('unlabelled', () => unlabelledFacts(db, nowMs)),
    when('van-load', () => vanFacts(db, from, personId, nowMs)),
    when('vans-short', () => shortVanFacts(db, from, nowMs)),
    when('shipment-drafts', () => listFacts(db, nowMs)),
    when('plan-steps', () => planFacts(db, nowMs)),
    when('to-countersign', () => unsignedFacts(db, from, personId)),
    when('unsigned', () => unsignedFacts(db, from)),
    when('came-late', () => lateFacts(db, from, nowMs)),
    when('papers-differ', () => differingShipments(db, nowMs)),
    when('log-broken', () => logCheckFacts(db)),
    when('corrections', () => entryFacts(db, nowMs)),
    when('mail-failed', () => mailFacts(db)),
  ])
  return {
    cylinders, lastSoonMonth: bounds.lastSoonMonth, unseen, full, worthPickUp, fewEmpty, unlabelled, vans, shortVans, ...lists, plansOpen, toCountersign: toCountersign?.[0], unsigned, cameLate, papersDiffer, logCheck, entries, mailFailed,
    rule: ruleFacts(from, nowMs), scaleChecks: scaleFacts(from, nowMs), ...peopleAndPlaces(from),
  }
}
