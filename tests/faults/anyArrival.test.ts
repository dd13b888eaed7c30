import { afterEach, expect, it } from 'vitest'
import { people, places } from '../../drizzle/schema'
import { cylinderViews } from '../../server/utils/custody/cylinderViews'
import { rebuildCaches } from '../../server/utils/custody/rebuild'
import { statement } from '../../server/utils/database/database'
import { cacheLines } from '../helpers/caches'
import { IN_FULL, seeds } from '../helpers/inFull'
import { openLogDatabase, record, type LogDatabase } from '../helpers/logDatabase'
import { lb, stampOf } from '../helpers/stamps'
import { seededChance, type Chance } from '../helpers/tampering'

const PHONES = IN_FULL ? 500 : 80
const SIZES = seeds(IN_FULL ? 20 : 3).map(seed => [PHONES, seed] as const)

const EVENTS_OF_A_PHONE = 20
/** Of a hundred events so many are sent a second time. */
const REPEATED_PERCENT = 30
const MOST_IN_A_POST = 7

const DAY = 86_400_000
const MINUTE = 60_000
/** Everything happens from here on, minute by minute. */
const BEGIN = Date.UTC(2026, 5, 1, 12)

/** The same in both logs, so that their views can be compared. */
const SHOP = '0198f000-0000-7000-8000-00000000f0a1'
const VAN = '0198f000-0000-7000-8000-00000000f0a2'
const WORKER = { personId: '0198f000-0000-7000-8000-00000000f0b1', roles: ['warehouse' as const], trainee: false }

interface Happening { cylinderId: string, kind: string, placeId?: string, details: object }

/** Something that happened, by the true time, and as the phone that saw it has it in its queue. */
interface Seen { at: number, skewMs: number, event: Happening & { id: string } }

const open: LogDatabase[] = []
afterEach(() => open.splice(0).forEach(log => log.close()))

async function logOfTheFirm(): Promise<LogDatabase> {
  const log = await openLogDatabase()
  open.push(log)
  await log.db.write([
    statement(log.db.read.insert(people).values({ id: WORKER.personId, email: 'wes@firm.example', name: 'Wes', roles: [...WORKER.roles], units: 'lb', createdAt: 0 })),
    statement(log.db.read.insert(places).values({ id: SHOP, name: 'North shop', kind: 'shop', createdAt: 0 })),
    statement(log.db.read.insert(places).values({ id: VAN, name: 'Van 2', kind: 'van', createdAt: 0 })),
  ])
  return log
}

/** An id of chance, the same for the same seed. */
function newId(chance: Chance): string {
  const hex = (digits: number) => Array.from({ length: digits }, () => chance(16).toString(16)).join('')
  return `${hex(8)}-${hex(4)}-7${hex(3)}-8${hex(3)}-${hex(12)}`
}

/** What happens at a cylinder, facts of every sort; a decision stands on the version that was looked at, so it has no place here. */
function happening(id: string, other: string, chance: Chance): Happening[] {
  const gross = lb(28 + chance(400) / 20)
  const refrigerant = ['R-22', 'R-22', 'R-22', 'R-410A'][chance(4)]!
  const pair = { transferId: newId(chance), refrigerant: 'R-22', condition: 'clean' }
  const all: (() => Happening[])[] = [
    () => [{ cylinderId: id, kind: 'weighed', details: { gross } }],
    () => [{ cylinderId: id, kind: 'filled', details: { refrigerant, grossAfter: gross, looked: true } }],
    () => [{ cylinderId: id, kind: 'drawn', details: { grossAfter: gross, purpose: 'same-system' } }],
    () => [{ cylinderId: id, kind: 'emptied', details: { grossAfter: lb(27.5), vacuum: { microns: 400 } } }],
    () => [{ cylinderId: id, kind: 'lost', details: { cause: 'leak', grossAfter: gross } }],
    () => [{ cylinderId: id, kind: 'moved', details: { toPlaceId: chance(2) ? SHOP : VAN } }],
    () => [{ cylinderId: id, kind: 'handed-over', details: { toHolderId: WORKER.personId } }],
    () => [{ cylinderId: id, kind: 'received', placeId: SHOP, details: { gross } }],
    () => [{ cylinderId: id, kind: 'checked', details: { method: 'identifier', verdict: { refrigerant, condition: 'clean' } } }],
    () => [{ cylinderId: id, kind: 'inspected', details: chance(4) ? { result: 'sound' } : { result: 'damaged', reasons: ['dent'] } }],
    () => [{ cylinderId: id, kind: 'quarantined', details: { reason: 'an oily valve' } }],
    () => [{ cylinderId: id, kind: 'missing', details: { lastSeen: 'on a roof' } }],
    () => [{ cylinderId: id, kind: 'found', details: { placeId: VAN } }],
    () => [
      { cylinderId: id, kind: 'transferred', details: { ...pair, direction: 'out', counterpartId: other, grossAfter: lb(30) } },
      { cylinderId: other, kind: 'transferred', details: { ...pair, direction: 'in', counterpartId: id, grossAfter: gross } },
    ],
  ]
  return all[chance(all.length)]!()
}

