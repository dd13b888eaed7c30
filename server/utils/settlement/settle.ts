import type { InStatement } from '@libsql/client'
import type { Access } from '~~/utils/access/roles'
import type { Settling } from '~~/utils/contract/settlement'
import { effectOf, refuseRefused } from '../cylinder-lists/lineCommands'
import { append } from '../custody/append'
import type { Guard } from '../custody/posting'
import type { Database } from '../database/database'
import { problem } from '../http/problem'
import { actStatement, claimedAt, isKept, type NewAct } from '../shipments/acts'
import { disputesOf } from './disputes'
import { disputeStatements } from './disputeStatements'
import { headStatement, isAt, lineStatement } from './figureStatements'
import { figuresIn, readSettlement, SHOWN_ACTS, type ReadLine, type ReadSettlement } from './readSettlement'
import { reclaimedDetails } from './reclaimedEvents'

const STATES = ['dispatched', 'arrived']
const ALWAYS: Guard = { sql: '1', args: [] }

/**
 * Settles a shipment: each line taken over goes into its cylinder's log with the reclaimer's figures, each that did not
 * arrive is recorded as missing where the request names it, and all lines are closed, in one commit. Disputes stay open.
 * The same request sent again changes nothing.
 *
 * Errors: 404; 409 where it is not on its way, is settled already, lacks what became of a line, or was changed since it
 * was looked at, and where a cylinder has changed.
 */
export async function settle(db: Database, shipmentId: string, body: Settling, access: Access, now: number): Promise<void> {
  const act: NewAct = { id: body.id, shipmentId, kind: 'settled', by: { personId: access.personId }, occurredAt: claimedAt(body.occurredAt, now), recordedAt: now }
  if (await isKept(db, act)) return
  const settlement = await readSettlement(db, shipmentId)
  refuseUnsettled(settlement, body)

  const events = eventsOf(settlement, body)
  const disputes = await disputesOf(db, shipmentId)
  const alongside = (guard: Guard): InStatement[] => [
    settledStatement(shipmentId, events.map(event => event.id), act, body.revision, guard),
    actStatement({ ...act, details: { lines: body.lines.length } }, guard),
    ...settlement.lines.map(({ cylinderId, figures }) => lineStatement(shipmentId, cylinderId, figures, guard)),
    headStatement(shipmentId, settlement.statement, guard),
    ...disputeStatements(disputes, figuresIn(settlement), act, guard),
    { sql: `DELETE FROM open_lines WHERE list_id = ? AND ${guard.sql}`, args: [shipmentId, ...guard.args] },
  ]
  try {
    if (events.length === 0) await db.write(alongside(ALWAYS))
    else refuseRefused(await append(db, { events, access, now, deviceNow: body.deviceNow === undefined ? null : Date.parse(body.deviceNow), dispatch: { alongside } }))
  }
  catch (error) {
    // The commit fails where the shipment or its figures changed under us; then that is told, else the error itself.
    if (await isKept(db, act)) return
    refuseUnsettled(await readSettlement(db, shipmentId), body)
    throw error
  }
}

/** Errors: 409 with what stands in the way of settling. */
function refuseUnsettled({ shipment, revision, lines }: ReadSettlement, body: Settling): void {
  if (!STATES.includes(shipment.state)) throw problem(409, 'There is nothing to settle', `Shipment ${shipment.number} is ${shipment.state}.`)
  if (revision !== body.revision) throw problem(409, 'The figures changed meanwhile', 'Somebody else entered figures, or the dock did. Look at them, then settle.', undefined, { type: 'figures-changed' })
  const known = new Map(lines.map(line => [line.cylinderId, line]))
  const open = lines.filter(({ figures }) => figures.outcome === null)
  if (open.length > 0) {
    throw problem(409, 'Not everything is said', 'Say of each line whether it was taken over, sent back, or did not arrive.', open.map(({ cylinderId }) => ({ path: cylinderId, message: 'what became of it is not said' })))
  }
  const named = new Set(body.lines.map(line => line.cylinderId))
  const wrong = [
    ...body.lines.flatMap(({ cylinderId }, index) => mayHaveEvent(known.get(cylinderId)) ? [] : [{ path: `lines.${index}.cylinderId`, message: 'is not taken over with this shipment' }]),
    ...lines.filter(({ cylinderId, figures }) => figures.outcome === 'taken-over' && !named.has(cylinderId)).map(({ cylinderId }) => ({ path: 'lines', message: `${cylinderId} is missing` })),
  ]
  if (wrong.length > 0) throw problem(409, 'The lines have changed', 'Look at the settlement again, then settle.', wrong)
}

function mayHaveEvent(line: ReadLine | undefined): boolean {
  return line?.figures.outcome === 'taken-over' || line?.figures.outcome === 'not-arrived'
}

function eventsOf({ shipment, lines }: ReadSettlement, body: Settling) {
  const known = new Map(lines.map(line => [line.cylinderId, line]))
  return body.lines.map(({ cylinderId, eventId, expects }) => {
    const { figures, dock } = known.get(cylinderId)!
    const event = { id: eventId, cylinderId, occurredAt: body.occurredAt, expects }
    return figures.outcome === 'not-arrived'
      ? { ...event, kind: 'missing', details: { lastSeen: `Left with shipment ${shipment.number}; ${shipment.to.name} did not find it.` } }
      : { ...event, kind: 'reclaimed', details: reclaimedDetails(shipment.id, figures, dock) }
  })
}

/** A shipment that is not on its way any more, or has other figures, gets no state, which its column refuses: all is undone. */
function settledStatement(shipmentId: string, eventIds: string[], act: NewAct, revision: number, guard: Guard): InStatement {
  const asSeen = isAt(shipmentId, STATES, { revision, acts: SHOWN_ACTS })
  const effect = effectOf(eventIds)
  return {
    sql: `UPDATE shipments SET state = CASE WHEN ${asSeen.sql} THEN 'settled' END, arrived_at = coalesce(arrived_at, ?), settled_at = coalesce(${effect.sql}, ?)
      WHERE id = ? AND ${guard.sql}`,
    args: [...asSeen.args, act.occurredAt, ...effect.args, act.occurredAt, shipmentId, ...guard.args],
  }
}
