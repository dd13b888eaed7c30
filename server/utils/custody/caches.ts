import type { InStatement, InValue } from '@libsql/client'
import type { AnyRecordedEvent } from '../../../utils/custody/event'
import { fold, type FoldResult } from '../../../utils/custody/fold'
import type { Half } from '../../../utils/custody/half'
import type { Movement } from '../../../utils/custody/movement'
import { cacheRow } from '../../../utils/custody/row'
import type { SaidByOthers } from '../../../utils/custody/saidByOthers'
import type { CylinderState } from '../../../utils/custody/state'
import type { StockChange } from '../../../utils/custody/stockChange'
import type { Database } from '../database/database'
import type { Directory } from '../directory/directory'
import { cylinderStates } from './cylinderViews'
import { foldContext, rowContext, type RuledRowContext } from './foldContext'
import type { Group } from './group'
import type { LogRow } from './logRow'
import type { Guard } from './posting'
import { saidByOthers } from './saidByOthers'

const NO_GUARD: Guard = { sql: '1', args: [] }

/** A cylinder that a group of events touched, as its log makes it now. */
interface Touched { cylinderId: string, added: readonly LogRow[], folded: FoldResult, guard: Guard }

/**
 * What the caches must hold after a group of events. Every statement stands under the condition that the last event of
 * its cylinder was written: the loser of a race changes no cache.
 */
export async function cacheStatements(db: Database, group: Group): Promise<InStatement[]> {
  const touched = group.touched().map(({ cylinderId, events, added }): Touched => ({
    cylinderId, added, folded: fold(events, foldContext(group.directory)), guard: wasWritten(added.at(-1)!),
  }))
  const halvesNow = new Map(touched.map(({ cylinderId, folded }) => [cylinderId, folded.state.halves]))
  const statements = touched.flatMap(({ cylinderId, added, folded, guard }) => {
    const { own, naming } = group.halvesBefore(cylinderId)
    const said = { codesOnTwo: group.codesOnTwo(cylinderId), otherHalves: withThoseOf(halvesNow, naming, cylinderId) }
    const context = rowContext(group.directory, added.at(-1)!.recorded_at, said)
    return [
      upsertCylinder(cylinderId, folded.state, context, guard),
      ...bookStatements(cylinderId, folded, added, guard),
      ...claimStatements(cylinderId, folded, added, guard),
      ...(areSame(own, folded.state.halves) ? [] : halfStatements(cylinderId, folded, guard)),
    ]
  })
  return [...statements, ...await otherRows(db, group, touched, halvesNow)]
}

/** The rows of cylinders outside the group that a changed half names, or named before: what it says shows on both. */
async function otherRows(db: Database, group: Group, touched: readonly Touched[], halvesNow: ReadonlyMap<string, Half[]>): Promise<InStatement[]> {
  const changed = touched.filter(({ cylinderId, folded }) => !areSame(group.halvesBefore(cylinderId).own, folded.state.halves))
  const named = changed.flatMap(({ cylinderId, folded }) => [...group.halvesBefore(cylinderId).own, ...folded.state.halves].map(({ otherId }) => otherId))
  const ids = [...new Set(named)].filter(id => !halvesNow.has(id))
  if (ids.length === 0) return []
  const { guard, added } = changed.at(-1)!
  const [states, said] = await Promise.all([cylinderStates(db, ids), saidByOthers(db, ids)])
  return [...states].map(([id, state]) => {
    const otherHalves = withThoseOf(halvesNow, said(id).otherHalves, id)
    return refreshedRow(id, state, rowContext(group.directory, added.at(-1)!.recorded_at, { ...said(id), otherHalves }), guard)
  })
}

/** The halves that name a cylinder, with those of the touched cylinders as they are now. */
function withThoseOf(halvesNow: ReadonlyMap<string, Half[]>, before: readonly Half[], cylinderId: string): Half[] {
  const now = [...halvesNow.values()].flat().filter(({ otherId }) => otherId === cylinderId)
  return [...before.filter(half => !halvesNow.has(half.cylinderId)), ...now]
}

function areSame(before: readonly Half[], now: readonly Half[]): boolean {
  return JSON.stringify(before) === JSON.stringify(now)
}

function wasWritten(row: LogRow): Guard {
  return {
    sql: 'EXISTS (SELECT 1 FROM custody_events WHERE id = ? AND cylinder_id = ? AND version = ? AND hash = ?)',
    args: [row.id, row.cylinder_id, row.version, row.hash],
  }
}

/** The caches that hold something for each cylinder, and the column that names it. */
export const CYLINDER_CACHES = [
  { table: 'movements', key: 'cylinder_id' }, { table: 'stock_changes', key: 'cylinder_id' }, { table: 'label_claims', key: 'cylinder_id' },
  { table: 'halves', key: 'cylinder_id' }, { table: 'cylinders', key: 'id' },
] as const

/** The caches of one cylinder, made from its whole log: for a rebuild. They stand unless another process has recorded a later event. */
export function rebuiltCache(cylinderId: string, events: readonly AnyRecordedEvent[], from: Directory, nowMs: number, said: SaidByOthers): InStatement[] {
  const folded = fold(events, foldContext(from))
  const guard: Guard = {
    sql: 'NOT EXISTS (SELECT 1 FROM custody_events WHERE cylinder_id = ? AND version > ?)',
    args: [cylinderId, events.at(-1)?.version ?? 0],
  }
  return [
    upsertCylinder(cylinderId, folded.state, rowContext(from, nowMs, said), guard),
    ...bookStatements(cylinderId, folded, null, guard),
    ...claimStatements(cylinderId, folded, null, guard),
    ...halfStatements(cylinderId, folded, guard),
  ]
}

/** What the fleet of a past instant holds of one cylinder: its row, its labels and its halves; no books. */
export function pastCache(cylinderId: string, folded: FoldResult, from: Directory, atMs: number): InStatement[] {
  return [
    upsertCylinder(cylinderId, folded.state, rowContext(from, atMs), NO_GUARD),
    ...claimStatements(cylinderId, folded, null, NO_GUARD),
    ...halfStatements(cylinderId, folded, NO_GUARD),
  ]
}

/**
 * The row of a cylinder from its cached state, where something outside its events has changed. A row that another
 * process has meanwhile made of a later event stays.
 */
export function refreshedRow(cylinderId: string, state: CylinderState, context: RuledRowContext, guard: Guard = NO_GUARD): InStatement {
  return upsertCylinder(cylinderId, state, context, {
    sql: `EXISTS (SELECT 1 FROM cylinders WHERE id = ? AND version = ?) AND ${guard.sql}`,
    args: [cylinderId, state.version, ...guard.args],
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

function halfStatements(cylinderId: string, { state }: FoldResult, guard: Guard): InStatement[] {
  return [
    { sql: `DELETE FROM halves WHERE cylinder_id = ? AND ${guard.sql}`, args: [cylinderId, ...guard.args] },
    ...state.halves.map((half, position) => ({
      sql: `INSERT INTO halves (event_id, cylinder_id, other_id, position, half) SELECT ?, ?, ?, ?, ? WHERE ${guard.sql}`,
      args: [half.eventId, cylinderId, half.otherId, position, JSON.stringify(half), ...guard.args],
    })),
  ]
}

function snakeCase(columns: object): Record<string, InValue> {
  return Object.fromEntries(Object.entries(columns).map(([key, value]) => [
    key.replace(/[A-Z]/g, letter => `_${letter.toLowerCase()}`),
    typeof value === 'boolean' ? Number(value) : value as InValue,
  ]))
}
