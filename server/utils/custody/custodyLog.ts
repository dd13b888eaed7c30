import type { CustodyLogAnswer, FoldInput } from '../../../utils/contract/custody'
import { foldAsItStood, knownBy, type Past } from '../../../utils/custody/asItStood'
import { asRecorded } from '../../../utils/custody/asRecorded'
import { applyCorrections } from '../../../utils/custody/corrections'
import type { LogLine, Named } from '../../../utils/custody/cylinderView'
import type { AnyRecordedEvent } from '../../../utils/custody/event'
import { lateChange } from '../../../utils/custody/findings/record'
import { fold, type FoldContext, type FoldStep } from '../../../utils/custody/fold'
import { otherCylinderOf } from '../../../utils/custody/half'
import { laterLines } from '../../../utils/custody/laterLines'
import type { Database } from '../database/database'
import { listNames } from '../cylinder-lists/openLists'
import { directory, namesOf } from '../directory/directory'
import { foreignCursor } from '../http/cursor'
import { foldContext } from './foldContext'
import { logRow, recordedEvent, SELECT_LOG } from './logRow'
import { notYetThere } from './pastCylinder'
import { saidByOthers } from './saidByOthers'

/** A cylinder's recorded events, in the order of recording. */
export async function recordedEvents(db: Database, cylinderId: string): Promise<AnyRecordedEvent[]> {
  const result = await db.readClient.execute({ sql: `${SELECT_LOG} WHERE cylinder_id = ? ORDER BY version`, args: [cylinderId] })
  return result.rows.map(row => recordedEvent(logRow(row)))
}

/**
 * A cylinder's custody log for people: in order of effect, newest first, each line numbered by recording; of a past
 * instant the lines that had happened, or were known, by then.
 *
 * @param how `recorded` counts a correction from its own line on; else it counts in the place of what it mends.
 *
 * Errors: 400 for a cursor that is none of ours; 404 where nothing had happened by then.
 */
export async function custodyLog(db: Database, cylinderId: string, page: { limit: number, cursor?: string }, past: Past | null = null, how: 'recorded' | 'stands' = 'stands'): Promise<CustodyLogAnswer> {
  const [recorded, from] = await Promise.all([recordedEvents(db, cylinderId), directory(db)])
  const events = knownBy(recorded, past?.knownAt ?? null)
  const folded = past === null ? fold(events, foldContext(from)) : foldAsItStood(events, foldContext(from), past)
  if (folded === null) throw notYetThere()
  const { state } = folded
  const shown = new Set(folded.steps.map(({ eventId }) => eventId))
  const steps = how === 'recorded' ? withCorrections(asRecorded(events.filter(({ id }) => shown.has(id)), foldContext(from)), folded.steps) : folded.steps
  const standing = new Map(applyCorrections(events).flatMap(({ event, correction, isOut }): [string, Record<string, unknown>][] => correction && !isOut ? [[event.id, event.details as Record<string, unknown>]] : []))
  const byId = new Map(events.map(event => [event.id, event]))
  const names = namesOf(from)
  const lines = steps.flatMap((step): LogLine[] => {
    const event = byId.get(step.eventId)
    if (!event) return []
    return [{
      id: event.id,
      seq: event.seq,
      version: event.version,
      kind: event.kind,
      occurredAt: instantWithOffset(event.occurredAt, event.occurredOffsetMinutes),
      effectiveAt: new Date(event.effectiveAt).toISOString(),
      recordedAt: new Date(event.recordedAt).toISOString(),
      clockSkewSeconds: event.clockSkewSeconds,
      author: names.person(event.actorId),
      postedBy: names.person(event.postedBy),
      supervisor: event.supervisorId ? names.person(event.supervisorId) : null,
      place: event.placeId ? names.place(event.placeId) : null,
      note: event.note,
      practice: event.practice,
      confirmed: event.confirmed,
      details: event.details,
      ...standing.has(event.id) && { instead: standing.get(event.id) },
      names: { ...namesInside(event.details as Record<string, unknown>, names), ...namesInside(standing.get(event.id) ?? {}, names) },
      otherCylinder: null,
      netBeforeGrams: step.before.netGrams,
      netAfterGrams: step.after.netGrams,
      findings: step.findings,
      correction: step.correction,
      signature: step.signature,
    }]
  }).reverse()
  const start = page.cursor === undefined ? 0 : lines.findIndex(line => line.id === page.cursor) + 1
  if (page.cursor !== undefined && start === 0) throw foreignCursor()
  const items = withChanges(await withLists(db, await withOtherCylinders(db, lines.slice(start, start + page.limit))), events, foldContext(from), shown)
  return {
    items,
    nextCursor: start + page.limit < lines.length ? items.at(-1)?.id ?? null : null,
    total: lines.length,
    cylinder: { id: cylinderId, labelCode: state.labelCode, serial: state.stamp?.serial ?? null, version: state.version },
  }
}

