import type { InStatement } from '@libsql/client'
import { jobs } from '../../../drizzle/schema'
import type { MassReading } from '../../../utils/quantity/mass'
import { statement, type Database } from '../database/database'
import { DAY, HOUR, MINUTE } from './calendar'
import type { DemoFirm, DemoPerson } from './cast'
import { daysAgo, fill, made } from './incidents'
import type { Stage } from './lives'
import { seededRandom } from './random'
import { newScript, type ScriptedEvent } from './script'
import { newSteel, pounds, weigh } from './steel'

// Of their own, so that the story stays as it is whatever jobs there are besides.
const SEED = 20_261_215
const LOOKED_BACK_DAYS = 100
const EVERYDAY_JOBS = 18

/** A job of the demo firm; its number comes with the order in which they were made. */
type DemoJob = Omit<typeof jobs.$inferInsert, 'number' | 'changes'>

interface Said { customer: DemoFirm | string, equipment: string, site: string, refrigerant: string | null, charge?: MassReading, keeps: DemoJob['keeps'], opened?: DemoJob['opened'] }

const EQUIPMENT = ['Walk-in cooler 2', 'Rooftop unit 4', 'Ice machine', 'Display case line', 'Process chiller', 'Server room unit'] as const
const NAMED = ['Mossgate Bakery', 'Tidewell Aquarium', 'Quarrystone Library'] as const
const MAJOR = { appliance: 'other', circumstances: 'major', machineMade: 'since-1993-11-15' } as const

/** Ties fills of the last months to jobs, and plays what a customer has banked; gives the jobs. */
export function playJobs(stage: Stage): DemoJob[] {
  const random = seededRandom(SEED)
  const own: Stage = { ...stage, random, script: newScript(random, stage.endAt) }
  const list = [...everyday(own, stage.script.events), ...banked(own), ...consent(own), ...corrected(own)]
  elsewhere(own)
  stage.script.events.push(...own.script.events)
  return list.sort((a, b) => a.createdAt - b.createdAt)
}

/** The jobs as rows, numbered in their order. */
export function jobTables({ read }: Database, list: readonly DemoJob[]): InStatement[] {
  return list.map((job, index) => statement(read.insert(jobs).values({ ...job, number: index + 1 })))
}

function jobOf({ random }: Stage, by: DemoPerson, at: number, { customer, ...said }: Said): DemoJob {
  const isFirm = typeof customer !== 'string'
  return {
    id: random.uuid(at), customerId: isFirm ? customer.id : null, customerName: isFirm ? customer.name : customer, ...said, createdBy: by.id, createdAt: at,
  }
}

/** Fills of ours that happened anyhow: those of one person on one day are of one job. */
function everyday(stage: Stage, events: readonly ScriptedEvent[]): DemoJob[] {
  const { random, cast, endAt } = stage
  const byVisit = new Map<string, ScriptedEvent[]>()
  for (const event of events) {
    const at = Date.parse(event.body['occurredAt'] as string)
    const { refrigerant, ownerOfRefrigerantId } = event.body['details'] as { refrigerant?: string | null, ownerOfRefrigerantId?: string }
    if (event.body['kind'] !== 'filled' || at < endAt - LOOKED_BACK_DAYS * DAY || !refrigerant || ownerOfRefrigerantId) continue
    const visit = `${event.author.id} ${Math.floor(at / DAY)} ${refrigerant}`
    byVisit.set(visit, [...byVisit.get(visit) ?? [], event])
  }
  return [...byVisit.values()].slice(-EVERYDAY_JOBS).map((fills) => {
    const at = Math.min(...fills.map(({ body }) => Date.parse(body['occurredAt'] as string))) - 20 * MINUTE
    const job = jobOf(stage, fills[0]!.author, at, {
      customer: random.chance(0.3) ? cast.firms.dairy : random.pick(NAMED), equipment: random.pick(EQUIPMENT), site: random.pick(cast.sites).name,
      refrigerant: (fills[0]!.body['details'] as { refrigerant: string }).refrigerant, keeps: 'firm',
    })
    for (const { body } of fills) Object.assign(body['details'] as object, { jobId: job.id })
    return job
  })
}

