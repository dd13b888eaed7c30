import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { people } from '../../../drizzle/schema'
import { cylinderView } from '../../../server/utils/custody/cylinderViews'
import { rebuildCaches } from '../../../server/utils/custody/rebuild'
import { statement } from '../../../server/utils/database/database'
import type { Access } from '../../../utils/access/roles'
import { lb } from '../../helpers/stamps'
import { newCylinder, openLogDatabase, record, sent, type LogDatabase } from '../../helpers/logDatabase'

let log: LogDatabase
let trainee: Access
beforeAll(async () => {
  log = await openLogDatabase()
  trainee = { personId: randomUUID(), roles: ['technician'], trainee: true }
  await log.db.write([statement(log.db.read.insert(people).values({
    id: trainee.personId, email: 'trainee@firm.example', name: 'A trainee', roles: ['technician'], trainee: true, units: 'lb', createdAt: 0,
  }))])
})
afterAll(() => log.close())

const outcomes = async (access: Access, ...events: object[]) => (await record(log.db, access, events)).map(({ outcome, problem }) => problem?.status ?? outcome)
const lifecycle = async (id: string) => (await cylinderView(log.db, id, { access: log.manager, nowMs: Date.now() }))!.lifecycle

describe('who may set a cylinder apart, release it and end its life', () => {
  it('lets a technician set it apart, look it over, miss and find it; only a manager releases and retires it', async () => {
    const id = await newCylinder(log)
    expect(await outcomes(log.technician,
      sent(id, 'inspected', { result: 'sound' }), sent(id, 'missing', {}, { deviceSeq: 2 }), sent(id, 'found', {}, { deviceSeq: 3 }),
      sent(id, 'quarantined', { reason: 'no label' }, { deviceSeq: 4 }),
      sent(id, 'released', { reason: 'labelled' }, { expects: 5 }), sent(id, 'retired', { reason: 'scrapped' }, { expects: 5 }),
    )).toEqual(['accepted', 'accepted', 'accepted', 'accepted', 403, 403])
    expect(await lifecycle(id)).toBe('quarantined')
    expect(await outcomes(log.warehouse, sent(id, 'released', { reason: 'labelled' }, { expects: 5 }))).toEqual([403])
    expect(await outcomes(log.manager, sent(id, 'released', { reason: 'labelled' }, { expects: 5 }), sent(id, 'retired', { reason: 'scrapped' }, { expects: 6 }))).toEqual(['accepted', 'accepted'])
    expect(await lifecycle(id)).toBe('retired')
  })

  it('takes a release and an end only on the version that was looked at', async () => {
    const id = await newCylinder(log)
    for (const kind of ['released', 'retired']) {
      expect(await outcomes(log.manager, sent(id, kind, { reason: 'looked at' })), kind).toEqual([400])
      for (const expects of [0, 2]) expect(await outcomes(log.manager, sent(id, kind, { reason: 'looked at' }, { expects })), kind).toEqual([409])
    }
    expect(await lifecycle(id)).toBe('in-service')
  })

  it('keeps what is recorded after the end, and refuses a place of a find that nobody knows', async () => {
    const id = await newCylinder(log)
    expect(await outcomes(log.manager, sent(id, 'retired', { reason: 'scrapped' }, { expects: 1 }))).toEqual(['accepted'])
    expect(await outcomes(log.technician, sent(id, 'weighed', { gross: lb(30) }))).toEqual(['accepted'])
    expect((await cylinderView(log.db, id, { access: log.manager, nowMs: Date.now() }))!.findings.map(({ code }) => code)).toEqual(['after-end'])
    expect(await outcomes(log.technician, sent(id, 'found', { placeId: randomUUID() }), sent(id, 'found', { placeId: log.placeId }))).toEqual([422, 'accepted'])
  })
})

