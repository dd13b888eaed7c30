import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join, resolve } from 'node:path'
import { cylinderViews } from '../../server/utils/custody/cylinderViews'
import { custodyLog } from '../../server/utils/custody/custodyLog'
import { fleet } from '../../server/utils/custody/fleet'
import { rebuildCaches } from '../../server/utils/custody/rebuild'
import { rowsBehind } from '../../server/utils/custody/rowsByRule'
import { allCheckpoints } from '../../server/utils/proof/checkpoints'
import { keptCopies } from '../../server/utils/proof/copies'
import { verifyLog } from '../../server/utils/proof/verifyLog'
import { openDatabase, type Database } from '../../server/utils/database/database'
import { directory } from '../../server/utils/directory/directory'
import { firmRules } from '../../server/utils/directory/firmRules'
import { sealHistory } from '../../server/utils/demo/checkpoints'
import { fillDemo } from '../../server/utils/demo/fillDemo'
import { bankedOf } from '../../server/utils/jobs/banked'
import { listJobs, theJob } from '../../server/utils/jobs/jobs'
import { lateFacts } from '../../server/utils/now/lateFacts'
import { differingShipments } from '../../server/utils/shipments/paperDifferences'
import { listShipments } from '../../server/utils/shipments/shipments'
import { judgedShipment } from '../../server/utils/shipments/shipmentWithLines'
import { keepDemoPhotos } from '../../server/utils/demo/photos'
import { keepDemoStatement } from '../../server/utils/demo/statementFile'
import { massBalance } from '../../server/utils/records/massBalance'
import { listVans } from '../../server/utils/vans/vans'
import { fleetQuery } from '../../utils/contract/custody'
import { jobsQuery } from '../../utils/contract/jobs'
import { SHIPMENT_STATES, shipmentsQuery } from '../../utils/contract/shipments'
import { EVENT_KINDS } from '../../utils/custody/kinds'
import type { FindingCode } from '../../utils/custody/finding'
import { stepFacts, whyNot } from '../../utils/shipment/steps'
import { testSealing } from '../helpers/sealing'

const NOW = Date.parse('2026-12-01T17:00:00Z')

/** Every finding that the present kinds of event can raise. */
const RAISED: FindingCode[] = [
  'overfill', 'nearly-full', 'pressure-class', 'spec-not-for-gas', 'not-refillable', 'not-marked-flammable', 'toxic', 'second-refrigerant',
  'unknown-onto-known', 'retest-overdue', 'retest-soon', 'retest-unknown', 'early-test', 'wet', 'rejected', 'condemned', 'weight-not-known',
  'not-registered', 'registered-twice', 'old-tare-on-label', 'code-on-two', 'unsigned', 'unsupervised', 'not-seen', 'two-owners', 'owner-change', 'owner-consent', 'weigh-again',
  'half-transfer', 'transfer-unbalanced', 'clock-doubtful', 'late-change', 'look-before-fill', 'system-dependent-limit', 'gas-excess', 'away', 'after-end', 'tested-full', 'quarantined', 'found-by-use',
]

let folder: string
let db: Database
beforeAll(async () => {
  folder = mkdtempSync(join(tmpdir(), 'collarbook-demo-'))
  db = await openDatabase(`file:${join(folder, 'demo.db')}`)
  await db.migrate(resolve('drizzle/migrations'))
  expect(await fillDemo(db, 'no password', NOW)).toBe(true)
}, 120_000)
afterAll(() => {
  db.close()
  rmSync(folder, { recursive: true, force: true })
})

async function column(sql: string): Promise<unknown[]> {
  return (await db.readClient.execute(sql)).rows.map(row => row[0])
}

