import { randomUUID } from 'node:crypto'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { setTimeout as wait } from 'node:timers/promises'
import { settings } from '../../../drizzle/schema'
import { cylinderView } from '../../../server/utils/custody/cylinderViews'
import { fleet } from '../../../server/utils/custody/fleet'
import { rebuildCaches } from '../../../server/utils/custody/rebuild'
import { followRules, keepFollowing, rowsBehind } from '../../../server/utils/custody/rowsByRule'
import { statement } from '../../../server/utils/database/database'
import { directory } from '../../../server/utils/directory/directory'
import { setRule } from '../../../server/utils/rules/setRule'
import { withdrawRule } from '../../../server/utils/rules/withdrawRule'
import { ruleBody, type NewRule } from '../../../utils/contract/policy'
import { fleetQuery } from '../../../utils/contract/custody'
import { lb } from '../../helpers/stamps'
import { newCylinder, openLogDatabase, record, sent, type LogDatabase } from '../../helpers/logDatabase'

const DAY = 86_400_000

// WC 47.6 lb, R-22, by water weight: 0.80 x 47.6 lb = 38.08 lb = 17,272 g; at 0.60, 28.56 lb = 12,954 g. TW 27.5 lb.
const AT_80 = 17_272
const AT_60 = 12_954

let log: LogDatabase
beforeEach(async () => {
  log = await openLogDatabase()
})
afterEach(() => log.close())

function rule(share: number, more: object = {}): NewRule {
  return ruleBody.parse({ kind: 'fill-policy', value: { share, ceiling: 0.95, options: { liquid130F: false, unRatio: false } }, reason: 'A test of the rule', ...more })
}

async function filledCylinder(grossAfterLb: number): Promise<string> {
  const id = await newCylinder(log)
  const results = await record(log.db, log.technician, [sent(id, 'filled', { refrigerant: 'R-22', grossAfter: lb(grossAfterLb), looked: true })])
  expect(results[0]!.outcome).toBe('accepted')
  return id
}

async function rows(): Promise<Record<string, unknown>[]> {
  const result = await log.db.readClient.execute('SELECT * FROM cylinders ORDER BY id')
  return result.rows.map(row => ({ ...row }))
}

const limits = async () => (await rows()).map(row => row.fill_limit_grams)

