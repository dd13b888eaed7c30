import type { InStatement } from '@libsql/client'
import { v7 as uuid } from 'uuid'
import type { Access } from '~~/utils/access/roles'
import type { LineFigures, StatementFigures } from '~~/utils/settlement/figures'
import { changesOfLine } from '~~/utils/settlement/statementCsv'
import { refuseRefused } from '../cylinder-lists/lineCommands'
import { append } from '../custody/append'
import { cylinderRows } from '../custody/fleet'
import type { Guard } from '../custody/posting'
import type { Database } from '../database/database'
import { problem } from '../http/problem'
import { actStatement, claimedAt, isKept, isKeptNow, type NewAct } from '../shipments/acts'
import { disputesOf } from './disputes'
import { disputeStatements } from './disputeStatements'
import { headStatement, isAt, lineStatement } from './figureStatements'
import { FIGURE_ACTS, figuresIn, readSettlement, type ReadSettlement } from './readSettlement'
import { reclaimedDetails, reclaimedEvents } from './reclaimedEvents'

/** New figures of a settlement, and the act that they come with. */
export interface FigureChange {
  act: { id: string, occurredAt: string, kind: 'figures-set' | 'statement-taken', details?: Record<string, unknown> }
  /** Of the settlement that its sender saw. */
  revision: number
  lines: ReadonlyMap<string, LineFigures>
  statement?: StatementFigures
}

const STATES = ['dispatched', 'arrived', 'settled']

/**
 * Puts new figures into a settlement, with the disputes that follow from them, as one act. Where it is settled already,
 * the log's entries are corrected in the same commit. The same request sent again changes nothing.
 *
 * Errors: 404; 409 where it has not left or is closed, where somebody changed the figures since, or where a line would be
 * settled in another way than the log has it; 422 for a line that is none of it.
 */
export async function setFigures(db: Database, shipmentId: string, change: FigureChange, access: Access, now: number): Promise<void> {
  const [only, ...more] = change.act.kind === 'figures-set' ? change.lines.keys() : []
  const act: NewAct = { ...change.act, shipmentId, cylinderId: more.length === 0 ? only ?? null : null, by: { personId: access.personId }, occurredAt: claimedAt(change.act.occurredAt, now), recordedAt: now }
  if (await isKept(db, act)) return
  const before = await readSettlement(db, shipmentId)
  refuseUnlessAt(before, change.revision)
  refuseStrange(before, change)

  const after = withFigures(before, change)
  const details = { ...change.act.details, changes: changesBetween(before, after), ...change.statement && { statement: change.statement } }
  const disputes = await disputesOf(db, shipmentId)
  const statements = (where: Guard): InStatement[] => {
    const isOurs = isKeptNow(act)
    return [
      actStatement({ ...act, details }, where),
      ...[...change.lines].map(([cylinderId, figures]) => lineStatement(shipmentId, cylinderId, figures, isOurs)),
      ...change.statement ? [headStatement(shipmentId, change.statement, isOurs)] : [],
      ...disputeStatements(disputes, figuresIn(after), act, isOurs),
    ]
  }
  const isAsSeen = isAt(shipmentId, STATES, { revision: change.revision, acts: FIGURE_ACTS })
  const corrections = before.shipment.state === 'settled' ? await correctionsOf(db, before, change, now) : []
  try {
    if (corrections.length === 0) {
      const [kept] = await db.write(statements(isAsSeen))
      if (kept?.rows.length !== 1) throw changedMeanwhile()
      return
    }
    const alongside = (guard: Guard) => [holds(shipmentId, isAsSeen, guard), ...statements(guard)]
    refuseRefused(await append(db, { events: corrections, access, now, deviceNow: null, dispatch: { alongside } }))
  }
  catch (error) {
    refuseUnlessAt(await readSettlement(db, shipmentId), change.revision)
    throw error
  }
}

/** A commit with this fails as a whole where a condition does not hold: the shipment's state would be none, which its column refuses. */
export function holds(shipmentId: string, condition: Guard, guard: Guard): InStatement {
  return {
    sql: `UPDATE shipments SET state = CASE WHEN ${condition.sql} THEN state END WHERE id = ? AND ${guard.sql}`,
    args: [...condition.args, shipmentId, ...guard.args],
  }
}

/** Errors: 409 where a settlement is closed, or is not the one that was looked at. */
export function refuseUnlessAt({ shipment, figuresRevision }: ReadSettlement, seen: number): void {
  if (!STATES.includes(shipment.state)) throw problem(409, 'This settlement does not change any more', `Shipment ${shipment.number} is ${shipment.state}.`)
  if (figuresRevision > seen) throw changedMeanwhile()
}

function changedMeanwhile() {
  return problem(409, 'The figures changed meanwhile', 'Somebody else entered figures. Look at them, then enter yours again.', undefined, { type: 'figures-changed' })
}

function refuseStrange({ shipment, lines }: ReadSettlement, change: FigureChange): void {
  const known = new Map(lines.map(line => [line.cylinderId, line]))
  const strange = [...change.lines.keys()].flatMap((id, index) => known.has(id) ? [] : [{ path: `lines.${index}.cylinderId`, message: 'does not stand on it' }])
  if (strange.length > 0) throw problem(422, 'It names what is not on the shipment', 'Choose among its lines.', strange)
  if (shipment.state !== 'settled') return
  const turned = [...change.lines].flatMap(([id, { outcome }], index) => outcome === known.get(id)!.figures.outcome ? [] : [{ path: `lines.${index}.outcome`, message: 'is settled' }])
  if (turned.length > 0) throw problem(409, 'What became of it is in the log', 'The shipment is settled: correct the cylinder’s own entry where it was taken over or not.', turned)
}

function withFigures(before: ReadSettlement, { lines, statement }: FigureChange): ReadSettlement {
  return {
    ...before,
    lines: before.lines.map(line => ({ ...line, figures: lines.get(line.cylinderId) ?? line.figures })),
    statement: statement ?? before.statement,
  }
}

function changesBetween(before: ReadSettlement, after: ReadSettlement) {
  return before.lines.flatMap(({ cylinderId, figures }, index) => changesOfLine(figures, after.lines[index]!.figures).map(change => ({ cylinderId, ...change })))
}

/** Corrections of what the log has of lines whose figures are others now. */
async function correctionsOf(db: Database, { shipment, lines }: ReadSettlement, change: FigureChange, now: number): Promise<object[]> {
  const [logged, rows] = await Promise.all([reclaimedEvents(db, shipment.id), cylinderRows(db, [...change.lines.keys()], now)])
  return [...change.lines].flatMap(([cylinderId, figures]) => {
    const event = logged.get(cylinderId)
    if (!event) return []
    const dock = lines.find(line => line.cylinderId === cylinderId)!.dock
    const instead = reclaimedDetails(shipment.id, figures, dock)
    if (isSame(instead, event.details)) return []
    return [{
      id: uuid(), cylinderId, kind: 'corrected', occurredAt: change.act.occurredAt, expects: rows.get(cylinderId)!.version,
      details: { eventId: event.id, reason: `The settlement of shipment ${shipment.number} was changed.`, instead },
    }]
  })
}

function isSame(a: object, b: object): boolean {
  const sorted = (value: object) => JSON.stringify(value, (_, part: unknown) => typeof part === 'object' && part !== null
    ? Object.fromEntries(Object.entries(part).sort(([left], [right]) => left.localeCompare(right)))
    : part)
  return sorted(a) === sorted(b)
}
