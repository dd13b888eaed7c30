import type { InStatement } from '@libsql/client'
import type { AnyCustodyEvent, AnyRecordedEvent } from '../../../utils/custody/event'
import type { Half } from '../../../utils/custody/half'
import { directory, type Directory } from '../directory/directory'
import type { Database } from '../database/database'
import { ROWS_BEFORE, rowsBefore, type Columns } from './cacheChanges'
import { SHARED_CODES, sharedCodes } from './findCylinder'
import { halvesFrom, halvesOf } from './saidByOthers'
import { unknownIds, type KnownIds } from './judge'
import { eventLine, recordedEvent, SELECT_EVENT_LINES, type LogRow } from './logRow'
import type { ChainHead } from './sealedRow'

/** What a group of events is judged on: the log as it stands, growing by each event that is accepted. */
export interface Group {
  /** The last line of the whole log; null while it is empty. */
  newest: { seq: number, id: string } | null
  directory: Directory
  known: KnownIds
  stored: (eventId: string) => { contentHash: string, seq: number, version: number } | undefined
  eventsOf: (cylinderId: string) => readonly AnyRecordedEvent[]
  headOf: (cylinderId: string) => ChainHead
  nextSeq: () => number
  add: (row: LogRow, event: AnyRecordedEvent) => void
  /** Codes of a cylinder that another one claims too. */
  codesOnTwo: (cylinderId: string) => ReadonlySet<string>
  /** The row of a cylinder as it stood before; null where there is none. */
  rowBefore: (cylinderId: string) => Columns | null
  /** The halves of a cylinder, and those of others that name it, as they stood before. */
  halvesBefore: (cylinderId: string) => { own: Half[], naming: Half[] }
  /** Cylinders that an accepted event has touched, with the lines added to each. */
  touched: () => { cylinderId: string, events: readonly AnyRecordedEvent[], added: readonly LogRow[] }[]
  mark: () => number
  /** Forgets what was added since the mark. */
  backTo: (mark: number) => void
}

const NONE: ReadonlySet<string> = new Set()

/** Reads what these events are to be judged on, at one instant. */
export async function group(db: Database, events: readonly AnyCustodyEvent[]): Promise<Group> {
  const ids = [...new Set(events.map(event => event.id))]
  const cylinderIds = [...new Set(events.map(event => event.cylinderId))]
  const named = idsIn(events)
  const [newestRows, storedRows, logRows, shipmentRows, lotRows, sharedRows, ownHalves, namingHalves, cylinderRows] = await db.readClient.batch([
    'SELECT seq, id FROM custody_events ORDER BY seq DESC LIMIT 1',
    inList('SELECT id, content_hash, seq, version FROM custody_events WHERE id IN', ids),
    inList(`${SELECT_EVENT_LINES} WHERE cylinder_id IN`, cylinderIds, 'ORDER BY cylinder_id, version'),
    inList('SELECT id FROM shipments WHERE id IN', named.shipments),
    inList('SELECT id FROM test_lots WHERE id IN', named.testLots),
    inList(SHARED_CODES, cylinderIds),
    halvesOf('cylinder_id', cylinderIds),
    halvesOf('other_id', cylinderIds),
    inList(ROWS_BEFORE, cylinderIds),
  ], 'read')

  const newestRow = newestRows?.rows[0]
  const newest = newestRow ? { seq: newestRow[0] as number, id: newestRow[1] as string } : null
  const stored = new Map((storedRows?.rows ?? []).map(row => [row[0] as string, {
    contentHash: row[1] as string, seq: row[2] as number, version: row[3] as number,
  }]))
  const heads = new Map<string, ChainHead>()
  const logs = new Map<string, AnyRecordedEvent[]>()
  for (const raw of logRows?.rows ?? []) {
    const line = eventLine(raw)
    heads.set(line.cylinder_id, { version: line.version, hash: line.hash })
    const log = logs.get(line.cylinder_id)
    if (log) log.push(recordedEvent(line))
    else logs.set(line.cylinder_id, [recordedEvent(line)])
  }
  const shipments = new Set((shipmentRows?.rows ?? []).map(row => row[0] as string))
  const testLots = new Set((lotRows?.rows ?? []).map(row => row[0] as string))
  const shared = sharedCodes(sharedRows?.rows ?? [])
  const own = halvesFrom(ownHalves?.rows ?? [])
  const naming = halvesFrom(namingHalves?.rows ?? [])
  const before = rowsBefore(cylinderRows?.rows ?? [])
  const { from, known } = await knownIds(db, events, shipments, testLots)

  const added: { row: LogRow, event: AnyRecordedEvent }[] = []
  const addedTo = (cylinderId: string) => added.filter(one => one.row.cylinder_id === cylinderId)
  const eventsOf = (cylinderId: string) => [...(logs.get(cylinderId) ?? []), ...addedTo(cylinderId).map(one => one.event)]
  return {
    newest,
    directory: from,
    known,
    codesOnTwo: cylinderId => shared.get(cylinderId) ?? NONE,
    rowBefore: cylinderId => before.get(cylinderId) ?? null,
    halvesBefore: cylinderId => ({
      own: own.filter(half => half.cylinderId === cylinderId), naming: naming.filter(half => half.otherId === cylinderId),
    }),
    stored(eventId) {
      const now = added.find(one => one.row.id === eventId)
      return now ? { contentHash: now.row.content_hash, seq: now.row.seq, version: now.row.version } : stored.get(eventId)
    },
    eventsOf,
    headOf(cylinderId) {
      const last = addedTo(cylinderId).at(-1)
      return last ? { version: last.row.version, hash: last.row.hash } : heads.get(cylinderId) ?? { version: 0, hash: '' }
    },
    nextSeq: () => (added.at(-1)?.row.seq ?? newest?.seq ?? 0) + 1,
    add: (row, event) => void added.push({ row, event }),
    touched() {
      const touched = [...new Set(added.map(one => one.row.cylinder_id))]
      return touched.map(cylinderId => ({
        cylinderId,
        events: eventsOf(cylinderId),
        added: addedTo(cylinderId).map(one => one.row),
      }))
    },
    mark: () => added.length,
    backTo: mark => void added.splice(mark),
  }
}

/** The directory, read again when an event names an id that the kept one does not have. */
async function knownIds(db: Database, events: readonly AnyCustodyEvent[], shipments: ReadonlySet<string>, testLots: ReadonlySet<string>) {
  let from = await directory(db)
  const known: KnownIds = {
    place: id => from.places.has(id),
    person: id => from.people.has(id),
    firm: id => from.firms.has(id),
    scale: id => from.scales.has(id),
    shipment: id => shipments.has(id),
    testLot: id => testLots.has(id),
  }
  if (events.some(event => unknownIds(event, known).length > 0)) from = await directory(db, true)
  return { from, known }
}

function idsIn(events: readonly AnyCustodyEvent[]): { shipments: string[], testLots: string[] } {
  const shipments = new Set<string>()
  const testLots = new Set<string>()
  for (const event of events) {
    const details = event.details as { shipmentId?: string, lotId?: string, instead?: { shipmentId?: string, lotId?: string } }
    for (const holder of [details, details.instead]) {
      if (holder?.shipmentId) shipments.add(holder.shipmentId.toLowerCase())
      if (holder?.lotId) testLots.add(holder.lotId.toLowerCase())
    }
  }
  return { shipments: [...shipments], testLots: [...testLots] }
}

function inList(sql: string, values: string[], end = ''): InStatement {
  return { sql: `${sql} (${values.map(() => '?').join(', ')}) ${end}`, args: values }
}
