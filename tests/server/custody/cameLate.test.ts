import { randomBytes, randomUUID } from 'node:crypto'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { firms, places, shipmentLines, shipments } from '../../../drizzle/schema'
import { custodyLog } from '../../../server/utils/custody/custodyLog'
import { statement } from '../../../server/utils/database/database'
import { directory } from '../../../server/utils/directory/directory'
import { lateFacts } from '../../../server/utils/now/lateFacts'
import { dispatchShipment } from '../../../server/utils/shipments/dispatchShipment'
import { differingShipments } from '../../../server/utils/shipments/paperDifferences'
import { shipmentWithLines } from '../../../server/utils/shipments/shipmentWithLines'
import { drawLabelCode } from '../../../utils/label/code'
import { newCylinder, openLogDatabase, record, sent, type LogDatabase } from '../../helpers/logDatabase'
import { madeReady } from '../../helpers/readyShipment'
import { lb, stampOf } from '../../helpers/stamps'

const HOUR = 3_600_000
const ago = (hours: number) => ({ occurredAt: new Date(Date.now() - hours * HOUR).toISOString() })

let log: LogDatabase
const reclaimer = randomUUID()
beforeAll(async () => {
  log = await openLogDatabase()
  await log.db.write([
    statement(log.db.read.insert(firms).values({ id: reclaimer, name: 'Reclaimer', kind: 'reclaimer', createdAt: 0 })),
    statement(log.db.read.insert(places).values({ id: randomUUID(), name: 'Reclaimer', kind: 'firm', firmId: reclaimer, createdAt: 0 })),
  ])
  await directory(log.db, true)
})
afterAll(() => log.close())

async function take(events: { id: string }[], access = log.technician) {
  expect((await record(log.db, access, events)).map(({ outcome, problem }) => problem?.detail ?? outcome)).toEqual(events.map(() => 'accepted'))
  return events.map(({ id }) => id)
}

const linesOf = async (id: string) => (await custodyLog(log.db, id, { limit: 50 })).items
const filled = (id: string, gross: number, hours: number) => sent(id, 'filled', { refrigerant: 'R-22', grossAfter: lb(gross), looked: true }, ago(hours))

/** A cylinder with 40 lb gross of R-22, sent off an hour ago; answers the shipment's id. */
async function dispatched(): Promise<{ id: string, shipmentId: string }> {
  const id = await newCylinder(log)
  await take([filled(id, 40, 5), sent(id, 'labelled', { code: drawLabelCode(randomBytes) }, ago(4))])
  const shipmentId = randomUUID()
  const { rows } = await log.db.readClient.execute('SELECT count(*) FROM shipments')
  await log.db.write([
    statement(log.db.read.insert(shipments).values({ id: shipmentId, number: (rows[0]![0] as number) + 1, toFirmId: reclaimer, state: 'draft', createdAt: 0, createdBy: log.manager.personId })),
    statement(log.db.read.insert(shipmentLines).values({ shipmentId, cylinderId: id, position: 0 })),
  ])
  await madeReady(log.db, shipmentId, [{ cylinderId: id, gross: lb(40) }], log.manager, Date.now())
  await dispatchShipment(log.db, shipmentId, {
    occurredAt: ago(1).occurredAt, lines: [{ cylinderId: id, eventId: randomUUID(), expects: 3, gross: lb(40) }],
  }, log.manager, Date.now())
  return { id, shipmentId }
}

const differing = async (shipmentId: string) => (await shipmentWithLines(log.db, shipmentId, log.manager, Date.now())).lines[0]!.differs