describe('who may countersign', () => {
  /** A cylinder filled by the trainee under the technician; its id and the entry's. */
  async function filledByTrainee(): Promise<{ id: string, entry: string }> {
    const id = await newCylinder(log)
    const entry = sent(id, 'filled', { refrigerant: 'R-22', grossBefore: lb(27.5), grossAfter: lb(37.5), looked: true }, { supervisorId: log.technician.personId })
    expect(await outcomes(trainee, entry)).toEqual(['accepted'])
    return { id, entry: entry.id }
  }
  const apart = async (id: string) => (await log.db.readClient.execute({ sql: 'SELECT cause, apart FROM movements WHERE cylinder_id = ? AND cause = ?', args: [id, 'recovered'] })).rows.map(row => row[1])

  it('is the supervisor whom the entry names: no manager, no warehouse, not the trainee', async () => {
    const { id, entry } = await filledByTrainee()
    const signature = () => sent(id, 'countersigned', { eventId: entry })
    for (const [who, access] of Object.entries({ manager: log.manager, warehouse: log.warehouse, trainee })) expect(await outcomes(access, signature()), who).toEqual([403])
    expect(await apart(id)).toEqual([1])
    expect(await outcomes(log.technician, signature())).toEqual(['accepted'])
    expect(await apart(id)).toEqual([0])
  })

  it('is nobody where no supervisor was named, and of no entry that needs no signature', async () => {
    const id = await newCylinder(log)
    const alone = sent(id, 'weighed', { gross: lb(27.5) })
    await outcomes(trainee, alone)
    for (const access of [log.technician, log.manager]) expect(await outcomes(access, sent(id, 'countersigned', { eventId: alone.id }))).toEqual([403])
  })

  it('is nobody where the one named may not supervise: not certified, turned off, a trainee, or none who works on systems; the entry is kept and stops the cylinder', async () => {
    const named = { roles: ['technician'], certificationType: 'II' as const, units: 'lb' as const, createdAt: 0 }
    const unfit = [
      { ...named, certificationType: null }, { ...named, active: false }, { ...named, trainee: true }, { ...named, roles: ['auditor'] },
    ].map((one, index) => ({ id: randomUUID(), email: `unfit${index}@firm.example`, name: `Unfit ${index}`, ...one }))
    await log.db.write(unfit.map(one => statement(log.db.read.insert(people).values(one))))
    for (const supervisorId of [...unfit.map(({ id }) => id), trainee.personId]) {
      const id = await newCylinder(log)
      const entry = sent(id, 'weighed', { gross: lb(27.5) }, { supervisorId })
      expect(await outcomes(trainee, entry)).toEqual(['accepted'])
      expect((await cylinderView(log.db, id, { access: null, nowMs: Date.now() }))!.findings.map(({ code }) => code)).toEqual(expect.arrayContaining(['unsupervised', 'unsigned']))
      expect((await log.db.readClient.execute({ sql: `SELECT supervisor_id, json_extract(body, '$.supervisorId') FROM custody_events WHERE id = ?`, args: [entry.id] })).rows.map(row => [row[0], row[1]]))
        .toEqual([[null, supervisorId]])
    }
    const { id } = await filledByTrainee()
    expect((await cylinderView(log.db, id, { access: null, nowMs: Date.now() }))!.findings.map(({ code }) => code)).not.toContain('unsupervised')
  })

  it('may sign before the entry has arrived; it counts once that does', async () => {
    const id = await newCylinder(log)
    const entry = sent(id, 'filled', { refrigerant: 'R-22', grossBefore: lb(27.5), grossAfter: lb(37.5), looked: true }, { supervisorId: log.technician.personId })
    expect(await outcomes(log.technician, sent(id, 'countersigned', { eventId: entry.id }))).toEqual(['accepted'])
    expect(await outcomes(trainee, entry)).toEqual(['accepted'])
    expect(await apart(id)).toEqual([0])
  })

  it('leaves the books as a rebuild makes them', async () => {
    const { id, entry } = await filledByTrainee()
    await outcomes(log.technician, sent(id, 'weighed', { gross: lb(37.5) }), sent(id, 'countersigned', { eventId: entry }))
    const books = async () => (await log.db.readClient.batch(['SELECT * FROM movements ORDER BY cylinder_id, event_id, ordinal', 'SELECT * FROM stock_changes ORDER BY cylinder_id, event_id, ordinal', 'SELECT * FROM cylinders ORDER BY id'], 'read')).map(({ rows }) => rows.map(row => Object.values(row)))
    const live = await books()
    await rebuildCaches(log.db, Date.now())
    expect(await books()).toEqual(live)
  })
})
