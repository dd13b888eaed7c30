import { meta } from '../../../drizzle/schema'
import { drawLabelCode } from '../../../utils/label/code'
import { followRules } from '../custody/rowsByRule'
import { statement, type Database } from '../database/database'
import { directory } from '../directory/directory'
import { DAY, workingMorning } from './calendar'
import { castOf } from './cast'
import { playChecks } from './checks'
import { playCare, playSignatures } from './care'
import { dockStatements } from './dock'
import { playIncidents } from './incidents'
import { jobTables, playJobs } from './jobs'
import { playPairs } from './pairs'
import { paperStatements } from './papers'
import { playLate } from './late'
import { playLives, type DemoLot, type DemoShipment, type Stage } from './lives'
import { namePhotos } from './photos'
import { planTogether } from './plan'
import { seededRandom } from './random'
import { prepareShipments } from './preparedShipments'
import { recordScript } from './record'
import { sentShipmentActs, sentShipmentPapers } from './sentShipments'
import { newScript } from './script'
import { settlementStatements } from './settlements'
import { castTables, labelTables, listTables } from './tables'
import { termsTables } from './terms'
import { vanTables } from './vans'

const SEED = 20_261_201
const HISTORY_DAYS = 548

/**
 * Fills an empty database with the invented demo firm: eighteen months of history that end now.
 *
 * It alone may hand the writer a clock of its own, and only while nothing else is in the database.
 *
 * @returns whether it was filled; false where the demo firm is there already.
 * Errors: throws where the database holds anything else.
 */
export async function fillDemo(db: Database, passwordHash: string, now: number): Promise<boolean> {
  if (await isDemo(db)) return false
  await refuseUnlessEmpty(db)
  const random = seededRandom(SEED)
  const startAt = now - HISTORY_DAYS * DAY
  const cast = castOf(random, startAt)
  const stage: Stage = {
    random, cast, startAt, endAt: now, script: newScript(random, now),
    shipments: shipmentsOf(random.uuid, startAt, now), lots: lotsOf(random.uuid, startAt, now), supervisor: cast.people.technician,
  }
  playLives(stage)
  playIncidents(stage)
  playCare(stage)
  playChecks(stage)
  playPairs(stage)
  playSignatures(stage)
  playLate(stage)
  namePhotos(stage.script)
  const jobs = playJobs(stage)
  await db.write(castTables(db, cast, passwordHash, startAt, random.uuid))
  await db.write(termsTables(db, cast, now))
  await db.write(listTables(db, stage))
  await db.write(jobTables(db, jobs))
  await directory(db, true)
  await recordScript(db, stage.script.events)
  await db.write(await paperStatements(db))
  await followRules(db, () => now)
  await db.write(sentShipmentActs(stage))
  await db.write(await sentShipmentPapers(db, stage))
  await db.write(await dockStatements(db, cast, now))
  await db.write(await settlementStatements(db, cast, now))
  await prepareShipments(db, cast, now)
  await planTogether(db, cast, now)
  await db.write(await vanTables(db, cast, now))
  await db.write(labelTables(db, stage, codesOf(stage), Array.from({ length: 10 }, () => drawLabelCode(random.bytes))))
  await db.write([statement(db.read.insert(meta).values({ key: 'demo', value: new Date(now).toISOString() }))])
  await directory(db, true)
  return true
}

async function isDemo(db: Database): Promise<boolean> {
  const result = await db.readClient.execute('SELECT value FROM meta WHERE key = \'demo\'')
  return result.rows.length > 0
}

async function refuseUnlessEmpty(db: Database): Promise<void> {
  const result = await db.readClient.execute('SELECT (SELECT count(*) FROM firm) + (SELECT count(*) FROM people) + (SELECT count(*) FROM custody_events)')
  if (result.rows[0]?.[0] !== 0) throw new Error('The demo firm goes only into an empty database; this one holds something else')
}

/** One shipment a fortnight, back after five weeks. */
function shipmentsOf(uuid: (ms: number) => string, startAt: number, now: number): DemoShipment[] {
  const list: DemoShipment[] = []
  for (let at = startAt + 45 * DAY; at < now - 3 * DAY; at += 14 * DAY) {
    const day = workingMorning(at)
    list.push({ id: uuid(day), at: day, backAt: workingMorning(day + 35 * DAY), to: list.length % 4 === 3 ? 'otherReclaimer' : 'reclaimer', cylinders: [] })
  }
  return list
}

/** One lot a month, back after three weeks. */
function lotsOf(uuid: (ms: number) => string, startAt: number, now: number): DemoLot[] {
  const list: DemoLot[] = []
  for (let at = startAt + 60 * DAY; at < now - 5 * DAY; at += 30 * DAY) {
    const day = workingMorning(at)
    list.push({ id: uuid(day), at: day, backAt: workingMorning(day + 21 * DAY), cylinders: [] })
  }
  return list
}

/** The codes that the script's `labelled` events put on cylinders. */
function codesOf({ script }: Stage): string[] {
  return script.events.flatMap(event => event.body.kind === 'labelled' ? [(event.body.details as { code: string }).code] : [])
}
