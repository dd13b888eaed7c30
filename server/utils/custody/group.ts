import type { InStatement } from '@libsql/client'
import type { AnyCustodyEvent, AnyRecordedEvent } from '../../../utils/custody/event'
import type { Half } from '../../../utils/custody/half'
import { directory, type Directory } from '../directory/directory'
import type { Database } from '../database/database'
import { SHARED_CODES, sharedCodes } from './findCylinder'
import { looksBack, unknownIds, type KnownIds } from './judge'
import { keptCylinders, keptFrom, type KeptCylinder } from './keptCylinders'
import { logsOf } from './logPages'
import { LOG_POINT, logPoint, type LogPoint, type LogRow } from './logRow'
import { halvesFrom, halvesOf } from './saidByOthers'
import type { ChainHead } from './sealedRow'

/** What a group of events is judged on: the log as it stands, growing by each event that is accepted. */
export interface Group extends LogPoint {
  directory: Directory
  known: KnownIds
  stored: (eventId: string) => { contentHash: string, seq: number, version: number } | undefined
  /** The events of a cylinder, those added included. Errors: throws where no event of the group {@link looksBack} at them. */
  eventsOf: (cylinderId: string) => readonly AnyRecordedEvent[]
  headOf: (cylinderId: string) => ChainHead
  nextSeq: () => number
  add: (row: LogRow, event: AnyRecordedEvent) => void
  /** Codes of a cylinder that another one claims too. */
  codesOnTwo: (cylinderId: string) => ReadonlySet<string>
  /** What was kept of a cylinder before. */
  keptOf: (cylinderId: string) => KeptCylinder
  /** The halves of a cylinder, and those of others that name it, as they stood before. */
  halvesBefore: (cylinderId: string) => { own: Half[], naming: Half[] }
  /** Cylinders that an accepted event has touched, with what was added to each. */
  touched: () => { cylinderId: string, added: readonly AddedLine[] }[]
  mark: () => number
  /** Forgets what was added since the mark. */
  backTo: (mark: number) => void
}

/** An accepted event, and the line that the log will hold of it. */
export interface AddedLine { row: LogRow, event: AnyRecordedEvent }

const NONE: ReadonlySet<string> = new Set()
const NOTHING_KEPT: KeptCylinder = { head: { version: 0, hash: '' }, row: null, state: null, isSaidOf: false }

/** Reads what these events are to be judged on. What is read later than the rest is no danger: whoever wrote meanwhile was first. */
export async function group(db: Database, events: readonly AnyCustodyEvent[]): Promise<Group> {
  const ids = [...new Set(events.map(event => event.id))]
  const cylinderIds = [...new Set(events.map(event => event.cylinderId))]
  const [pointRows, storedRows, keptRows] = await db.readClient.batch([
    LOG_POINT,
    inList('SELECT id, content_hash, seq, version FROM custody_events WHERE id IN', ids),
    keptCylinders(cylinderIds),
  ], 'read')
  const { newest, turn } = logPoint(pointRows!.rows[0]!)
  const stored = new Map(storedRows!.rows.map(row => [row[0] as string, {
    contentHash: row[1] as string, seq: row[2] as number, version: row[3] as number,
  }]))
  const kept = keptFrom(keptRows!.rows)
  const lookedBackAt = [...new Set(events.filter(looksBack).map(event => event.cylinderId))]
  const [lists, beside, logs] = await Promise.all([
    listsNamed(db, events), saidBetween(db, cylinderIds.filter(id => kept.get(id)?.isSaidOf)), logsOf(db, lookedBackAt),
  ])
  const { from, known } = await knownIds(db, events, lists)

  const added: AddedLine[] = []
  const addedTo = (cylinderId: string) => added.filter(one => one.row.cylinder_id === cylinderId)
  const keptOf = (cylinderId: string) => kept.get(cylinderId) ?? NOTHING_KEPT
  return {
    newest,
    turn,
    directory: from,
    known,
    codesOnTwo: cylinderId => beside.shared.get(cylinderId) ?? NONE,
    keptOf,
    halvesBefore: cylinderId => ({
      own: beside.own.filter(half => half.cylinderId === cylinderId), naming: beside.naming.filter(half => half.otherId === cylinderId),
    }),
    stored(eventId) {
      const now = added.find(one => one.row.id === eventId)
      return now ? { contentHash: now.row.content_hash, seq: now.row.seq, version: now.row.version } : stored.get(eventId)
    },
    eventsOf(cylinderId) {
      if (!lookedBackAt.includes(cylinderId)) throw new Error(`The log of ${cylinderId} was not read`)
      return [...(logs.get(cylinderId) ?? []), ...addedTo(cylinderId).map(({ event }) => event)]
    },
    headOf(cylinderId) {
      const last = addedTo(cylinderId).at(-1)
      return last ? { version: last.row.version, hash: last.row.hash } : keptOf(cylinderId).head
    },
    nextSeq: () => (added.at(-1)?.row.seq ?? newest?.seq ?? 0) + 1,
    add: (row, event) => void added.push({ row, event }),
    touched() {
      const touched = [...new Set(added.map(one => one.row.cylinder_id))]
      return touched.map(cylinderId => ({ cylinderId, added: addedTo(cylinderId) }))
    },
    mark: () => added.length,
    backTo: mark => void added.splice(mark),
  }
}

