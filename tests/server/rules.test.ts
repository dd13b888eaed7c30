import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { FleetAnswer } from '../../utils/contract/custody'
import type { FirmRule, PolicyAnswer, RulePreview } from '../../utils/contract/policy'
import type { ProblemDetails } from '../../utils/contract/problem'
import type { CylinderView } from '../../utils/custody/cylinderView'
import type { TestClient } from '../helpers/client'
import { cylinderNow, openShop, registered, type Shop } from '../helpers/fleet'
import { startServer, type TestServer } from '../helpers/server'

const DAY = 86_400_000

// WC 47.6 lb, R-22: 0.80 x 47.6 lb = 38.08 lb = 17,272 g; 0.60 of it, 28.56 lb = 12,954 g; 0.20, 9.52 lb = 4,318 g.
const AT_80 = 17_272
const AT_60 = 12_954

let server: TestServer
let firm: Shop
let cylinder: CylinderView
beforeAll(async () => {
  server = await startServer()
  firm = await openShop(server)
  // 12.5 lb of R-22.
  cylinder = await registered(firm)
})
afterAll(() => server.stop())

const fill = (share: number, more: object = {}) => ({
  kind: 'fill-policy', value: { share, ceiling: 0.95, options: { liquid130F: false, unRatio: false } }, reason: 'A test of the rule', ...more,
})
const retest = (changes: object = {}, more: object = {}) => ({
  kind: 'retest', value: { soonDays: 90, notSeenDays: 20, missingDays: 60, ...changes }, reason: 'A test of the reminders', ...more,
})
const policyFor = async (client: TestClient) => (await client.get<PolicyAnswer>('/api/policy')).body