/** What the phones saw, in the order in which it truly happened. */
function storyOf(count: number, chance: Chance): { phones: Seen[][], inOrder: Seen[] } {
  const cylinders = Array.from({ length: count }, () => newId(chance))
  const skews = Array.from({ length: count }, () => (chance(3) ? Math.round((chance(2 * DAY) - DAY) / 1000) * 1000 : 0))
  const phones: Seen[][] = Array.from({ length: count }, () => [])
  const inOrder: Seen[] = []
  const saw = (phone: number, what: Happening) => {
    const at = BEGIN + inOrder.length * MINUTE
    // As the phone's clock had it.
    const occurredAt = new Date(at + skews[phone]!).toISOString()
    const event = { ...what, id: newId(chance), occurredAt, deviceId: `phone-${phone}`, deviceSeq: phones[phone]!.length }
    const seen = { at, skewMs: skews[phone]!, event }
    phones[phone]!.push(seen)
    inOrder.push(seen)
  }
  cylinders.forEach((cylinderId, phone) => saw(phone, {
    cylinderId, kind: 'registered', placeId: SHOP,
    details: { stamp: stampOf({ serial: `T${phone}` }), marks: [{ month: '2025-06' }], ownership: 'own', contents: { refrigerant: 'R-22', condition: 'clean' }, gross: lb(40) },
  }))
  const busy = () => phones.flatMap((seen, phone) => seen.length < EVENTS_OF_A_PHONE ? [phone] : [])
  for (let left = busy(); left.length > 0; left = busy()) {
    const one = chance(count)
    const happened = happening(cylinders[one]!, cylinders[(one + 1) % count]!, chance)
    // Both halves of a pair are not always seen by one phone.
    for (const half of happened) saw(left[chance(left.length)]!, half)
  }
  return { phones, inOrder }
}

function shuffled<T>(all: readonly T[], chance: Chance): T[] {
  const left = [...all]
  return all.map(() => left.splice(chance(left.length), 1)[0]!)
}

/** What a phone sends: everything it saw, in any order, some of it twice, cut anywhere into posts. */
function postsOf(seen: readonly Seen[], chance: Chance): Seen[][] {
  const queue = shuffled([...seen, ...seen.filter(() => chance(100) < REPEATED_PERCENT)], chance)
  const posts: Seen[][] = []
  while (queue.length > 0) posts.push(queue.splice(0, 1 + chance(MOST_IN_A_POST)))
  return posts
}

it.each(SIZES)('shows the cylinders of %i phones as if each event had come at once and in its order, whatever the order they came in (seed %i)', { timeout: 3_600_000 }, async (count, seed) => {
  const chance = seededChance(seed)
  const { phones, inOrder } = storyOf(count, chance)
  const send = async (log: LogDatabase, seen: readonly Seen[], now: number) => {
    const results = await record(log.db, WORKER, seen.map(({ event }) => event), { now, deviceNow: now + seen[0]!.skewMs })
    return results.map(({ outcome, problem }) => outcome === 'refused' ? JSON.stringify(problem) : outcome)
  }

  const oneByOne = await logOfTheFirm()
  for (const seen of inOrder) expect(await send(oneByOne, [seen], seen.at)).toEqual(['accepted'])

  const anyhow = await logOfTheFirm()
  const synced = BEGIN + inOrder.length * MINUTE
  const posts = shuffled(phones.flatMap(seen => postsOf(seen, chance)), chance)
  const outcomes: string[] = []
  for (let at = 0; at < posts.length;) {
    // Several phones are in the yard at once.
    const together = posts.slice(at, at += 1 + chance(20))
    outcomes.push(...(await Promise.all(together.map((seen, index) => send(anyhow, seen, synced + (at + index) * 1000)))).flat())
  }
  expect(outcomes.filter(outcome => outcome === 'accepted')).toHaveLength(inOrder.length)
  expect(new Set(outcomes)).toEqual(new Set(['accepted', 'duplicate']))

  const views = async (log: LogDatabase) => {
    const ids = [...new Set(inOrder.map(({ event }) => event.cylinderId))].sort()
    return cylinderViews(log.db, ids, { access: WORKER, nowMs: synced + 7 * DAY })
  }
  const [expected, shown] = [await views(oneByOne), await views(anyhow)]
  expect(shown).toHaveLength(count)
  expect(shown).toEqual(expected)
  const kept = await cacheLines(anyhow.db)
  expect(kept).toEqual(await cacheLines(oneByOne.db))
  await rebuildCaches(anyhow.db, synced)
  expect(await cacheLines(anyhow.db)).toEqual(kept)
})