/** A customer's refrigerant in two cylinders, some of which went back into another machine of theirs. */
function banked(stage: Stage): DemoJob[] {
  const { cast, script } = stage
  const { store } = cast.firms
  const { second } = cast.people
  const at = daysAgo(stage, 34)
  const chiller = jobOf(stage, second, at - HOUR, { customer: store, equipment: 'Cold room chiller 3', site: store.address, refrigerant: 'R-22', charge: { unit: 'lb', value: 38 }, keeps: 'customer', opened: MAJOR })
  const theirs = { ownerOfRefrigerantId: store.id, jobId: chiller.id, method: 'push-pull' }
  const large = made(stage, 3).steel
  fill(stage, large, { refrigerant: 'R-22', pounds: 21, days: 34, more: theirs })
  const small = made(stage, 3).steel
  fill(stage, small, { refrigerant: 'R-22', pounds: 15, days: 34, more: { ...theirs, reached: { vacuum: { inHg: 1.5 }, heldMinutes: 10 } } })
  const back = daysAgo(stage, 6)
  const dock = jobOf(stage, second, back - HOUR, { customer: store, equipment: 'Dock cooler', site: store.address, refrigerant: 'R-22', keeps: 'customer' })
  large.netGrams -= pounds(4)
  script.add(second, back, large.id, 'drawn', { grossAfter: weigh(large, second.reads), purpose: 'same-owner', toOwnerId: store.id, jobId: dock.id, phase: 'liquid' })
  return [chiller, dock]
}

/** A customer's own cylinder, filled once with the owner's word and once without. */
function consent(stage: Stage): DemoJob[] {
  const { cast, script, random } = stage
  const { dairy } = cast.firms
  const { warehouse, technician } = cast.people
  const at = daysAgo(stage, 60)
  const steel = newSteel(random, at, 'middle', { testedMonthsAgo: 10 })
  script.add(warehouse, at, steel.id, 'registered', {
    stamp: steel.stamp, marks: [{ month: steel.testedMonth }], ownership: 'customer', ownerId: dairy.id, contents: 'evacuated',
  }, { placeId: cast.racks[0]!.id, lateMs: MINUTE })
  script.add(warehouse, at + MINUTE, steel.id, 'labelled', { code: steel.code }, { lateMs: MINUTE })
  const job = jobOf(stage, technician, daysAgo(stage, 27) - HOUR, { customer: dairy, equipment: 'Milk tank unit', site: dairy.address, refrigerant: 'R-134a', charge: { unit: 'lb', value: 14 }, keeps: 'customer', opened: MAJOR })
  const theirs = { ownerOfRefrigerantId: dairy.id, jobId: job.id, method: 'machine-liquid' }
  fill(stage, steel, { by: 'technician', refrigerant: 'R-134a', pounds: 6, days: 26, more: { ...theirs, ownerConsents: true } })
  fill(stage, steel, { by: 'technician', refrigerant: 'R-134a', pounds: 5, days: 25, more: { ...theirs, reached: { vacuum: { inHg: 6 } } } })
  return [job]
}

/** A recovery that was typed wrongly and corrected: its note is a second issue. */
function corrected(stage: Stage): DemoJob[] {
  const { cast, script } = stage
  const { second, manager } = cast.people
  const job = jobOf(stage, second, daysAgo(stage, 13) - HOUR, { customer: cast.firms.store, equipment: 'Blast freezer', site: cast.firms.store.address, refrigerant: 'R-404A', charge: { unit: 'lb', value: 22 }, keeps: 'firm', opened: MAJOR })
  const { steel } = made(stage, 2)
  fill(stage, steel, { refrigerant: 'R-404A', pounds: 11, days: 12, more: { jobId: job.id, reached: { vacuum: { inHg: 0.4 }, heldMinutes: 5 } } })
  const { id, body } = script.events.at(-1)!
  const wrong = body['details'] as Record<string, unknown>
  script.add(manager, daysAgo(stage, 11), steel.id, 'corrected', {
    eventId: id, reason: 'read before the hoses were off', instead: { ...wrong, grossAfter: { unit: 'lb', value: (wrong['grossAfter'] as { value: number }).value - 0.4 } },
  }, { decides: true })
  return [job]
}

/** Used refrigerant that went where it should not. */
function elsewhere(stage: Stage): void {
  const { cast, script } = stage
  const { third } = cast.people
  const { steel } = made(stage, 4)
  fill(stage, steel, { by: 'third', refrigerant: 'R-134a', pounds: 12, days: 30 })
  steel.netGrams -= pounds(2)
  script.add(third, daysAgo(stage, 8), steel.id, 'drawn', { grossAfter: weigh(steel, third.reads), purpose: 'other' }, { confirmed: ['owner-change'] })
}
