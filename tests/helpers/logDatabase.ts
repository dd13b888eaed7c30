import { randomUUID } from 'node:crypto'
import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join, resolve } from 'node:path'
import { firm, people, places } from '../../drizzle/schema'
import { append } from '../../server/utils/custody/append'
import { openDatabase, statement, type Database } from '../../server/utils/database/database'
import type { Access } from '../../utils/access/roles'
import type { EventResult } from '../../utils/contract/custody'
import { lb, stampOf } from './stamps'

/** A custody log in a file of its own, with the least that events need around it. */
export interface LogDatabase {
  db: Database
  file: string
  warehouse: Access
  technician: Access
  manager: Access
  placeId: string
  /** Another process's view of the same file. */
  openAgain: () => Promise<Database>
  close: () => void
}

export async function openLogDatabase(): Promise<LogDatabase> {
  const folder = mkdtempSync(join(tmpdir(), 'collarbook-log-'))
  const file = join(folder, 'collarbook.db')
  const db = await openDatabase(`file:${file}`)
  await db.migrate(resolve('drizzle/migrations'))
  const person = (role: Access['roles'][number]): Access => ({ personId: randomUUID(), roles: [role], trainee: false })
  const [warehouse, technician, manager] = [person('warehouse'), person('technician'), person('manager')]
  const placeId = randomUUID()
  await db.write([
    statement(db.read.insert(firm).values({ id: randomUUID(), name: 'Testing firm', telephone: '555-0100', timeZone: 'America/Chicago', units: 'lb', createdAt: 0 })),
    ...[warehouse, technician, manager].map((access, index) => statement(db.read.insert(people).values({
      id: access.personId, email: `person${index}@firm.example`, name: `Person ${index}`, roles: [...access.roles], certificationType: 'universal', units: 'lb', createdAt: 0,
    }))),
    statement(db.read.insert(places).values({ id: placeId, name: 'Shop', kind: 'shop', createdAt: 0 })),
  ])
  const others: Database[] = []
  return {
    db, file, warehouse, technician, manager, placeId,
    async openAgain() {
      const other = await openDatabase(`file:${file}`)
      others.push(other)
      return other
    },
    close() {
      for (const one of [db, ...others]) one.close()
      rmSync(folder, { recursive: true, force: true })
    },
  }
}

/** An event as a phone would send it. */
export function sent(cylinderId: string, kind: string, details: object, more: object = {}): { id: string, cylinderId: string } & Record<string, unknown> {
  return { id: randomUUID(), cylinderId, kind, occurredAt: new Date().toISOString(), deviceId: 'phone-1', deviceSeq: 1, ...more, details }
}

/** Appends events by one person now. */
export function record(db: Database, access: Access, events: unknown[], clock: { now?: number, deviceNow?: number } = {}): Promise<EventResult[]> {
  return append(db, { events, access, now: clock.now ?? Date.now(), deviceNow: clock.deviceNow ?? null })
}

/** A cylinder registered evacuated, with a 47.6 lb water capacity and a 27.5 lb tare; answers its id. */
export async function newCylinder({ db, warehouse, placeId }: LogDatabase, changes: { testedMonth?: string } = {}): Promise<string> {
  const cylinderId = randomUUID()
  const results = await record(db, warehouse, [sent(cylinderId, 'registered', {
    stamp: stampOf({ serial: `T${cylinderId.slice(0, 8)}`, madeMonth: '2020-01' }),
    marks: [{ month: changes.testedMonth ?? '2025-01' }],
    ownership: 'own', contents: 'evacuated', gross: lb(27.5),
  }, { placeId })])
  if (results[0]?.outcome !== 'accepted') throw new Error(JSON.stringify(results))
  return cylinderId
}