describe('an event that comes late', () => {
  it('says so on its line, with what later lines said before and say now, and waits for the manager', async () => {
    const before = await lateFacts(log.db, await directory(log.db), Date.now())
    const id = await newCylinder(log)
    await take([sent(id, 'weighed', { gross: lb(40) }, ago(1))])
    expect((await linesOf(id)).some(({ changes }) => changes)).toBe(false)
    const [late] = await take([filled(id, 40, 2)])
    const line = (await linesOf(id)).find(one => one.id === late)!
    expect(line.findings.map(({ code }) => code)).toContain('late-change')
    expect(line.changes!.map(({ kind, before: then, now }) => [kind, then.refrigerant, now.refrigerant])).toEqual([['weighed', null, 'R-22']])
    const after = await lateFacts(log.db, await directory(log.db), Date.now())
    expect([after.count - before.count, after.lines - before.lines, after.cylinders[0]!.id]).toEqual([1, 1, id])
    expect((await lateFacts(log.db, await directory(log.db), Date.now() + 8 * 24 * HOUR)).count).toBe(0)
  })

  it('says nothing where no later line says anything else', async () => {
    const id = await newCylinder(log)
    await take([filled(id, 40, 1), sent(id, 'weighed', { gross: lb(40) }, ago(0.5))])
    const [late] = await take([sent(id, 'moved', { toPlaceId: log.placeId }, ago(0.7))])
    expect((await linesOf(id)).find(one => one.id === late)!.changes).toBeUndefined()
  })

  it('waits for the manager also where it is the registration, which the cylinder begins with whatever its time', async () => {
    const before = await lateFacts(log.db, await directory(log.db), Date.now())
    const id = randomUUID()
    await take([sent(id, 'weighed', { gross: lb(40) }, ago(2))])
    const [beginning] = await take([sent(id, 'registered', { stamp: stampOf({ serial: 'LATE1' }), ownership: 'own' }, { ...ago(1), placeId: log.placeId })], log.warehouse)
    const line = (await linesOf(id)).find(one => one.id === beginning)!
    expect(line.changes!.map(({ kind, before: then, now }) => [kind, then.netGrams, now.netGrams])).toEqual([['weighed', null, 5_670]])
    expect((await lateFacts(log.db, await directory(log.db), Date.now())).count - before.count).toBe(1)
  })

  it('shows of a correction what it changed, and raises no finding for that', async () => {
    const id = await newCylinder(log)
    const [fill] = await take([filled(id, 40, 1)])
    const [mend] = await take([sent(id, 'corrected', { eventId: fill, reason: 'misread', instead: { refrigerant: 'R-22', grossAfter: lb(36), looked: true } })])
    const line = (await linesOf(id)).find(one => one.id === mend)!
    expect(line.changes!.map(({ before, now }) => [before.netGrams, now.netGrams])).toEqual([[5_670, 3_855]])
    expect(line.findings).toEqual([])
  })
})

describe('the papers of a shipment', () => {
  it('agree with the log as it left, also after what happened later', async () => {
    const { shipmentId } = await dispatched()
    expect(await differing(shipmentId)).toBeUndefined()
    expect((await differingShipments(log.db, Date.now())).map(({ id }) => id)).not.toContain(shipmentId)
  })

  it('differ once a late event changes what had left, and stay as they were sent', async () => {
    const { id, shipmentId } = await dispatched()
    await take([sent(id, 'filled', { refrigerant: 'R-410A', grossBefore: lb(36), grossAfter: lb(38), looked: true }, ago(3))])
    expect(await differing(shipmentId)).toEqual({ logged: { refrigerant: null, condition: 'mixed', netGrams: 5_670 } })
    const [line] = (await shipmentWithLines(log.db, shipmentId, log.manager, Date.now())).lines
    expect([line!.sent!.refrigerant, line!.sent!.netGrams]).toEqual(['R-22', 5_670])
    expect(await differingShipments(log.db, Date.now())).toContainEqual({ id: shipmentId, number: expect.any(Number), lines: 1 })
  })

  it('differ where the weight it left with is corrected, and where it never left', async () => {
    const { id, shipmentId } = await dispatched()
    const left = (await linesOf(id)).find(({ kind }) => kind === 'sent-for-reclaim')!
    await take([sent(id, 'corrected', { eventId: left.id, reason: 'misread', instead: { shipmentId, gross: lb(41) } }, { expects: 4 })], log.manager)
    expect((await differing(shipmentId))!.logged!.netGrams).toBe(18_597 - 12_474)
    await take([sent(id, 'corrected', { eventId: left.id, reason: 'it stayed here' }, { expects: 5 })], log.manager)
    expect(await differing(shipmentId)).toEqual({ logged: null })
  })
  it('are looked through also behind twenty newer ones that only have a harmless line', async () => {
    const { id, shipmentId } = await dispatched()
    await take([sent(id, 'filled', { refrigerant: 'R-410A', grossBefore: lb(36), grossAfter: lb(38), looked: true }, ago(3))])
    for (let newer = 0; newer < 20; newer++) {
      const { id: other } = await dispatched()
      await take([sent(other, 'moved', { toPlaceId: log.placeId }, ago(2))])
    }
    expect((await differingShipments(log.db, Date.now())).map(one => one.id)).toContain(shipmentId)
  }, 30_000)
})
