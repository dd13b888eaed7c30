import { randomBytes, randomUUID } from 'node:crypto'
import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { append } from '../../server/utils/custody/append'
import { cancelDraft, createDraft } from '../../server/utils/cylinder-lists/drafts'
import { openDatabase, type Database } from '../../server/utils/database/database'
import { createFirm } from '../../server/utils/firms/createFirm'
import { createPlace } from '../../server/utils/places/createPlace'
import { closeShipment } from '../../server/utils/settlement/closeShipment'
import { endDispute, openDispute } from '../../server/utils/settlement/disputeActs'
import { readSettlement } from '../../server/utils/settlement/readSettlement'
import { settle } from '../../server/utils/settlement/settle'
import { actsOf } from '../../server/utils/shipments/acts'
import { cancelShipment } from '../../server/utils/shipments/cancelShipment'
import { changeLines } from '../../server/utils/shipments/changeLines'
import { dispatchShipment } from '../../server/utils/shipments/dispatchShipment'
import { readyShipment } from '../../server/utils/shipments/readyShipment'
import { returnLines } from '../../server/utils/shipments/returnLines'
import { theShipment } from '../../server/utils/shipments/shipments'
import { weighLine } from '../../server/utils/shipments/weighLine'
import { dispatchTestLot } from '../../server/utils/test-lots/dispatchTestLot'
import { returnTestLot } from '../../server/utils/test-lots/returnTestLot'
import { theTestLot } from '../../server/utils/test-lots/testLots'
import type { Access } from '../../utils/access/roles'
import { drawLabelCode } from '../../utils/label/code'
import { eventOf } from '../helpers/fleet'
import { madeReady } from '../helpers/readyShipment'
import { lb, stampOf } from '../helpers/stamps'

const NOW = Date.UTC(2026, 4, 4, 15)
const MONA: Access = { personId: randomUUID(), roles: ['manager'], trainee: false }

let folder: string
let db: Database
let firmId: string
let shopId: string
beforeEach(async () => {
  folder = mkdtempSync(join(tmpdir(), 'collarbook-'))
  db = await openDatabase(`file:${join(folder, 'collarbook.db')}`)
  await db.migrate('drizzle/migrations')
  await db.write([{ sql: `INSERT INTO firm (id, name, telephone, time_zone, units, created_at) VALUES (?, 'Testing firm', '555-0100', 'America/Chicago', 'lb', 0)`, args: [randomUUID()] }])
  shopId = (await createPlace(db, { name: 'North shop', kind: 'shop' }, NOW)).id
})
afterEach(() => {
  db.close()
  rmSync(folder, { recursive: true })
})

/** The database as a process sees it that is overtaken by another one, once, just before it commits. */
function overtaken(by: () => Promise<unknown>): Database {
  let isFirst = true
  return {
    ...db,
    async exclusive(work) {
      if (isFirst) {
        isFirst = false
        await by()
      }
      return db.exclusive(work)
    },
  }
}

async function registered(contents: unknown): Promise<string> {
  const id = randomUUID()
  const at = new Date(NOW - 86_400_000).toISOString()
  const details = { stamp: stampOf({ serial: id.slice(0, 8) }), marks: [{ month: '2025-06' }], ownership: 'own', contents, ...(contents !== 'evacuated' && { gross: lb(40) }) }
  const results = await append(db, {
    access: MONA, now: NOW - 86_400_000, deviceNow: null,
    events: [
      { ...eventOf(id, 'registered'), occurredAt: at, placeId: shopId, details },
      { ...eventOf(id, 'labelled'), occurredAt: at, details: { code: drawLabelCode(randomBytes) } },
    ],
  })
  expect(results.map(result => result.outcome)).toEqual(['accepted', 'accepted'])
  return id
}

async function kindsInLog(cylinderId: string): Promise<string[]> {
  const { rows } = await db.readClient.execute({ sql: 'SELECT kind FROM custody_events WHERE cylinder_id = ? ORDER BY version', args: [cylinderId] })
  return rows.map(row => row[0] as string)
}