/** What the logs of cylinders and those of others say of each other. */
async function saidBetween({ readClient }: Database, cylinderIds: string[]): Promise<{ shared: Map<string, Set<string>>, own: Half[], naming: Half[] }> {
  if (cylinderIds.length === 0) return { shared: new Map(), own: [], naming: [] }
  const [shared, own, naming] = await readClient.batch([
    inList(SHARED_CODES, cylinderIds), halvesOf('cylinder_id', cylinderIds), halvesOf('other_id', cylinderIds),
  ], 'read')
  return { shared: sharedCodes(shared!.rows), own: halvesFrom(own!.rows), naming: halvesFrom(naming!.rows) }
}

/** Ids of what events name beside what the directory holds. */
interface Listed { shipments: Set<string>, testLots: Set<string>, jobs: Set<string> }

/** The shipments, test lots and jobs that events name, as far as there are any. */
async function listsNamed({ readClient }: Database, events: readonly AnyCustodyEvent[]): Promise<Listed> {
  const named = idsIn(events)
  if (named.shipments.size + named.testLots.size + named.jobs.size === 0) return named
  const [shipments, testLots, jobs] = await readClient.batch([
    inList('SELECT id FROM shipments WHERE id IN', [...named.shipments]),
    inList('SELECT id FROM test_lots WHERE id IN', [...named.testLots]),
    inList('SELECT id FROM jobs WHERE id IN', [...named.jobs]),
  ], 'read')
  const found = (answer: typeof jobs) => new Set(answer!.rows.map(row => row[0] as string))
  return { shipments: found(shipments), testLots: found(testLots), jobs: found(jobs) }
}

/** The directory, read again when an event names an id that the kept one does not have. */
async function knownIds(db: Database, events: readonly AnyCustodyEvent[], { shipments, testLots, jobs }: Listed) {
  let from = await directory(db)
  const known: KnownIds = {
    place: id => from.places.has(id),
    person: id => from.people.has(id),
    firm: id => from.firms.has(id),
    scale: id => from.scales.has(id),
    shipment: id => shipments.has(id),
    testLot: id => testLots.has(id),
    job: id => jobs.has(id),
  }
  if (events.some(event => unknownIds(event, known).length > 0)) from = await directory(db, true)
  return { from, known }
}

function idsIn(events: readonly AnyCustodyEvent[]): Listed {
  const named: Listed = { shipments: new Set(), testLots: new Set(), jobs: new Set() }
  for (const event of events) {
    const details = event.details as NamingIds & { instead?: NamingIds }
    for (const holder of [details, details.instead]) {
      if (holder?.shipmentId) named.shipments.add(holder.shipmentId.toLowerCase())
      if (holder?.lotId) named.testLots.add(holder.lotId.toLowerCase())
      if (holder?.jobId) named.jobs.add(holder.jobId.toLowerCase())
    }
  }
  return named
}

interface NamingIds { shipmentId?: string, lotId?: string, jobId?: string }

function inList(sql: string, values: string[], end = ''): InStatement {
  return { sql: `${sql} (${values.map(() => '?').join(', ')}) ${end}`, args: values }
}