describe('the rows of the fleet', () => {
  it('follow a rule that begins at once, and equal the rebuilt ones to the byte', async () => {
    await filledCylinder(60)
    await filledCylinder(40)
    expect(await limits()).toEqual([AT_80, AT_80])
    await setRule(log.db, rule(0.6), log.manager, Date.now)
    await followRules(log.db)
    expect(await limits()).toEqual([AT_60, AT_60])
    expect(await rowsBehind(log.db, Date.now())).toBe(0)
    const live = await rows()
    await rebuildCaches(log.db, Date.now())
    expect(await rows()).toEqual(live)
  })

  it('keep the more generous rule of the day of the fill when an overfill is judged', async () => {
    // Filled to 32.5 lb net: under 38.08 lb, over 28.56 lb.
    const before = await filledCylinder(60)
    await setRule(log.db, rule(0.6), log.manager, Date.now)
    await followRules(log.db)
    const after = await filledCylinder(60)
    const codes = new Map((await rows()).map(row => [row.id, row.finding_codes as string]))
    expect(codes.get(before)).toBe(' nearly-full ')
    expect(codes.get(after)).toBe(' overfill ')
    const live = await rows()
    await rebuildCaches(log.db, Date.now())
    expect(await rows()).toEqual(live)
  })

  it('follow a rule on the day it begins, not before', async () => {
    await filledCylinder(40)
    const tomorrow = Date.now() + DAY
    await setRule(log.db, rule(0.6, { from: new Date(tomorrow).toISOString() }), log.manager, Date.now)
    expect(await followRules(log.db, () => tomorrow - 1)).toBe(0)
    expect(await limits()).toEqual([AT_80])
    expect(await followRules(log.db, () => tomorrow)).toBe(1)
    expect(await limits()).toEqual([AT_60])
  })

  it('follow by themselves when the time has come', async () => {
    await filledCylinder(40)
    await setRule(log.db, rule(0.6, { from: new Date(Date.now() + 400).toISOString() }), log.manager, Date.now)
    const end = keepFollowing(log.db)
    expect(await limits()).toEqual([AT_80])
    await expect.poll(limits, { timeout: 4000 }).toEqual([AT_60])
    end()
  })

  it('follow at the next start where a process ended before they had', async () => {
    for (let index = 0; index < 3; index++) await filledCylinder(40)
    // As it is left where the process ends between the rule and its rows.
    await log.db.write([statement(log.db.read.insert(settings).values({
      id: randomUUID(), kind: 'fill-policy', fromAt: Date.now(), value: { shareThousandths: 600, ceilingThousandths: 950, options: { liquid130F: false, unRatio: false } },
      reason: 'A test of the rule', setBy: log.manager.personId, setAt: Date.now(),
    }))])
    const again = await log.openAgain()
    expect(await rowsBehind(again, Date.now())).toBe(3)
    const end = keepFollowing(again)
    await expect.poll(limits, { timeout: 4000 }).toEqual([AT_60, AT_60, AT_60])
    end()
  })

  it('are read by the rule in force even before they have followed', async () => {
    const id = await filledCylinder(60)
    const tomorrow = Date.now() + DAY
    await setRule(log.db, rule(0.6, { from: new Date(tomorrow).toISOString() }), log.manager, Date.now)
    const listed = async (nowMs: number) => (await fleet(log.db, fleetQuery.parse({}), nowMs)).items[0]!
    expect(await listed(tomorrow - 1)).toMatchObject({ fillLimitGrams: AT_80 })
    expect(await listed(tomorrow)).toMatchObject({ fillLimitGrams: AT_60, findingCodes: ['nearly-full'] })
    expect((await cylinderView(log.db, id, { access: null, nowMs: tomorrow }))!.capacity.fillLimitGrams).toBe(AT_60)
  })

  it('follow some at a time while events are posted', async () => {
    const ids = await Promise.all(Array.from({ length: 250 }, () => newCylinder(log)))
    await setRule(log.db, rule(0.6), log.manager, Date.now)
    const answers = await Promise.all(ids.slice(0, 40).map(id => record(log.db, log.technician, [sent(id, 'weighed', { gross: lb(27.5) })])))
    expect(answers.flat().every(result => result.outcome === 'accepted')).toBe(true)
    await followRules(log.db)
    expect(await rowsBehind(log.db, Date.now())).toBe(0)
    const live = await rows()
    await rebuildCaches(log.db, Date.now())
    expect(await rows()).toEqual(live)
  })

  it('stay as they are under a rule that was withdrawn before it began', async () => {
    await filledCylinder(40)
    const soon = Date.now() + 300
    const { id } = await setRule(log.db, rule(0.6, { from: new Date(soon).toISOString() }), log.manager, Date.now)
    await withdrawRule(log.db, id, 'A slip', log.manager, Date.now)
    await wait(350)
    expect(await followRules(log.db)).toBe(0)
    expect(await limits()).toEqual([AT_80])
  })
})

describe('the firm\'s rules', () => {
  it('are never changed or deleted, only followed by others', async () => {
    await setRule(log.db, rule(0.7), log.manager, Date.now)
    await expect(log.db.write(['UPDATE settings SET reason = \'another\''])).rejects.toThrow(/append-only/)
    await expect(log.db.write(['DELETE FROM settings'])).rejects.toThrow(/append-only/)
    const [kept] = (await directory(log.db, true)).settings
    await log.db.write([{ sql: 'INSERT OR REPLACE INTO settings (id, kind, from_at, value, reason, set_by, set_at) VALUES (?, ?, 0, ?, ?, ?, 0)', args: [kept!.id, 'fill-policy', '{}', 'another', kept!.setBy] }])
    expect((await directory(log.db, true)).settings).toEqual([kept])
  })

  it('begin after everything that is recorded, so that each event was judged by the rule of its instant', async () => {
    const later = Date.now() + 5000
    const id = await newCylinder(log)
    await record(log.db, log.technician, [sent(id, 'weighed', { gross: lb(27.5) })], { now: later })
    const set = await setRule(log.db, rule(0.7), log.manager, Date.now)
    expect(set.fromAt).toBe(later + 1)
  })

  it('cannot be withdrawn once they have begun', async () => {
    const { id } = await setRule(log.db, rule(0.7), log.manager, Date.now)
    await expect(withdrawRule(log.db, id, 'A slip', log.manager, () => Date.now() + 1)).rejects.toMatchObject({ details: { status: 409, type: 'rule-begun' } })
  })
})