describe('the firm\'s rules', () => {
  it('are read by everybody, with the rule that holds before any was set', async () => {
    for (const { client } of [firm.technician, firm.auditor, firm.admin]) {
      expect(await policyFor(client)).toMatchObject({
        rules: [], rowsBehind: 0, fillPolicy: { shareThousandths: 800, ceilingThousandths: 950 }, retest: { soonDays: 120, notSeenDays: 30, missingDays: 90, ownerChoices: [] },
      })
    }
  })

  it('are set by the manager; reminders by the admin too; by nobody else', async () => {
    for (const { client } of [firm.technician, firm.warehouse, firm.auditor]) {
      expect((await client.post('/api/policy', fill(0.7))).status).toBe(403)
      expect((await client.post('/api/policy', retest())).status).toBe(403)
      expect((await client.post('/api/policy/preview', fill(0.7))).status).toBe(403)
    }
    expect((await firm.admin.client.post('/api/policy', fill(0.7))).status).toBe(403)
    expect((await firm.admin.client.post<FirmRule>('/api/policy', retest())).status).toBe(201)
    const { retest: inForce, rules } = await policyFor(firm.technician.client)
    expect(inForce).toMatchObject({ soonDays: 90, notSeenDays: 20, missingDays: 60, intervalMonths: null, ownerChoices: [] })
    expect(rules).toMatchObject([{ kind: 'retest', reason: 'A test of the reminders', setBy: { id: firm.admin.id, name: 'Ada Lind' }, withdrawn: null }])
  })

  it('are previewed without being set', async () => {
    const { status, body } = await firm.manager.client.post<RulePreview>('/api/policy/preview', { ...fill(0.2), reason: undefined })
    expect(status).toBe(200)
    expect(body).toMatchObject({ cylinders: 1, lowerLimit: { count: 1, examples: [{ id: cylinder.id, before: { fillLimitGrams: AT_80 }, after: { fillLimitGrams: 4318 } }] } })
    // Registered with its contents under the usual rule, which allows more: so not overfilled, but without room.
    expect(body.overfilled.count).toBe(0)
    expect(body.room).toMatchObject([{ refrigerant: 'R-22', cylinders: 1, afterGrams: 0 }])
    expect((await policyFor(firm.manager.client)).fillPolicy.shareThousandths).toBe(800)
    expect((await cylinderNow(firm.technician.client, cylinder.id)).capacity.fillLimitGrams).toBe(AT_80)
  })

  it('count at once in the view, in the list and in the next look at the rules', async () => {
    const set = await firm.manager.client.post<FirmRule>('/api/policy', fill(0.6))
    expect(set.status).toBe(201)
    expect((await cylinderNow(firm.technician.client, cylinder.id)).capacity.fillLimitGrams).toBe(AT_60)
    expect((await firm.technician.client.get<FleetAnswer>('/api/cylinders')).body.items[0]!.fillLimitGrams).toBe(AT_60)
    const policy = await policyFor(firm.technician.client)
    expect(policy.fillPolicy.shareThousandths).toBe(600)
    expect(policy.fillPolicies.at(-1)).toMatchObject({ fromAt: set.body.fromAt, policy: { shareThousandths: 600 } })
    await expect.poll(async () => (await policyFor(firm.technician.client)).rowsBehind).toBe(0)
  })

  it.each([
    ['a share above 80 %', fill(0.801), 'value.share'],
    ['a ceiling above 95 %', { ...fill(0.8), value: { share: 0.8, ceiling: 0.951, options: { liquid130F: false, unRatio: false } } }, 'value.ceiling'],
    ['a ceiling below the share', { ...fill(0.8), value: { share: 0.8, ceiling: 0.79, options: { liquid130F: false, unRatio: false } } }, 'value.ceiling'],
    ['missing before not seen', retest({ missingDays: 19 }), 'value.missingDays'],
    ['a period above 12 years', retest({ intervalMonths: 145 }), 'value.intervalMonths'],
  ])('refuse %s, in words', async (_, body, path) => {
    for (const route of ['/api/policy', '/api/policy/preview']) {
      const { reason, ...draft } = body
      const { status, body: problem } = await firm.manager.client.post<ProblemDetails>(route, route.endsWith('preview') ? draft : { ...draft, reason })
      expect(status).toBe(422)
      expect(problem.errors).toMatchObject([{ path }])
    }
  })

  it('refuse what is malformed: no reason, an unknown option, no share at all', async () => {
    const { client } = firm.manager
    expect((await client.post('/api/policy', { ...fill(0.7), reason: ' ' })).status).toBe(400)
    expect((await client.post('/api/policy', { ...fill(0.7), value: { share: 0.7, ceiling: 0.95, options: { liquid130F: true, unRatio: false, other: true } } })).status).toBe(400)
    expect((await client.post('/api/policy', fill(0))).status).toBe(400)
    expect((await client.post('/api/policy', { ...fill(0.7), from: 'tomorrow' })).status).toBe(400)
  })

  it('never begin in the past: neither at an instant nor on a day that has begun', async () => {
    const past = [new Date(Date.now() - 1000).toISOString(), new Date(Date.now() - 2 * DAY).toISOString().slice(0, 10)]
    for (const from of past) {
      const { status, body } = await firm.manager.client.post<ProblemDetails>('/api/policy', fill(0.7, { from }))
      expect([status, body.type, body.errors?.[0]?.path]).toEqual([422, 'in-the-past', 'from'])
    }
  })

  it('begin on their day by themselves', async () => {
    const soon = new Date(Date.now() + 1200).toISOString()
    await firm.manager.client.post('/api/policy', fill(0.8, { from: soon }))
    expect((await policyFor(firm.technician.client)).fillPolicy.shareThousandths).toBe(600)
    const limit = async () => (await firm.technician.client.get<FleetAnswer>('/api/cylinders')).body.items[0]!.fillLimitGrams
    expect(await limit()).toBe(AT_60)
    await expect.poll(limit, { timeout: 4000 }).toBe(AT_80)
    expect((await policyFor(firm.technician.client)).fillPolicy.shareThousandths).toBe(800)
  })

  it('are set once however often they are sent', async () => {
    const { client } = firm.manager
    const id = randomUUID()
    const body = fill(0.75, { id, from: new Date(Date.now() + DAY).toISOString() })
    const [first, again] = [await client.post<FirmRule>('/api/policy', body), await client.post<FirmRule>('/api/policy', body)]
    expect([first.status, again.status]).toEqual([201, 201])
    expect(again.body).toEqual(first.body)
    expect((await client.post('/api/policy', { ...body, reason: 'Another' })).status).toBe(409)
    // Else somebody would believe that it begins a day later, while it begins tomorrow.
    expect((await client.post('/api/policy', { ...body, from: new Date(Date.now() + 2 * DAY).toISOString() })).status).toBe(409)
    expect((await policyFor(client)).rules.filter(rule => rule.id === id)).toHaveLength(1)
  })

  it('are withdrawn before they begin, for a reason, and stay in the history', async () => {
    const { client } = firm.manager
    const day = new Date(Date.now() + 3 * DAY).toISOString().slice(0, 10)
    const { body: rule } = await client.post<FirmRule>('/api/policy', fill(0.5, { from: day }))
    // A day begins at midnight in Chicago, five or six hours after midnight in Greenwich.
    expect([5, 6]).toContain((rule.fromAt - Date.parse(day)) / 3_600_000)
    expect((await firm.admin.client.post(`/api/policy/${rule.id}/withdraw`, { reason: 'Not mine' })).status).toBe(403)
    expect((await client.post<FirmRule>(`/api/policy/${rule.id}/withdraw`, { reason: 'A slip' })).body.withdrawn).toMatchObject({ reason: 'A slip', by: { name: 'Mona' } })
    expect((await client.post<FirmRule>(`/api/policy/${rule.id}/withdraw`, { reason: 'Again' })).body.withdrawn).toMatchObject({ reason: 'A slip' })
    const policy = await policyFor(client)
    expect(policy.fillPolicies.some(({ fromAt }) => fromAt === rule.fromAt)).toBe(false)
    expect(policy.rules.find(({ id }) => id === rule.id)).toMatchObject({ reason: 'A test of the rule', withdrawn: { reason: 'A slip' } })
  })

  it('cannot be withdrawn once they have begun', async () => {
    const { client } = firm.manager
    const begun = (await policyFor(client)).rules.find(({ kind, fromAt }) => kind === 'fill-policy' && fromAt < Date.now())!
    const { status, body } = await client.post<ProblemDetails>(`/api/policy/${begun.id}/withdraw`, { reason: 'Too late' })
    expect([status, body.type]).toEqual([409, 'rule-begun'])
    expect((await client.post(`/api/policy/${randomUUID()}/withdraw`, { reason: 'Not there' })).status).toBe(404)
  })

  it('hold after a restart', async () => {
    const before = await policyFor(firm.technician.client)
    await server.restart()
    expect({ ...await policyFor(firm.technician.client), asOf: 0 }).toEqual({ ...before, asOf: 0 })
  })
})
