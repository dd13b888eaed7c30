import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { custodyLog } from '../../../server/utils/custody/custodyLog'
import { cylinderView } from '../../../server/utils/custody/cylinderViews'
import type { Access } from '../../../utils/access/roles'
import { newCylinder, openLogDatabase, record, sent, type LogDatabase } from '../../helpers/logDatabase'
import { lb } from '../../helpers/stamps'

const DAY = 86_400_000

let log: LogDatabase
beforeAll(async () => {
  log = await openLogDatabase()
})
afterAll(() => log.close())

const net = async (id: string) => (await cylinderView(log.db, id, { access: null, nowMs: Date.now() }))!.contents.netGrams
const details = (gross: number) => ({ refrigerant: 'R-22', grossAfter: lb(gross), looked: true })

async function post(access: Access, event: object, now = Date.now()) {
  const [result] = await record(log.db, access, [event], { now })
  return result!.problem ? `${result!.problem.status} ${result!.problem.title}: ${result!.problem.detail}` : result!.outcome
}

/** A cylinder with 40 lb gross recorded by the technician now; answers its id and the fill's. */
async function filled() {
  const id = await newCylinder(log)
  const event = sent(id, 'filled', details(40))
  expect(await post(log.technician, event)).toBe('accepted')
  return { id, eventId: event.id }
}

const mending = (id: string, eventId: string, instead?: object, expects?: number) =>
  sent(id, 'corrected', { eventId, reason: 'misread', ...instead && { instead } }, expects === undefined ? {} : { expects })

describe('a correction', () => {
  it('is its author\'s for 24 hours from the recording, and not a millisecond longer', async () => {
    const { id, eventId } = await filled()
    const { items } = await custodyLog(log.db, id, { limit: 1 })
    const recordedAt = Date.parse(items[0]!.recordedAt)
    expect(await post(log.technician, mending(id, eventId, details(39)), recordedAt + DAY + 1)).toMatch(/^403 Not yours to correct/)
    expect(await post(log.warehouse, mending(id, eventId, details(39)))).toMatch(/^403 Not yours to correct/)
    expect(await post(log.technician, mending(id, eventId, details(39)), recordedAt + DAY)).toBe('accepted')
  })

  it('is a manager\'s at any time, on the version that was looked at; else it is told what was recorded meanwhile', async () => {
    const { id, eventId } = await filled()
    await post(log.technician, sent(id, 'moved', { toPlaceId: log.placeId }))
    expect(await post(log.manager, mending(id, eventId, details(36), 2), Date.now() + 400 * DAY)).toBe(
      '409 The cylinder has changed since you looked: You decided on version 2; it is now at 3. Recorded meanwhile: moved. Look again, then decide.')
    expect(await post(log.manager, mending(id, eventId, details(36), 3), Date.now() + 400 * DAY)).toBe('accepted')
    expect(await net(id)).toBe(3_855)
  })

  it('may itself be corrected, and the latest in effect counts', async () => {
    const { id, eventId } = await filled()
    const first = mending(id, eventId, details(36), 2)
    expect(await post(log.manager, first)).toBe('accepted')
    expect(await post(log.manager, mending(id, eventId, details(38), 3))).toBe('accepted')
    // 38 lb is 17,237 g, the tare of 27.5 lb 12,474 g.
    expect(await net(id)).toBe(4_763)
    const { items } = await custodyLog(log.db, id, { limit: 1 })
    expect(await post(log.manager, mending(id, items[0]!.id, undefined, 4))).toBe('accepted')
    expect(await net(id)).toBe(3_855)
    expect(await post(log.manager, mending(id, first.id, undefined, 5))).toBe('accepted')
    expect(await net(id)).toBe(5_670)
  })

  it('replaces a registration, but takes none out while other events stand on it', async () => {
    const { id } = await filled()
    const { items } = await custodyLog(log.db, id, { limit: 5 })
    expect(await post(log.manager, mending(id, items.at(-1)!.id, undefined, 2))).toMatch(/^409 The registration cannot be taken out/)
  })

  it('that takes out one half of a pair leaves a half alone on both cylinders', async () => {
    const [{ id }, other] = [await filled(), await newCylinder(log)]
    const pair = { transferId: randomUUID(), refrigerant: 'R-22', condition: 'clean' }
    const out = sent(id, 'transferred', { ...pair, direction: 'out', counterpartId: other, grossBefore: lb(40), grossAfter: lb(36) })
    const results = await record(log.db, log.technician, [out, sent(other, 'transferred', { ...pair, direction: 'in', counterpartId: id, grossBefore: lb(27.5), grossAfter: lb(31.5) })])
    expect(results.map(({ outcome }) => outcome)).toEqual(['accepted', 'accepted'])
    expect(await post(log.manager, mending(id, out.id, undefined, 3))).toBe('accepted')
    expect((await cylinderView(log.db, other, { access: null, nowMs: Date.now() }))!.findings.map(({ code }) => code)).toContain('half-transfer')
  })
})

describe('the custody log of a corrected cylinder', () => {
  it('shows the difference on the correction as recorded, and the new details in place as it now stands', async () => {
    const { id, eventId } = await filled()
    expect(await post(log.manager, mending(id, eventId, details(36), 2))).toBe('accepted')
    const read = async (how: 'recorded' | 'stands') => (await custodyLog(log.db, id, { limit: 5 }, null, how)).items
      .map(({ kind, netBeforeGrams, netAfterGrams }) => [kind, netBeforeGrams, netAfterGrams])
    expect(await read('recorded')).toEqual([['corrected', 5_670, 3_855], ['filled', 0, 5_670], ['registered', null, 0]])
    expect(await read('stands')).toEqual([['corrected', 3_855, 3_855], ['filled', 0, 3_855], ['registered', null, 0]])
    const fill = (await custodyLog(log.db, id, { limit: 5 })).items.find(line => line.id === eventId)!
    expect([fill.details, fill.instead]).toEqual([details(40), details(36)])
  })
})