describe('a shipment that is changed while it is sent off', () => {
  const draft = { kind: 'shipment' as const, id: randomUUID() }
  const R22 = { refrigerant: 'R-22', condition: 'clean' }
  let first: string
  let second: string
  beforeEach(async () => {
    firmId = (await createFirm(db, { name: 'Tarnvale Reclaim', kind: 'reclaimer' }, NOW)).id
    first = await registered(R22)
    second = await registered(R22)
    await createDraft(db, draft, { firmId, note: null, cylinderIds: [first], createdBy: MONA.personId, now: NOW })
    await madeReady(db, draft.id, [{ cylinderId: first, gross: lb(40) }], MONA, NOW)
  })

  const act = () => ({ id: randomUUID(), occurredAt: new Date(NOW).toISOString() })

  function dispatch(through: Database, when: { occurredAt: string, deviceNow?: string } = { occurredAt: new Date(NOW).toISOString() }) {
    const lines = [{ cylinderId: first, eventId: randomUUID(), expects: 2, gross: lb(40) }]
    return dispatchShipment(through, draft.id, { ...when, lines }, MONA, NOW)
  }

  it('leaves nothing behind where a line was added meanwhile', async () => {
    await expect(dispatch(overtaken(() => changeLines(db, draft.id, { occurredAt: act().occurredAt, add: [{ id: randomUUID(), cylinderId: second }], takeOff: [] }, MONA.personId, NOW)))).rejects.toMatchObject({ details: { status: 409, title: 'The lines have changed' } })
    expect(await kindsInLog(first)).toEqual(['registered', 'labelled'])
    expect((await theShipment(db, draft.id)).state).toBe('draft')
  })

  it('leaves nothing behind where it was cancelled meanwhile', async () => {
    await expect(dispatch(overtaken(() => cancelShipment(db, draft.id, { ...act(), reason: 'not wanted' }, MONA.personId, NOW))))
      .rejects.toMatchObject({ details: { status: 409, title: 'Nothing has left', detail: 'It was given up.' } })
    expect(await kindsInLog(first)).toEqual(['registered', 'labelled'])
    expect((await theShipment(db, draft.id)).state).toBe('cancelled')
  })

  it('leaves where nothing of it was changed', async () => {
    await dispatch(overtaken(async () => undefined))
    expect(await kindsInLog(first)).toEqual(['registered', 'labelled', 'sent-for-reclaim'])
    expect(await theShipment(db, draft.id)).toMatchObject({ state: 'dispatched', dispatchedAt: '2026-05-04T15:00:00.000Z' })
  })

  it('is told who sent it off where somebody else was first', async () => {
    await expect(dispatch(overtaken(() => dispatch(db)))).rejects.toMatchObject({ details: { status: 409, title: 'It has left already', type: 'already-left' } })
    expect(await kindsInLog(first)).toEqual(['registered', 'labelled', 'sent-for-reclaim'])
  })

  it('leaves nothing behind where a line was weighed anew meanwhile, though it was made ready again', async () => {
    const again = async () => {
      await weighLine(db, draft.id, { ...act(), ref: first, gross: lb(39) }, MONA.personId, NOW + 1)
      await readyShipment(db, draft.id, { id: randomUUID(), occurredAt: new Date(NOW + 1).toISOString() }, MONA, NOW + 1)
    }
    await expect(dispatch(overtaken(again))).rejects.toMatchObject({ details: { status: 409, title: 'The lines have changed' } })
    expect(await kindsInLog(first)).toEqual(['registered', 'labelled'])
  })

  it('takes what came back once where two people do it at the same moment, and closes with the last of it', async () => {
    await dispatch(db)
    const takeBack = (through: Database) => returnLines(through, draft.id, {
      occurredAt: new Date(NOW + 1).toISOString(), placeId: shopId, reason: 'Refused', lines: [{ cylinderId: first, eventId: randomUUID(), gross: lb(40) }],
    }, MONA, NOW + 1)
    await expect(takeBack(overtaken(() => takeBack(db)))).rejects.toMatchObject({ details: { status: 409 } })
    expect(await kindsInLog(first)).toEqual(['registered', 'labelled', 'sent-for-reclaim', 'returned'])
    expect((await theShipment(db, draft.id)).state).toBe('closed')
    expect((await actsOf(db, draft.id)).map(({ kind }) => kind)).toEqual(['weighed', 'carrier-chosen', 'ready', 'dispatched', 'returned', 'closed'])
  })

  it('stays open with all of it back while a dispute is, and is settled and closed after it', async () => {
    await dispatch(db)
    const disputeId = randomUUID()
    const later = { shipmentId: draft.id, personId: MONA.personId, now: NOW + 1 }
    await openDispute(db, { ...act(), disputeId, about: 'gross', cylinderId: first, text: 'They weighed it with its cap.', photoIds: [] }, later)
    await returnLines(db, draft.id, { occurredAt: new Date(NOW + 1).toISOString(), placeId: shopId, reason: 'Refused', lines: [{ cylinderId: first, eventId: randomUUID(), gross: lb(40) }] }, MONA, NOW + 1)
    expect((await theShipment(db, draft.id)).state).toBe('dispatched')
    await endDispute(db, disputeId, { ...act(), outcome: 'agreed', reason: 'It is back.' }, later)
    await settle(db, draft.id, { ...act(), revision: (await readSettlement(db, draft.id)).revision, lines: [] }, MONA, NOW + 2)
    await closeShipment(db, draft.id, act(), MONA.personId, NOW + 3)
    expect(await theShipment(db, draft.id)).toMatchObject({ state: 'closed' })
    expect(await kindsInLog(first)).toEqual(['registered', 'labelled', 'sent-for-reclaim', 'returned'])
  })

  it('is dated as its events are where the sender\'s clock runs two days fast', async () => {
    await dispatch(db, { occurredAt: '2026-05-06T14:00:00.000Z', deviceNow: '2026-05-06T15:00:00.000Z' })
    expect((await theShipment(db, draft.id)).dispatchedAt).toBe('2026-05-04T14:00:00.000Z')
  })
})

