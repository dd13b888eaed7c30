import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { cylinderView } from '../../../server/utils/custody/cylinderViews'
import { custodyLog } from '../../../server/utils/custody/custodyLog'
import type { FindingCode } from '../../../utils/custody/finding'
import { lb } from '../../helpers/stamps'
import { newCylinder, openLogDatabase, record, sent, type LogDatabase } from '../../helpers/logDatabase'

const DAY = 24 * 60 * 60 * 1000

let log: LogDatabase
beforeAll(async () => {
  log = await openLogDatabase()
})
afterAll(() => log.close())

/** Codes on the cylinder and on the lines of its log. */
async function findingsOf(cylinderId: string): Promise<FindingCode[]> {
  const view = await cylinderView(log.db, cylinderId, { access: log.manager, nowMs: Date.now() })
  const lines = await custodyLog(log.db, cylinderId, { limit: 200 })
  return [...view!.findings, ...lines.items.flatMap(line => line.findings)].map(finding => finding.code)
}

describe('facts are recorded, whatever rule they break', () => {
  it('records a weighing below the tare, and asks to weigh again', async () => {
    const id = await newCylinder(log)
    const [result] = await record(log.db, log.technician, [sent(id, 'weighed', { gross: lb(20) })])
    expect(result).toMatchObject({ outcome: 'accepted', version: 2 })
    expect(await findingsOf(id)).toContain('weigh-again')
    const view = await cylinderView(log.db, id, { access: log.manager, nowMs: Date.now() })
    expect(view!.contents).toMatchObject({ netGrams: null, basis: 'unknown' })
  })

  it('records an overfill, with a stop and negative room', async () => {
    const id = await newCylinder(log)
    // 0.80 x 47.6 lb = 38.08 lb net is the most; 27.5 + 39 = 66.5 lb gross is 0.92 lb over.
    const [result] = await record(log.db, log.technician, [sent(id, 'filled', { refrigerant: 'R-22', condition: 'clean', grossBefore: lb(27.5), grossAfter: lb(66.5), looked: true })])
    expect(result?.outcome).toBe('accepted')
    const view = await cylinderView(log.db, id, { access: log.manager, nowMs: Date.now() })
    expect(view!.findings.map(finding => [finding.code, finding.severity])).toContainEqual(['overfill', 'stop'])
    expect(view!.contents.netGrams).toBe(17690)
    expect(view!.capacity.fillLimitGrams).toBe(17272)
    expect(view!.capacity.roomGrams).toBe(-418)
  })

  it('records the fill of a cylinder whose test is overdue', async () => {
    const id = await newCylinder(log, { testedMonth: '2020-02' })
    const [result] = await record(log.db, log.technician, [sent(id, 'filled', { refrigerant: 'R-22', condition: 'clean', grossBefore: lb(27.5), grossAfter: lb(33), looked: true })])
    expect(result?.outcome).toBe('accepted')
    expect(await findingsOf(id)).toContain('retest-overdue')
    const view = await cylinderView(log.db, id, { access: log.technician, nowMs: Date.now() })
    expect(view!.capacity.refusals.map(finding => finding.code)).toContain('retest-overdue')
    expect(view!.capacity.stopWeightGrams).toBeNull()
  })

  it('records a second refrigerant, and gives no number for what is mixed', async () => {
    const id = await newCylinder(log)
    const results = await record(log.db, log.technician, [
      sent(id, 'filled', { refrigerant: 'R-410A', condition: 'clean', grossBefore: lb(27.5), grossAfter: lb(35), looked: true }),
      sent(id, 'filled', { refrigerant: 'R-22', condition: 'clean', grossBefore: lb(35), grossAfter: lb(40), looked: true }, { deviceSeq: 2 }),
    ])
    expect(results.map(result => result.outcome)).toEqual(['accepted', 'accepted'])
    const view = await cylinderView(log.db, id, { access: log.technician, nowMs: Date.now() })
    expect(view!.contents).toMatchObject({ refrigerant: null, condition: 'mixed' })
    expect(view!.findings.map(finding => finding.code)).toContain('second-refrigerant')
    expect(view!.capacity.stopWeightGrams).toBeNull()
  })

  it('records an event from a clock two days fast at the time it truly happened', async () => {
    const id = await newCylinder(log)
    const now = Date.now() + 60_000
    const claimed = new Date(now + 2 * DAY - 5 * 60_000).toISOString()
    const event = { ...sent(id, 'weighed', { gross: lb(27.5) }), occurredAt: claimed }
    const [result] = await record(log.db, log.technician, [event], { now, deviceNow: now + 2 * DAY })
    expect(result?.outcome).toBe('accepted')
    const { items } = await custodyLog(log.db, id, { limit: 10 })
    const line = items.find(one => one.id === event.id)!
    expect(Date.parse(line.occurredAt)).toBe(Date.parse(claimed))
    expect(Date.parse(line.effectiveAt)).toBe(now - 5 * 60_000)
    expect(line.clockSkewSeconds).toBe(2 * 24 * 60 * 60)
    expect(line.findings.map(finding => finding.code)).toContain('clock-doubtful')
  })
})