/** Which line mends which is said in either view. */
function withCorrections(steps: readonly FoldStep[], now: readonly FoldStep[]): FoldStep[] {
  const of = new Map(now.map(step => [step.eventId, step]))
  return steps.map(step => ({ ...step, correction: of.get(step.eventId)?.correction ?? null, signature: of.get(step.eventId)?.signature ?? null }))
}

/** The lines, those that came late or mend another with what they changed in lines recorded before them that are shown. */
function withChanges(lines: LogLine[], events: readonly AnyRecordedEvent[], context: FoldContext, shown: ReadonlySet<string>): LogLine[] {
  const changed = laterLines(events, context, new Set(lines.map(({ id }) => id)))
  return lines.map((line) => {
    const changes = changed.get(line.id)?.filter(({ eventId }) => shown.has(eventId)) ?? []
    if (changes.length === 0) return line
    const isLate = line.kind !== 'corrected' && line.kind !== 'countersigned'
    return { ...line, changes, findings: isLate ? [...line.findings, lateChange(changes.length)] : line.findings }
  })
}

/** The lines, each with how the other cylinder is known where it has one. */
async function withOtherCylinders(db: Database, lines: LogLine[]): Promise<LogLine[]> {
  const otherIds = lines.map(line => otherCylinderOf(line.kind, line.details))
  const ids = [...new Set(otherIds.filter(id => id !== null))]
  if (ids.length === 0) return lines
  const { rows } = await db.readClient.execute({ sql: `SELECT id, label_code, serial FROM cylinders WHERE id IN (${ids.map(() => '?').join(', ')})`, args: ids })
  const known = new Map(rows.map(row => [row[0] as string, { id: row[0] as string, labelCode: row[1] as string | null, serial: row[2] as string | null }]))
  return lines.map((line, index) => ({ ...line, otherCylinder: known.get(otherIds[index] ?? '') ?? null }))
}

/** What a browser needs to judge a draft event by the same rules as the server. */
export async function foldInput(db: Database, cylinderId: string): Promise<FoldInput> {
  const [events, said] = await Promise.all([recordedEvents(db, cylinderId), saidByOthers(db, [cylinderId])])
  const { codesOnTwo, otherHalves } = said(cylinderId)
  return { events, codesOnTwo: [...codesOnTwo], otherHalves: [...otherHalves] }
}

/** The instant in the offset in which its author wrote it. */
function instantWithOffset(ms: number, offsetMinutes: number): string {
  const sign = offsetMinutes < 0 ? '-' : '+'
  const size = Math.abs(offsetMinutes)
  const offset = offsetMinutes === 0 ? 'Z' : `${sign}${String(Math.floor(size / 60)).padStart(2, '0')}:${String(size % 60).padStart(2, '0')}`
  return new Date(ms + offsetMinutes * 60_000).toISOString().replace('Z', offset)
}

/** Lines that also name the shipments and test lots of their details. */
async function withLists(db: Database, lines: LogLine[]): Promise<LogLine[]> {
  const idsOf = ({ details, instead }: LogLine) => [details, instead].flatMap((said) => {
    const { shipmentId, lotId } = Object(said) as { shipmentId?: string, lotId?: string }
    return [shipmentId, lotId].filter(id => id !== undefined)
  })
  const ids = lines.flatMap(idsOf)
  if (ids.length === 0) return lines
  const names = await listNames(db, ids)
  return lines.map(line => ({ ...line, names: { ...line.names, ...Object.fromEntries(idsOf(line).flatMap(id => names.has(id) ? [[id, names.get(id)!]] : [])) } }))
}

/** Names of the places, people and firms that an event's details name. */
function namesInside(details: Record<string, unknown>, names: ReturnType<typeof namesOf>): Record<string, string> {
  const readers: [RegExp, (id: string) => Named][] = [
    [/^placeId$|PlaceId$/, names.place], [/HolderId$/, names.person], [/(FirmId|[oO]wnerId|OfRefrigerantId|requalifierId)$/, names.firm],
  ]
  return Object.fromEntries(Object.entries(details).flatMap(([key, value]) => {
    const reader = readers.find(([pattern]) => pattern.test(key))
    return reader && typeof value === 'string' ? [[value, reader[1](value).name]] : []
  }))
}
