import type { InStatement, InValue } from '@libsql/client'
import type { AnyRecordedEvent } from '../../../utils/custody/event'
import { fold, type FoldResult } from '../../../utils/custody/fold'
import type { Movement } from '../../../utils/custody/movement'
import { cacheRow } from '../../../utils/custody/row'
import type { CylinderState } from '../../../utils/custody/state'
import type { StockChange } from '../../../utils/custody/stockChange'
import type { Directory } from '../directory/directory'
import { foldContext, rowContext, type RuledRowContext } from './foldContext'
import type { Group } from './group'
import type { LogRow } from './logRow'
import type { Guard } from './posting'

const NO_GUARD: Guard = { sql: '1', args: [] }

/**
 * What the caches must hold after a group of events. Every statement stands under the condition that the last event of
 * its cylinder was written: the loser of a race changes no cache.
 */
export function cacheStatements(group: Group): InStatement[] {
  return group.touched().flatMap(({ cylinderId, events, added }) => {
    const last = added.at(-1)!
    const guard: Guard = {
      sql: 'EXISTS (SELECT 1 FROM custody_events WHERE id = ? AND cylinder_id = ? AND version = ? AND hash = ?)',
      args: [last.id, last.cylinder_id, last.version, last.hash],
    }
    const folded = fold(events, foldContext(group.directory))
    const context = rowContext(group.directory, last.recorded_at, group.codesOnTwo(cylinderId))
    return [
      upsertCylinder(cylinderId, folded.state, context, guard),
      ...bookStatements(cylinderId, folded, added, guard),
      ...claimStatements(cylinderId, folded, added, guard),
    ]
  })
}

/** The caches of one cylinder, made from its whole log and under no condition: for a rebuild. */
export function rebuiltCache(cylinderId: string, events: readonly AnyRecordedEvent[], from: Directory, nowMs: number): InStatement[] {
  const folded = fold(events, foldContext(from))
  return [
    upsertCylinder(cylinderId, folded.state, rowContext(from, nowMs), NO_GUARD),
    ...bookStatements(cylinderId, folded, null, NO_GUARD),
    ...claimStatements(cylinderId, folded, null, NO_GUARD),
  ]
}

/**
 * The row of a cylinder from its cached state, where something outside its events has changed. A row that another
 * process has meanwhile made of a later event stays.
 */
export function refreshedRow(cylinderId: string, state: CylinderState, context: RuledRowContext): InStatement {
  return upsertCylinder(cylinderId, state, context, {
    sql: 'EXISTS (SELECT 1 FROM cylinders WHERE id = ? AND version = ?)',
    args: [cylinderId, state.version],
  })
}

/** The row of a cylinder by column. */
export function cylinderColumns(cylinderId: string, state: CylinderState, context: RuledRowContext): Record<string, InValue> {
  return { id: cylinderId, ...snakeCase(cacheRow(state, context)), state: JSON.stringify(state), ruled_by: context.ruledBy }
}

function upsertCylinder(cylinderId: string, state: CylinderState, context: RuledRowContext, guard: Guard): InStatement {
  const columns = cylinderColumns(cylinderId, state, context)
  const names = Object.keys(columns)
  return {
    sql: `INSERT INTO cylinders (${names.join(', ')}) SELECT ${names.map(() => '?').join(', ')} WHERE ${guard.sql}
      ON CONFLICT (id) DO UPDATE SET ${names.filter(name => name !== 'id').map(name => `${name} = excluded.${name}`).join(', ')}`,
    args: [...Object.values(columns), ...guard.args],
  }
}

/**
 * The books: movements, and changes of stock. Only the new events' where these came last in effect; all of the
 * cylinder's where they changed what came after.
 */
function bookStatements(cylinderId: string, folded: FoldResult, added: readonly LogRow[] | null, guard: Guard): InStatement[] {
  if (added && cameLast(folded, added)) {
    const ids = new Set(added.map(row => row.id))
    return [
      ...folded.movements.filter(one => ids.has(one.eventId)).map(one => insertMovement(cylinderId, one, guard)),
      ...folded.stockChanges.filter(one => ids.has(one.eventId)).map(one => insertStockChange(cylinderId, one, guard)),
    ]
  }
  return [
    { sql: `DELETE FROM movements WHERE cylinder_id = ? AND ${guard.sql}`, args: [cylinderId, ...guard.args] },
    { sql: `DELETE FROM stock_changes WHERE cylinder_id = ? AND ${guard.sql}`, args: [cylinderId, ...guard.args] },
    ...folded.movements.map(one => insertMovement(cylinderId, one, guard)),
    ...folded.stockChanges.map(one => insertStockChange(cylinderId, one, guard)),
  ]
}

/** Kinds that change what other events put into the books: what they say, where they stand, or that they count. */
const CHANGES_EARLIER: readonly string[] = ['corrected', 'registered', 'countersigned']

function cameLast(folded: FoldResult, added: readonly LogRow[]): boolean {
  if (added.some(row => CHANGES_EARLIER.includes(row.kind))) return false
  const ids = new Set(added.map(row => row.id))
  return folded.steps.slice(-added.length).every(step => ids.has(step.eventId))
}

function insertMovement(cylinderId: string, one: Movement, guard: Guard): InStatement {
  return {
    sql: `INSERT INTO movements (cylinder_id, event_id, ordinal, cause, refrigerant, owner_id, grams, at, apart) SELECT ?, ?, ?, ?, ?, ?, ?, ?, ? WHERE ${guard.sql}`,
    args: [cylinderId, one.eventId, one.ordinal, one.cause, one.refrigerant, one.ownerId, one.grams, one.at, one.apart ? 1 : 0, ...guard.args],
  }
}

function insertStockChange(cylinderId: string, one: StockChange, guard: Guard): InStatement {
  return {
    sql: `INSERT INTO stock_changes (cylinder_id, event_id, ordinal, refrigerant, owner_id, grams, not_known, weighed_variance, found_variance, at, apart)
      SELECT ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ? WHERE ${guard.sql}`,
    args: [
      cylinderId, one.eventId, one.ordinal, one.refrigerant, one.ownerId, one.grams, one.notKnown, one.weighedVariance, one.foundVariance,
      one.at, one.apart ? 1 : 0, ...guard.args,
    ],
  }
}

/** The codes that the cylinder's `labelled` events claim, where a new event can have changed them. */
function claimStatements(cylinderId: string, { labelClaims }: FoldResult, added: readonly LogRow[] | null, guard: Guard): InStatement[] {
  if (added && !added.some(row => row.kind === 'labelled' || row.kind === 'corrected')) return []
  return [
    { sql: `DELETE FROM label_claims WHERE cylinder_id = ? AND ${guard.sql}`, args: [cylinderId, ...guard.args] },
    ...labelClaims.map(claim => ({
      sql: `INSERT INTO label_claims (event_id, code, cylinder_id, effective_at, device_id, device_seq) SELECT ?, ?, ?, ?, ?, ? WHERE ${guard.sql}`,
      args: [claim.eventId, claim.code, cylinderId, claim.effectiveAt, claim.deviceId, claim.deviceSeq, ...guard.args],
    })),
  ]
}

function snakeCase(columns: object): Record<string, InValue> {
  return Object.fromEntries(Object.entries(columns).map(([key, value]) => [
    key.replace(/[A-Z]/g, letter => `_${letter.toLowerCase()}`),
    typeof value === 'boolean' ? Number(value) : value as InValue,
  ]))
}
