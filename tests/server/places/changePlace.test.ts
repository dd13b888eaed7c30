import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, expect, it } from 'vitest'
import { people } from '../../../drizzle/schema'
import { statement } from '../../../server/utils/database/database'
import { directory } from '../../../server/utils/directory/directory'
import type { Problem } from '../../../server/utils/http/problem'
import { changePlace } from '../../../server/utils/places/changePlace'
import { createPlace } from '../../../server/utils/places/createPlace'
import { openLogDatabase, type LogDatabase } from '../../helpers/logDatabase'

let log: LogDatabase
beforeAll(async () => {
  log = await openLogDatabase()
})
afterAll(() => log.close())

const errorsOf = (change: Promise<unknown>) => change.then(() => [], (error: Problem) => error.details.errors)

async function person(changes: { roles: string[], active?: boolean }): Promise<string> {
  const id = randomUUID()
  await log.db.write([statement(log.db.read.insert(people).values({ id, email: `${id}@firm.example`, name: 'Somebody', units: 'lb', createdAt: 0, ...changes }))])
  return id
}

it('gives a van only to a technician in service, and leaves it to one who has left until it is given away', async () => {
  const driver = await person({ roles: ['technician'] })
  const van = await createPlace(log.db, { name: 'Van', kind: 'van', technicianId: driver }, 0)
  const notInService = [{ path: 'technicianId', message: 'must be a technician in service' }]
  const [left, clerk] = [await person({ roles: ['technician'], active: false }), await person({ roles: ['warehouse'] })]
  for (const technicianId of [left, clerk]) {
    expect(await errorsOf(changePlace(log.db, van.id, { technicianId }))).toEqual(notInService)
    expect(await errorsOf(createPlace(log.db, { name: 'Van 2', kind: 'van', technicianId }, 0))).toEqual(notInService)
  }
  await log.db.write([{ sql: 'UPDATE people SET active = 0 WHERE id = ?', args: [driver] }])
  await directory(log.db, true)
  expect(await changePlace(log.db, van.id, { name: 'Old van' })).toMatchObject({ name: 'Old van', technicianId: driver })
  expect((await changePlace(log.db, van.id, { technicianId: null })).technicianId).toBeNull()
  expect(await errorsOf(changePlace(log.db, van.id, { technicianId: driver }))).toEqual(notInService)
})