describe('the demo firm', () => {
  it('has one plan that is open, of which nothing was done yet', async () => {
    expect(await column('SELECT state FROM plans')).toEqual(['open'])
    expect((await column('SELECT done_event_id FROM plan_tasks')).length).toBeGreaterThan(1)
    expect(await column('SELECT done_event_id FROM plan_tasks WHERE done_event_id IS NOT NULL')).toEqual([])
  })

  it('has about 180 cylinders and a year and a half of history with every kind of event', async () => {
    const [cylinders] = await column('SELECT count(*) FROM cylinders')
    expect(cylinders).toBeGreaterThanOrEqual(170)
    expect(cylinders).toBeLessThanOrEqual(220)
    expect((await column('SELECT DISTINCT kind FROM custody_events')).sort()).toEqual([...EVENT_KINDS].sort())
    const [first] = await column('SELECT min(effective_at) FROM custody_events')
    const [last] = await column('SELECT max(recorded_at) FROM custody_events')
    expect(first).toBeLessThan(NOW - 500 * 86_400_000)
    expect(last).toBeLessThanOrEqual(NOW)
  })

  it('has photos of stamps and scales beside their lines, one of them put there later, and one still on its way', async () => {
    const files = new Map<string, Uint8Array>()
    await keepDemoPhotos(db, { keep: async (name, bytes) => void files.set(name, bytes), read: async () => null, probe: async () => undefined })
    const named = Number((await column('SELECT sum(json_array_length(body, \'$.photoIds\')) FROM custody_events'))[0])
    const arrived = await column('SELECT a.subject FROM attachments a JOIN custody_events e ON e.actor_id = a.sent_by AND a.id = json_extract(e.body, \'$.photoIds[0]\')')
    expect(arrived).toEqual(expect.arrayContaining(['stamp', 'scale']))
    expect(named - arrived.length).toBe(1)
    expect(await column('SELECT count(*) FROM attachment_events')).toEqual([1])
    expect(files.size).toBe(2 * (arrived.length + 1))
  })

  it('has one van that came back without what its technician held last, and two that say what else they carry', async () => {
    const vans = await listVans(db, NOW)
    const short = vans.filter(({ toLookFor }) => toLookFor.length > 0)
    expect(short).toHaveLength(1)
    expect(short[0]!.toLookFor.length).toBeGreaterThan(0)
    expect(new Set(short[0]!.toLookFor.map(({ cylinder }) => cylinder.holder?.name))).toEqual(new Set([short[0]!.van.technicianName]))
    expect(short[0]!.aboard.length).toBeGreaterThan(short[0]!.toLookFor.length)
    expect(vans.filter(({ materials }) => materials !== null)).toHaveLength(2)
  })

  it('has one shipment whose papers differ from the log since something came late, and which waits for the manager', async () => {
    const differing = await differingShipments(db, NOW)
    expect(differing.map(({ lines }) => lines)).toEqual([1])
    const late = await lateFacts(db, await directory(db), NOW)
    expect(late.cylinders).toHaveLength(1)
  })

  it('has a shipment in each state, the one that is ready with every line weighed and its papers complete', async () => {
    expect((await column('SELECT DISTINCT state FROM shipments')).sort()).toEqual([...SHIPMENT_STATES].sort())
    const [ready] = (await listShipments(db, shipmentsQuery.parse({ state: 'ready' }))).items
    const { shipment, judged } = await judgedShipment(db, ready!.id, { personId: 'nobody', roles: ['manager'], trainee: false }, NOW)
    expect(whyNot('dispatch', stepFacts(shipment))).toEqual([])
    expect(judged!.papers.carriage).toMatchObject({ by: 'carrier' })
    expect(await column(`SELECT count(*) FROM shipments WHERE state IN ('dispatched', 'arrived', 'settled') AND papers IS NULL`)).toEqual([0])
    expect(await column('SELECT count(*) FROM shipments WHERE NOT EXISTS (SELECT 1 FROM shipment_acts WHERE shipment_id = shipments.id)')).toEqual([0])
  })

  it('has a settled shipment with an open dispute about its newest statement, and a closed one with the statement itself', async () => {
    const open = await column(`SELECT d.about FROM disputes d JOIN shipments s ON s.id = d.shipment_id WHERE d.ended_at IS NULL AND s.state = 'settled'`)
    expect(open).toEqual(expect.arrayContaining(['credit']))
    expect(await column(`SELECT count(*) FROM disputes d JOIN shipments s ON s.id = d.shipment_id WHERE d.ended_at IS NULL AND s.state <> 'settled'`)).toEqual([0])
    expect(await column('SELECT count(*) FROM shipment_lines l JOIN shipments s ON s.id = l.shipment_id LEFT JOIN settlement_lines f USING (shipment_id, cylinder_id) WHERE s.settled_at IS NOT NULL AND f.outcome IS NULL')).toEqual([0])
    const files = new Map<string, Uint8Array>()
    await keepDemoStatement(db, { keep: async (name, bytes) => void files.set(name, bytes), read: async () => null, probe: async () => undefined }, async (_, title) => Buffer.from(`%PDF-1.7 ${title}`))
    expect(await column(`SELECT f.media_type FROM shipment_files f JOIN shipments s ON s.id = f.shipment_id WHERE s.state = 'closed'`)).toEqual(['application/pdf'])
    expect([...files.values()].map(file => Buffer.from(file).toString())).toEqual([expect.stringMatching(/^%PDF-1.7 Statement ST-\d+\.pdf$/)])
  })

  it('has jobs with what was recovered on them, a note in its second issue, and refrigerant banked for a customer', async () => {
    const { items } = await listJobs(db, jobsQuery.parse({ limit: 200 }), 'nobody')
    expect(items.filter(({ recoveredGrams }) => recoveredGrams !== null).length).toBeGreaterThanOrEqual(15)
    const issues = await Promise.all(items.map(async ({ id }) => (await theJob(db, id)).issue))
    expect(issues.filter(issue => issue === 2)).toHaveLength(1)
    const store = [...(await directory(db)).firms.values()].find(({ name }) => name === 'Wexley Cold Store')!
    const { held } = await bankedOf(db, store.id)
    expect(held.find(({ refrigerant }) => refrigerant === 'R-22')!.cylinders).toHaveLength(2)
  })

  it('shows every finding that these kinds of event can raise', async () => {
    const ids = await column('SELECT id FROM cylinders') as string[]
    const views = await cylinderViews(db, ids, { access: null, nowMs: NOW })
    const codes = new Set(views.flatMap(view => view.findings.map(finding => finding.code)))
    for (const id of ids) for (const line of (await custodyLog(db, id, { limit: 200 })).items) for (const finding of line.findings) codes.add(finding.code)
    expect(RAISED.filter(code => !codes.has(code))).toEqual([])
  })

  it('keeps every row of the list equal to the view of the same day, without the one that was given away', async () => {
    expect(await column('SELECT count(*) FROM cylinders WHERE given_away = 1')).toEqual([1])
    const ids = await column('SELECT id FROM cylinders WHERE given_away = 0') as string[]
    const views = new Map((await cylinderViews(db, ids, { access: null, nowMs: NOW })).map(view => [view.id, view]))
    const rows = []
    let cursor: string | undefined
    do {
      const page = await fleet(db, fleetQuery.parse({ limit: 200, ...(cursor ? { cursor } : {}) }), NOW)
      rows.push(...page.items)
      cursor = page.nextCursor ?? undefined
    } while (cursor)
    expect(rows).toHaveLength(ids.length)
    for (const row of rows) {
      const view = views.get(row.id)!
      expect({
        code: row.labelCode, net: row.netGrams, limit: row.fillLimitGrams, room: row.roomGrams, stop: row.stopWeightGrams, due: row.dueMonth,
        codes: [...row.findingCodes].sort(), worst: row.worstFinding?.severity ?? null, place: row.place?.name ?? null,
      }).toEqual({
        code: view.labelCode, net: view.contents.netGrams, limit: view.capacity.fillLimitGrams, room: view.capacity.roomGrams,
        stop: view.capacity.stopWeightGrams, due: view.requalification.dueMonth, codes: [...new Set(view.findings.map(finding => finding.code))].sort(),
        worst: view.findings[0]?.severity ?? null, place: view.place?.name ?? null,
      })
    }
  })

  it.each(['retest-overdue', 'retest-soon', 'not-seen', 'overfill', 'code-on-two', 'stop', 'caution'])('filters by %s as the views do', async (code) => {
    const page = await fleet(db, fleetQuery.parse({ finding: code, limit: 200 }), NOW)
    const ids = await column('SELECT id FROM cylinders') as string[]
    const views = await cylinderViews(db, ids, { access: null, nowMs: NOW })
    const expected = views.filter(view => view.findings.some(finding => finding.code === code || finding.severity === code || (code === 'caution' && finding.severity === 'stop')))
    expect(expected.length).toBeGreaterThan(0)
    expect(page.items.map(row => row.id).sort()).toEqual(expected.map(view => view.id).sort())
  })

  it('sums each cylinder\'s movements to what is in stock in it', async () => {
    const sums = new Map((await db.readClient.execute('SELECT cylinder_id, sum(grams) FROM movements GROUP BY cylinder_id')).rows.map(row => [row[0], row[1] as number]))
    const ids = await column('SELECT id FROM cylinders') as string[]
    for (const view of await cylinderViews(db, ids, { access: null, nowMs: NOW })) {
      if (view.contents.netGrams === null) continue
      expect(sums.get(view.id) ?? 0, view.labelCode ?? view.id).toBe(view.contents.inStock ? view.contents.netGrams : 0)
    }
  })

  it('closes the balance of every refrigerant with what the cylinders hold, and says how many are not known', async () => {
    const { balances } = await massBalance(db, { from: '2026-01-01', to: '2026-12-01' }, NOW)
    expect(balances.filter(({ account }) => !account.agrees)).toEqual([])
    const held = new Map<string | null, number>()
    const notKnown = new Map<string | null, number>()
    for (const { contents } of await cylinderViews(db, await column('SELECT id FROM cylinders') as string[], { access: null, nowMs: NOW })) {
      if (!contents.inStock || contents.nothingInIt) continue
      const counted = contents.netGrams === null ? notKnown : held
      counted.set(contents.refrigerant, (counted.get(contents.refrigerant) ?? 0) + (contents.netGrams ?? 1))
    }
    expect(held.size).toBeGreaterThan(5)
    for (const { refrigerant, account } of balances) {
      expect([refrigerant, account.closingGrams, account.stock.closing.notKnown]).toEqual([refrigerant, held.get(refrigerant) ?? 0, notKnown.get(refrigerant) ?? 0])
    }
    const causes = balances.flatMap(({ account }) => account.causes.filter(({ movements }) => movements > 0).map(({ cause }) => cause))
    expect([...new Set(causes)]).toEqual(expect.arrayContaining(['recovered', 'drawn-same-system', 'renamed', 'shipped', 'lost', 'weighing']))
    expect(balances.some(({ account }) => account.apart.movements > 0)).toBe(true)
  })

  it('has set its fill rule anew once, with a reason, and each row rests on the one in force', async () => {
    const rules = firmRules(await directory(db))
    expect(rules.map(rule => rule.kind === 'fill-policy' && rule.value.shareThousandths)).toEqual([800, 780])
    expect(rules.every(rule => rule.reason.length > 20 && rule.setBy.name === 'Maren Sorrel')).toBe(true)
    expect(await rowsBehind(db, NOW)).toBe(0)
    const live = await db.readClient.execute('SELECT * FROM cylinders ORDER BY id')
    await rebuildCaches(db, NOW)
    expect((await db.readClient.execute('SELECT * FROM cylinders ORDER BY id')).rows).toEqual(live.rows)
  })

  it('was signed once a day by the clock of each, and verifies against every checkpoint', async () => {
    const sealing = await testSealing(db)
    await sealHistory(db, sealing, NOW)
    const made = await allCheckpoints(db)
    const first = Number((await column('SELECT min(recorded_at) FROM custody_events'))[0])
    expect(made.length).toBe(Math.floor((NOW - first) / 86_400_000) + 1)
    expect(made.map(({ says }) => NOW - says!.at)).toEqual(made.map((_, index) => (made.length - 1 - index) * 86_400_000))
    // Each knows what had been recorded by its day, and no more.
    for (const { says } of made) {
      expect([says!.events, says!.cylinders]).toEqual(Object.values((await db.readClient.execute({
        sql: 'SELECT count(*) AS events, count(DISTINCT cylinder_id) AS cylinders FROM custody_events WHERE recorded_at <= ?', args: [says!.at],
      })).rows[0]!))
    }
    expect(await verifyLog(db, { now: NOW, sealing })).toMatchObject({ ok: true })
    expect(keptCopies(sealing.copies)).toEqual(made.map(({ note }) => note))
  })

  it('verifies, and is filled once', async () => {
    expect(await verifyLog(db, { now: NOW, sealing: null })).toMatchObject({ ok: true })
    expect(await fillDemo(db, 'no password', NOW)).toBe(false)
  })

  it('credits a customer with their part of what a settled line came to, and with nothing while it is not settled', async () => {
    const dairy = [...(await directory(db)).firms.values()].find(({ name }) => name === 'Dunmarrow Dairy')!
    const shippedNow = async () => (await bankedOf(db, dairy.id)).shipped
    const before = await shippedNow()
    expect(before.filter(({ isSettled }) => !isSettled).every(({ creditCents }) => creditCents === null)).toBe(true)
    const line = before.find(({ isSettled, grams, wholeGrams }) => isSettled && grams < wholeGrams)!
    const settled = async (statedCents: number | null) => {
      // At 10.00 a kilogram each gram of the whole is a cent.
      await db.write([{
        sql: 'INSERT OR REPLACE INTO settlement_lines (shipment_id, cylinder_id, accepted_net, mills, per, stated_cents) VALUES (?, ?, ?, 10000, ?, ?)',
        args: [line.shipment.id, line.cylinder.id, JSON.stringify({ unit: 'kg', value: line.wholeGrams / 1_000 }), 'kg', statedCents],
      }])
      return (await shippedNow()).find(({ eventId }) => eventId === line.eventId)!.creditCents
    }
    expect(await settled(null)).toBe(line.grams)
    expect(await settled(-2 * line.wholeGrams)).toBe(-2 * line.grams)
  })
})