describe('a test lot that is changed while it is sent off or taken back', () => {
  const draft = { kind: 'test-lot' as const, id: randomUUID() }
  let cylinder: string
  beforeEach(async () => {
    firmId = (await createFirm(db, { name: 'Ostwick Cylinder Tests', kind: 'requalifier', rin: 'A123' }, NOW)).id
    cylinder = await registered('evacuated')
    await createDraft(db, draft, { firmId, note: null, cylinderIds: [cylinder], createdBy: MONA.personId, now: NOW })
  })

  function dispatch(through: Database) {
    const lines = [{ cylinderId: cylinder, eventId: randomUUID(), expects: 2 }]
    return dispatchTestLot(through, draft.id, { occurredAt: new Date(NOW).toISOString(), lines }, MONA, NOW)
  }

  function takeBack(through: Database) {
    const lines = [{
      cylinderId: cylinder, retestedEventId: randomUUID(), returnedEventId: randomUUID(), result: 'passed' as const, method: 'volumetric' as const, month: '2026-05',
    }]
    return returnTestLot(through, draft.id, { occurredAt: new Date(NOW + 1).toISOString(), toPlaceId: shopId, lines }, MONA, NOW + 1)
  }

  it('leaves nothing behind where it was cancelled meanwhile', async () => {
    await expect(dispatch(overtaken(() => cancelDraft(db, draft)))).rejects.toMatchObject({ details: { status: 409, title: 'This test lot is no draft' } })
    expect(await kindsInLog(cylinder)).toEqual(['registered', 'labelled'])
  })

  it('is taken back once where two people do it at the same moment', async () => {
    await dispatch(db)
    await expect(takeBack(overtaken(() => takeBack(db)))).rejects.toMatchObject({ details: { status: 409 } })
    expect(await kindsInLog(cylinder)).toEqual(['registered', 'labelled', 'sent-for-test', 'retested', 'returned'])
    expect((await theTestLot(db, draft.id)).state).toBe('back')
  })
})
