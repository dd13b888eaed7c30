import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { cylinderView } from '../../../server/utils/custody/cylinderViews'
import { lb } from '../../helpers/stamps'
import { newCylinder, openLogDatabase, record, sent, type LogDatabase } from '../../helpers/logDatabase'

let log: LogDatabase
beforeAll(async () => {
  log = await openLogDatabase()
})
afterAll(() => log.close())

async function count(sql: string, args: string[] = []): Promise<number> {
  return (await log.db.readClient.execute({ sql, args })).rows[0]![0] as number
}

describe('the one way into the log', () => {
  it('refuses only the malformed one among 200 events', async () => {
    const id = await newCylinder(log)
    const events: Record<string, unknown>[] = Array.from({ length: 200 }, (_, index) => sent(id, 'weighed', { gross: lb(27.5) }, { deviceSeq: index }))
    events[117] = { ...events[117], details: { gross: { unit: 'lb', value: -3 } } }
    const results = await record(log.db, log.technician, events)
    expect(results.map(result => result.id)).toEqual(events.map(event => event.id))
    expect(results.filter(result => result.outcome === 'accepted')).toHaveLength(199)
    expect(results[117]).toMatchObject({ outcome: 'refused', problem: { status: 400, errors: [{ path: 'details.gross.value' }] } })
    expect(await count('SELECT count(*) FROM custody_events WHERE cylinder_id = ?', [id])).toBe(200)
  })

  it('stores the same event once however often it comes', async () => {
    const id = await newCylinder(log)
    const event = sent(id, 'weighed', { gross: lb(27.6) })
    const answers = await Promise.all(Array.from({ length: 5 }, () => record(log.db, log.technician, [event])))
    const outcomes = answers.flat().map(result => result.outcome).sort()
    expect(outcomes).toEqual(['accepted', 'duplicate', 'duplicate', 'duplicate', 'duplicate'])
    expect(new Set(answers.flat().map(result => result.seq)).size).toBe(1)
    expect(await count('SELECT count(*) FROM custody_events WHERE id = ?', [event.id as string])).toBe(1)
  })

  it('tells of another event with the same id, and keeps the first', async () => {
    const id = await newCylinder(log)
    const event = sent(id, 'weighed', { gross: lb(27.6) })
    await record(log.db, log.technician, [event])
    const [result] = await record(log.db, log.technician, [{ ...event, details: { gross: lb(30) } }])
    expect(result).toMatchObject({ outcome: 'refused', problem: { status: 409 } })
    const view = await cylinderView(log.db, id, { access: log.manager, nowMs: Date.now() })
    expect(view!.version).toBe(2)
  })

  it('gives 200 parallel posts to one cylinder the versions 2 to 201 without a gap', async () => {
    const id = await newCylinder(log)
    const answers = await Promise.all(Array.from({ length: 200 }, (_, index) => record(log.db, log.technician, [sent(id, 'weighed', { gross: lb(27.5) }, { deviceSeq: index })])))
    const versions = answers.flat().map(result => result.version!).sort((a, b) => a - b)
    expect(versions).toEqual(Array.from({ length: 200 }, (_, index) => index + 2))
  })

  it('refuses what nobody knows and what is not the author\'s to say', async () => {
    const id = await newCylinder(log)
    const results = await record(log.db, log.technician, [
      sent(id, 'moved', { toPlaceId: randomUUID() }),
      sent(id, 'weighed', { gross: lb(28) }, { actorId: log.manager.personId }),
      sent(id, 'weighed', { gross: lb(28) }, { recordedAt: '2020-01-01T00:00:00Z' }),
      sent(id, 'polished', {}),
      { ...sent(id, 'weighed', { gross: lb(28) }), occurredAt: '2026-02-30T10:00:00Z' },
      sent(id, 'registered', {}),
      sent(id, 'sent-for-reclaim', { shipmentId: randomUUID(), gross: lb(30) }),
    ])
    expect(results.map(result => result.outcome)).toEqual(Array(7).fill('refused'))
    expect(results[0]?.problem).toMatchObject({ status: 422, errors: [{ path: 'details.toPlaceId', message: 'no such place' }] })
    expect(results[6]?.problem?.status).toBe(403)
  })

  it('takes a decision only on the version it was made on', async () => {
    const id = await newCylinder(log)
    const weighing = sent(id, 'weighed', { gross: lb(72.9) })
    await record(log.db, log.technician, [weighing])
    const correction = (expects?: number) => sent(id, 'corrected', { eventId: weighing.id, reason: 'typed wrong', instead: { gross: lb(27.9) } }, expects === undefined ? {} : { expects })
    const [stale] = await record(log.db, log.manager, [correction(1)])
    expect(stale).toMatchObject({ outcome: 'refused', problem: { status: 409 } })
    const [without] = await record(log.db, log.manager, [correction()])
    expect(without).toMatchObject({ outcome: 'refused', problem: { status: 400 } })
    const [current] = await record(log.db, log.manager, [correction(2)])
    expect(current).toMatchObject({ outcome: 'accepted', version: 3 })
  })

  it('lets an author correct within a day and not after it, and nobody else but a manager', async () => {
    const id = await newCylinder(log)
    const at = Date.now()
    const weighing = sent(id, 'weighed', { gross: lb(30) })
    await record(log.db, log.technician, [weighing], { now: at })
    const correction = () => sent(id, 'corrected', { eventId: weighing.id, reason: 'taken back' })
    const [other] = await record(log.db, log.warehouse, [correction()], { now: at + 1000 })
    expect(other?.problem?.status).toBe(403)
    const day = 24 * 60 * 60 * 1000
    const [late] = await record(log.db, log.technician, [correction()], { now: at + day + 1 })
    expect(late?.problem?.status).toBe(403)
    const [own] = await record(log.db, log.technician, [correction()], { now: at + day })
    expect(own?.outcome).toBe('accepted')
  })

  it('lets nobody but a manager point a correction of their own at somebody else\'s entry', async () => {
    const id = await newCylinder(log)
    const theirs = sent(id, 'filled', { refrigerant: 'R-22', grossAfter: lb(80), looked: true })
    const own = sent(id, 'weighed', { gross: lb(79) })
    await record(log.db, log.warehouse, [theirs])
    await record(log.db, log.technician, [own])
    const correction = sent(id, 'corrected', { eventId: own.id, reason: 'read wrong', instead: { gross: lb(78) } })
    expect((await record(log.db, log.technician, [correction]))[0]?.outcome).toBe('accepted')
    const pointed = (eventId: string) => sent(id, 'corrected', { eventId: correction.id, reason: 'the other line', instead: { eventId, reason: 'taken back' } })
    const [stranger] = await record(log.db, log.technician, [pointed(theirs.id.toUpperCase())])
    expect(stranger?.problem?.status).toBe(403)
    const view = await cylinderView(log.db, id, { access: log.manager, nowMs: Date.now() })
    expect(view!.findings.map(({ code }) => code)).toContain('overfill')
    expect((await record(log.db, log.technician, [pointed(own.id)]))[0]?.outcome).toBe('accepted')
    expect((await record(log.db, log.manager, [{ ...pointed(theirs.id), expects: 5 }]))[0]?.outcome).toBe('accepted')
  })

  it('does not take a registration out while other events stand on it', async () => {
    const id = await newCylinder(log)
    await record(log.db, log.technician, [sent(id, 'weighed', { gross: lb(27.5) })])
    const first = (await log.db.readClient.execute({ sql: 'SELECT id FROM custody_events WHERE cylinder_id = ? AND version = 1', args: [id] })).rows[0]![0] as string
    const [result] = await record(log.db, log.manager, [sent(id, 'corrected', { eventId: first, reason: 'never was' }, { expects: 2 })])
    expect(result).toMatchObject({ outcome: 'refused', problem: { status: 409 } })
  })
})
