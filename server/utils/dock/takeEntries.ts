import { v7 as uuid } from 'uuid'
import type { DockEntriesAnswer, DockEntriesBody, DockResult } from '../../../utils/contract/dock'
import type { ShipmentState } from '../../../utils/contract/shipments'
import type { DockEntry, LinkedDockEntry } from '../../../utils/dock/entry'
import type { Guard } from '../custody/posting'
import type { Database } from '../database/database'
import { problem } from '../http/problem'
import { actStatement } from '../shipments/acts'
import { arriveStatements } from '../shipments/arriveStatements'
import { shipmentLines } from '../shipments/shipmentLines'
import { theShipment } from '../shipments/shipments'
import { closedBecause, dockAnswer } from './dockAnswer'
import { dockEntries, DOCK_ACT } from './linkEntries'
import { opensNothing, type DockLinkRow } from './openedLink'
import { settledAt } from './settledAt'

/** More than any dock has to say of one shipment. */
const MOST_ENTRIES = 5_000

type Refusal = ReturnType<typeof problem>

/** What an entry is judged by. */
interface Known { state: ShipmentState, kept: ReadonlyMap<string, LinkedDockEntry>, cylinderIds: ReadonlySet<string>, own: Set<string> }

/**
 * Keeps what was said at the dock, each entry by itself: it is new, it was kept before, or it is refused. With the first
 * that has something there, a shipment on its way has arrived, in the same commit.
 *
 * Errors: 404 for another shipment than the link's.
 */
export async function takeEntries(db: Database, link: DockLinkRow, shipmentId: string, body: DockEntriesBody, now: number): Promise<DockEntriesAnswer> {
  if (shipmentId !== link.shipmentId) throw opensNothing()
  const [{ state }, lines, kept] = await Promise.all([theShipment(db, shipmentId), shipmentLines(db, shipmentId), dockEntries(db, shipmentId)])
  const known: Known = { state, kept: byId(kept), cylinderIds: new Set(lines.map(line => line.cylinderId)), own: ownIds(kept, link.id) }
  const refusals = new Map<string, Refusal>()
  const fresh: DockEntry[] = []
  for (const entry of body.entries) {
    const before = known.kept.get(entry.id)
    const refusal = before ? repeatedOtherwise(before, entry, link.id) : refusalOf(entry, known)
    if (refusal) refusals.set(entry.id, refusal)
    else if (!before) {
      fresh.push(entry)
      if (entry.kind !== 'taken-out') known.own.add(entry.id)
    }
  }
  const written = await keep(db, link, { deviceNow: body.deviceNow, entries: fresh }, now)
  // What was not written was kept meanwhile, or the shipment or the link was closed meanwhile.
  const after = fresh.length > written.size ? byId(await dockEntries(db, shipmentId)) : known.kept
  const results = body.entries.map((entry): DockResult => {
    const { id } = entry
    if (written.has(id)) return { id, outcome: 'accepted' }
    const there = after.get(id)
    const refusal = refusals.get(id) ?? (there ? repeatedOtherwise(there, entry, link.id) : notTaken())
    return refusal ? { id, outcome: 'refused', problem: refusal.details } : { id, outcome: 'duplicate' }
  })
  return { results, dock: await dockAnswer(db, link, now) }
}

function byId(entries: readonly LinkedDockEntry[]): Map<string, LinkedDockEntry> {
  return new Map(entries.map(entry => [entry.id, entry]))
}

/** What may be taken out over a link. */
function ownIds(kept: readonly LinkedDockEntry[], linkId: string): Set<string> {
  return new Set(kept.filter(entry => entry.linkId === linkId && entry.kind !== 'taken-out').map(entry => entry.id))
}

/** Writes entries, and the arrival that they tell of; answers the ids of those that were written. */
async function keep(db: Database, link: DockLinkRow, { deviceNow, entries }: DockEntriesBody, now: number): Promise<Set<string>> {
  const open = stillOpen(link, now)
  const at = (entry: DockEntry) => settledAt(entry.at, { deviceNow, now, earliest: link.createdAt })
  const first = entries.find(({ kind }) => kind !== 'missing' && kind !== 'taken-out')
  const acts = entries.map((entry) => {
    const { cylinderId = null, ...details } = entry.said as { cylinderId?: string }
    return actStatement({
      id: entry.id, shipmentId: link.shipmentId, kind: `${DOCK_ACT}${entry.kind}`, cylinderId, details,
      by: { linkId: link.id, linkName: entry.name }, occurredAt: at(entry), recordedAt: now,
    }, open)
  })
  const arrival = first
    ? arriveStatements(link.shipmentId, { id: uuid(), by: { linkId: link.id, linkName: first.name }, occurredAt: at(first), recordedAt: now }, open)
    : []
  const results = await db.write([...arrival, ...acts])
  return new Set(results.slice(arrival.length).flatMap(({ rows }) => rows.map(row => row[0] as string)))
}

/** That the link still opens and its shipment still takes entries, as the commit finds them. */
function stillOpen(link: DockLinkRow, now: number): Guard {
  return {
    sql: `EXISTS (SELECT 1 FROM dock_links JOIN shipments ON shipments.id = dock_links.shipment_id
      WHERE dock_links.id = ? AND dock_links.revoked_at IS NULL AND dock_links.expires_at > ? AND shipments.state IN ('dispatched', 'arrived'))`,
    args: [link.id, now],
  }
}

function refusalOf(entry: DockEntry, known: Known): Refusal | null {
  const closed = closedBecause(known.state)
  if (closed !== null) return problem(409, 'No more is taken down', closed, undefined, { type: 'dock-closed' })
  if (known.kept.size >= MOST_ENTRIES) return problem(409, 'Too many entries', 'So much was said of this shipment that nothing more is taken down. Speak to the sender.')
  if ('cylinderId' in entry.said && !known.cylinderIds.has(entry.said.cylinderId)) {
    return problem(422, 'Not on this shipment', 'This cylinder is not on the papers. Tell of it as one that was not expected.', [{ path: 'said.cylinderId', message: 'is not on this shipment' }])
  }
  if (entry.kind === 'taken-out' && !known.own.has(entry.said.entryId)) {
    return problem(422, 'Not yours to take out', 'Only what came over this link is taken out over it.', [{ path: 'said.entryId', message: 'is no entry of this link' }])
  }
  return null
}

function repeatedOtherwise(before: LinkedDockEntry, entry: DockEntry, linkId: string): Refusal | null {
  const isSame = before.linkId === linkId && before.kind === entry.kind && before.name === entry.name && sorted(before.said) === sorted(entry.said)
  return isSame ? null : problem(409, 'Another entry has this id', 'What was taken down first stays. Make the entry again.')
}

/** As text, whatever the order of its fields. */
function sorted(value: object): string {
  return JSON.stringify(Object.entries(value).sort(([a], [b]) => a < b ? -1 : 1))
}

function notTaken(): Refusal {
  return problem(409, 'It was not taken down', 'The shipment or the link was closed meanwhile.', undefined, { type: 'dock-closed' })
}
