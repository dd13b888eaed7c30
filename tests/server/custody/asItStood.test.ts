import { randomBytes, randomUUID } from 'node:crypto'
import { existsSync, readdirSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { dirname } from 'node:path'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { askedPast } from '../../../server/utils/custody/askedPast'
import { custodyLog } from '../../../server/utils/custody/custodyLog'
import { cylinderView } from '../../../server/utils/custody/cylinderViews'
import { fleet } from '../../../server/utils/custody/fleet'
import { pastCylinder } from '../../../server/utils/custody/pastCylinder'
import { openPastDatabase } from '../../../server/utils/custody/pastDatabase'
import { pastFleet, pastProgress } from '../../../server/utils/custody/pastFleet'
import { directory } from '../../../server/utils/directory/directory'
import { fleetQuery, type FleetAnswer } from '../../../utils/contract/custody'
import type { Past } from '../../../utils/custody/asItStood'
import { drawLabelCode } from '../../../utils/label/code'
import { newCylinder, openLogDatabase, record, sent, type LogDatabase } from '../../helpers/logDatabase'
import { lb } from '../../helpers/stamps'

const HOUR = 3_600_000
const NOW = Date.now()
const hoursAgo = (hours: number) => NOW - hours * HOUR
const happened = (hours: number) => ({ occurredAt: new Date(hoursAgo(hours)).toISOString() })

let log: LogDatabase
let filled: string
let other: string
const code = drawLabelCode(randomBytes)

async function take(events: object[], hours: number) {
  const results = await record(log.db, log.technician, events, { now: hoursAgo(hours) })
  expect(results.map(({ outcome }) => outcome)).toEqual(events.map(() => 'accepted'))
}

beforeAll(async () => {
  log = await openLogDatabase()
  filled = await newCylinder(log)
  other = await newCylinder(log)
  // Both were registered just now, so nothing of before is known; what they say happened before.
  await take([sent(filled, 'filled', { refrigerant: 'R-22', grossAfter: lb(40), looked: true }, happened(50))], 50)
  await take([sent(filled, 'labelled', { code }, happened(40))], 40)
  await take([sent(other, 'labelled', { code }, happened(30))], 30)
  await take([sent(filled, 'weighed', { gross: lb(36) }, happened(45))], 20)
})
afterAll(() => log.close())

const asOf = (hours: number): Past => ({ asOf: hoursAgo(hours), knownAt: null })

async function listed(past: Past, query: object = {}, isNextPage = false): Promise<FleetAnswer> {
  const { db, atMs, giveBack } = await pastFleet(log.db, past, isNextPage)
  return fleet(db, fleetQuery.parse(query), atMs).finally(giveBack)
}

describe('one cylinder as it stood', () => {
  it('has the weight, the label and the findings of that instant', async () => {
    const at = (hours: number) => pastCylinder(log.db, filled, asOf(hours))
    // 40 lb is 18,144 g and 36 lb 16,329 g, less the tare of 27.5 lb, 12,474 g.
    expect((await at(46)).contents.netGrams).toBe(5_670)
    expect((await at(44)).contents.netGrams).toBe(3_855)
    expect([(await at(41)).labelCode, (await at(39)).labelCode]).toEqual([null, code])
    expect([(await at(31)).findings, (await at(29)).findings].map(all => all.some(({ code: word }) => word === 'code-on-two'))).toEqual([false, true])
  })

  it('says what was known then, and offers nothing to do', async () => {
    const then = await pastCylinder(log.db, filled, { asOf: hoursAgo(44), knownAt: hoursAgo(21) })
    expect([then.contents.netGrams, then.labelCode]).toEqual([null, null])
    expect(then.findings.map(({ code: word }) => word)).toContain('not-registered')
    expect(then.may).toEqual([])
  })

  it('is the present one at the present instant', async () => {
    const present = (await cylinderView(log.db, filled, { access: null, nowMs: NOW + 60_000 }))!
    expect(await pastCylinder(log.db, filled, { asOf: NOW + 60_000, knownAt: null })).toEqual(present)
  })

  it.runIf(existsSync('/proc/self/fd'))('leaves no file open behind it, however often it is asked for', async () => {
    const look = () => pastCylinder(log.db, filled, asOf(29))
    await look()
    const before = readdirSync('/proc/self/fd').length
    for (let times = 0; times < 10; times++) await look()
    // A reader's connection or two may be opened only now.
    expect(readdirSync('/proc/self/fd').length).toBeLessThan(before + 10)
  })

  it('is made also where the file of an earlier one was swept away', async () => {
    const { db, remove } = await openPastDatabase(log.db, asOf(29))
    remove()
    rmSync(dirname(db.file!), { recursive: true })
    expect((await pastCylinder(log.db, filled, asOf(46))).contents.netGrams).toBe(5_670)
  })

  it('is another one at the same time', async () => {
    const both = await Promise.all([46, 44, 46, 44].map(hours => pastCylinder(log.db, filled, asOf(hours))))
    expect(both.map(({ contents }) => contents.netGrams)).toEqual([5_670, 3_855, 5_670, 3_855])
  })

  it('was not there before its first event', async () => {
    await expect(pastCylinder(log.db, filled, asOf(51))).rejects.toThrow('404')
    await expect(custodyLog(log.db, filled, { limit: 10 }, asOf(51))).rejects.toThrow('404')
  })

  it('has in its log the lines of then', async () => {
    const kinds = async (past: Past) => (await custodyLog(log.db, filled, { limit: 10 }, past)).items.map(({ kind }) => kind)
    expect(await kinds(asOf(44))).toEqual(['registered', 'weighed', 'filled'])
    expect(await kinds({ asOf: null, knownAt: hoursAgo(21) })).toEqual(['labelled', 'filled'])
  })
})

describe('the fleet as it stood', () => {
  it('is filtered, sorted and paged as it was, each row equal to its page', async () => {
    const [early, late] = [await listed(asOf(46), { sort: 'net' }), await listed(asOf(44), { sort: 'net' })]
    expect([early, late].map(({ items }) => items.map(({ netGrams }) => netGrams))).toEqual([[5_670], [3_855]])
    expect((await listed(asOf(29), { finding: 'code-on-two' })).total).toBe(2)
    expect((await listed(asOf(31), { finding: 'code-on-two' })).total).toBe(0)
    expect((await listed(asOf(29), { q: code })).items).toHaveLength(2)
    const page = await listed(asOf(29), { limit: 1, sort: 'code' })
    const next = await listed(asOf(29), { limit: 1, sort: 'code', cursor: page.nextCursor }, true)
    expect([page, next].flatMap(({ items }) => items.map(({ id }) => id)).sort()).toEqual([filled, other].sort())
    for (const row of (await listed(asOf(29))).items) {
      const view = await pastCylinder(log.db, row.id, asOf(29))
      expect([row.netGrams, row.labelCode, row.stopWeightGrams, row.worstFinding?.code]).toEqual(
        [view.contents.netGrams, view.labelCode, view.capacity.stopWeightGrams, view.findings[0]?.code])
    }
  })

  it('is the present fleet at the present instant', async () => {
    const present = await fleet(log.db, fleetQuery.parse({}), NOW + 60_000)
    const past = await listed({ asOf: NOW + 60_000, knownAt: null })
    expect(past.items).toEqual(present.items)
  })

  it('takes in what comes late for the past, but not between two pages', async () => {
    const past = asOf(10)
    const before = await listed(past, { limit: 1, sort: 'serial' })
    expect(pastProgress(log.db, past)).toEqual({ done: 6, of: 6, isReady: true })
    await take([sent(randomUUID(), 'weighed', { gross: lb(30) }, happened(11))], 0)
    expect((await listed(past, { limit: 1, sort: 'serial', cursor: before.nextCursor }, true)).total).toBe(2)
    expect((await listed(past)).total).toBe(3)
    expect((await listed({ asOf: hoursAgo(10), knownAt: hoursAgo(5) })).total).toBe(2)
  })

  it('is made anew where a place has another name since, but not between two pages', async () => {
    const past = { ...asOf(10), knownAt: hoursAgo(4) }
    const made = async (isNextPage: boolean) => {
      const { db, giveBack } = await pastFleet(log.db, past, isNextPage)
      giveBack()
      return db
    }
    const first = await made(false)
    expect(await made(false)).toBe(first)
    await log.db.write([{ sql: 'UPDATE places SET name = \'Yard\' WHERE id = ?', args: [log.placeId] }])
    await directory(log.db, true)
    expect(await made(true)).toBe(first)
    expect(await made(false)).not.toBe(first)
  })

  it('leaves at most two of its files behind, whatever was asked', async () => {
    const pastFiles = () => readdirSync(tmpdir()).filter(name => name.startsWith('collarbook-past-')).length
    const before = pastFiles()
    for (let hours = 1; hours < 9; hours++) await listed(asOf(hours))
    // The one that was asked for last, and the two before it.
    expect(pastFiles()).toBeLessThanOrEqual(before + 3)
  })

  it('that cannot be made takes no other off the list', async () => {
    const ownLog = await openLogDatabase()
    await newCylinder(ownLog)
    const inUse = await pastFleet(ownLog.db, asOf(2), false)
    const folder = process.env.TMPDIR
    process.env.TMPDIR = '/there/is/no/such/folder'
    const both = await Promise.allSettled([1, 2].map(() => pastFleet(ownLog.db, asOf(1), false)))
    if (folder === undefined) delete process.env.TMPDIR
    else process.env.TMPDIR = folder
    expect(both.map(({ status }) => status)).toEqual(['rejected', 'rejected'])
    expect((await pastFleet(ownLog.db, asOf(2), false)).db).toBe(inUse.db)
    ownLog.close()
  })
})

describe('the log as it was known', () => {
  it('has no other details in the place of a line that nobody had corrected yet', async () => {
    const corrected = await newCylinder(log)
    const weighed = sent(corrected, 'weighed', { gross: lb(30) }, happened(3))
    await take([weighed], 3)
    const [answer] = await record(log.db, log.manager, [sent(corrected, 'corrected', { eventId: weighed.id, reason: 'Misread', instead: { gross: lb(33) } }, { expects: 2 })], { now: hoursAgo(1) })
    expect(answer?.outcome).toBe('accepted')
    const insteadAt = async (past: Past) => (await custodyLog(log.db, corrected, { limit: 10 }, past)).items.find(({ id }) => id === weighed.id)!.instead
    expect(await insteadAt({ asOf: null, knownAt: hoursAgo(2) })).toBeUndefined()
    expect(await insteadAt({ asOf: null, knownAt: hoursAgo(1) })).toEqual({ gross: lb(33) })
    // What had happened two hours ago, with all that is known of it now.
    expect(await insteadAt(asOf(2))).toEqual({ gross: lb(33) })
  })
})

describe('the log as of an instant', () => {
  it('says of a late line only what it changed in lines that had happened by then', async () => {
    const id = await newCylinder(log)
    await take([sent(id, 'weighed', { gross: lb(40) }, happened(6)), sent(id, 'moved', { toPlaceId: log.placeId }, happened(2))], 2)
    const late = sent(id, 'filled', { refrigerant: 'R-22', grossAfter: lb(40), looked: true }, happened(7))
    await take([late], 1)
    const changedAt = async (hours: number) => (await custodyLog(log.db, id, { limit: 10 }, asOf(hours))).items.find(line => line.id === late.id)!.changes?.map(({ kind }) => kind)
    expect([await changedAt(6.5), await changedAt(4), await changedAt(1)]).toEqual([undefined, ['weighed'], ['weighed', 'moved']])
  })
})

describe('a cylinder as it was known beside others', () => {
  const known = async (id: string, hours: number) =>
    (await pastCylinder(log.db, id, { asOf: null, knownAt: hoursAgo(hours) })).findings.map(({ code: word }) => word)

  it('shared a code with the one whose label was corrected since', async () => {
    const [first, second, shared] = [await newCylinder(log), await newCylinder(log), drawLabelCode(randomBytes)]
    await take([sent(first, 'labelled', { code: shared }, happened(6))], 6)
    const wrong = sent(second, 'labelled', { code: shared }, happened(5))
    await take([wrong], 5)
    const answers = await record(log.db, log.manager, [sent(second, 'corrected', { eventId: wrong.id, reason: 'Wrong cylinder', instead: { code: drawLabelCode(randomBytes) } }, { expects: 2 })], { now: hoursAgo(1) })
    expect(answers[0]?.outcome).toBe('accepted')
    expect([await known(first, 2), await known(second, 2)].map(codes => codes.includes('code-on-two'))).toEqual([true, true])
    expect(await known(first, 0)).not.toContain('code-on-two')
  })
})

describe('a question about the past', () => {
  it('asks for no instant that is still to come', () => {
    expect(() => askedPast({ asOf: new Date(NOW + 1).toISOString() }, NOW)).toThrow('422')
    expect(() => askedPast({ knownAt: new Date(NOW + 1).toISOString() }, NOW)).toThrow('422')
    expect(askedPast({ asOf: new Date(NOW).toISOString() }, NOW)).toEqual({ asOf: NOW, knownAt: null })
    expect(askedPast({}, NOW)).toBeNull()
  })
})
