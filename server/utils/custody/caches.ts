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
import { changeStatements, putCylinders, type CacheChange, type Columns } from './cacheChanges'
import { cylinderStates } from './cylinderViews'
import { foldContext, rowContext, type RuledRowContext } from './foldContext'
import type { Group } from './group'
import type { LogRow } from './logRow'
import type { Guard } from './posting'
import { saidByOthers } from './saidByOthers'

const NO_GUARD: Guard = { sql: '1', args: [] }

/** A cylinder that a group of events touched, as its log makes it now. */
interface Touched { cylinderId: string, added: readonly LogRow[], folded: FoldResult }

/** A cylinder as it stands, and what other cylinders' logs say of it. */
export interface Standing { state: CylinderState, said: SaidByOthers }

/** What the caches must hold after a group of events, and its cylinders as they then stand. */
export interface GroupCaches { statements: InStatement[], standing: ReadonlyMap<string, Standing> }

/**
 * What the caches must hold after a group of events. Every statement stands under the condition that the last line of
 * the group was written, and so all of them: the loser of a race changes no cache.
 */
export async function groupCaches(db: Database, group: Group): Promise<GroupCaches> {
  const context = foldContext(group.directory)
  const touched = group.touched().map(({ cylinderId, events, added }): Touched => ({ cylinderId, added, folded: fold(events, context) }))
  const halvesNow = new Map(touched.map(({ cylinderId, folded }) => [cylinderId, folded.state.halves]))
  const standing = new Map<string, Standing>()
  const changes = touched.map(({ cylinderId, added, folded }): CacheChange => {
    const { own, naming } = group.halvesBefore(cylinderId)
    const said = { codesOnTwo: group.codesOnTwo(cylinderId), otherHalves: withThoseOf(halvesNow, naming, cylinderId) }
    standing.set(cylinderId, { state: folded.state, said })
    const row = cylinderColumns(cylinderId, folded.state, rowContext(group.directory, added.at(-1)!.recorded_at, said))
    const lines = [books(cylinderId, folded, added), claims(cylinderId, folded, added), ...(areSame(own, folded.state.halves) ? [] : [halfLines(cylinderId, folded)])]
    return changeOf(cylinderId, row, lines, group.rowBefore(cylinderId))
  })
  const guard = wereWritten(touched.flatMap(({ added }) => added))
  return { statements: [...changeStatements(changes, guard), ...await otherRows(db, group, touched, halvesNow, guard)], standing }
}

/** The rows of cylinders outside the group that a changed half names, or named before: what it says shows on both. */
async function otherRows(db: Database, group: Group, touched: readonly Touched[], halvesNow: ReadonlyMap<string, Half[]>, guard: Guard): Promise<InStatement[]> {
  const changed = touched.filter(({ cylinderId, folded }) => !areSame(group.halvesBefore(cylinderId).own, folded.state.halves))
  const named = changed.flatMap(({ cylinderId, folded }) => [...group.halvesBefore(cylinderId).own, ...folded.state.halves].map(({ otherId }) => otherId))
  const ids = [...new Set(named)].filter(id => !halvesNow.has(id))
  if (ids.length === 0) return []
  const { added } = changed.at(-1)!
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

/** The condition that every line of a group is in the log: each is written only after the one before it, so the last stands for all. */
export function wereWritten(rows: readonly LogRow[]): Guard {
  const last = rows.reduce((one, other) => other.seq > one.seq ? other : one)
  return {
    sql: 'EXISTS (SELECT 1 FROM custody_events WHERE id = ? AND cylinder_id = ? AND version = ? AND hash = ?)',
    args: [last.id, last.cylinder_id, last.version, last.hash],
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
  const row = cylinderColumns(cylinderId, folded.state, rowContext(from, nowMs, said))
  return changeStatements([changeOf(cylinderId, row, [books(cylinderId, folded, null), claims(cylinderId, folded, null), halfLines(cylinderId, folded)])], guard)
}

/** What the fleet of a past instant holds of one cylinder: its row, its labels and its halves; no books. */
export function pastCache(cylinderId: string, folded: FoldResult, from: Directory, atMs: number): InStatement[] {
  const row = cylinderColumns(cylinderId, folded.state, rowContext(from, atMs))
  return changeStatements([changeOf(cylinderId, row, [claims(cylinderId, folded, null), halfLines(cylinderId, folded)])], NO_GUARD)
}

/**
 * The row of a cylinder from its cached state, where something outside its events has changed. A row that another
 * process has meanwhile made of a later event stays.
 */
export function refreshedRow(cylinderId: string, state: CylinderState, context: RuledRowContext, guard: Guard = NO_GUARD): InStatement {
  return putCylinders([{ row: cylinderColumns(cylinderId, state, context), before: null }], {
    sql: `EXISTS (SELECT 1 FROM cylinders WHERE id = ? AND version = ?) AND ${guard.sql}`,
    args: [cylinderId, state.version, ...guard.args],
  })[0]!
}

/** The row of a cylinder by column. */
export function cylinderColumns(cylinderId: string, state: CylinderState, context: RuledRowContext): Columns {
  return { id: cylinderId, ...snakeCase(cacheRow(state, context)), state: JSON.stringify(state), ruled_by: context.ruledBy }
}

/** What one part of a cylinder's caches loses and gets. */
type Lines = Pick<CacheChange, 'cleared' | 'added'>

function changeOf(cylinderId: string, row: Columns, lines: readonly Lines[], before: Columns | null = null): CacheChange {
  return { cylinderId, row, before, cleared: lines.flatMap(({ cleared }) => cleared), added: Object.assign({}, ...lines.map(({ added }) => added)) as Lines['added'] }
}

/**
 * The books: movements, and changes of stock. Only the new events' where these came last in effect; all of the
 * cylinder's where they changed what came after.
 */
function books(cylinderId: string, folded: FoldResult, added: readonly LogRow[] | null): Lines {
  const areLast = added !== null && cameLast(folded, added)
  const ids = areLast ? new Set(added.map(row => row.id)) : null
  return {
    cleared: areLast ? [] : ['movements', 'stock_changes'],
    added: {
      movements: folded.movements.filter(one => ids?.has(one.eventId) ?? true).map(one => movementLine(cylinderId, one)),
      stock_changes: folded.stockChanges.filter(one => ids?.has(one.eventId) ?? true).map(one => stockLine(cylinderId, one)),
    },
  }
}

/** Kinds that change what other events put into the books: what they say, where they stand, or that they count. */
const CHANGES_EARLIER: readonly string[] = ['corrected', 'registered', 'countersigned']

function cameLast(folded: FoldResult, added: readonly LogRow[]): boolean {
  if (added.some(row => CHANGES_EARLIER.includes(row.kind))) return false
  const ids = new Set(added.map(row => row.id))
  return folded.steps.slice(-added.length).every(step => ids.has(step.eventId))
}

function movementLine(cylinderId: string, one: Movement): Columns {
  return {
    cylinder_id: cylinderId, event_id: one.eventId, ordinal: one.ordinal, cause: one.cause, refrigerant: one.refrigerant, owner_id: one.ownerId,
    grams: one.grams, at: one.at, apart: Number(one.apart),
  }
}

function stockLine(cylinderId: string, one: StockChange): Columns {
  return {
    cylinder_id: cylinderId, event_id: one.eventId, ordinal: one.ordinal, refrigerant: one.refrigerant, owner_id: one.ownerId, grams: one.grams,
    not_known: one.notKnown, weighed_variance: one.weighedVariance, found_variance: one.foundVariance,
    weighed_together: one.weighedTogether, found_together: one.foundTogether, at: one.at, apart: Number(one.apart),
  }
}

/** The codes that the cylinder's `labelled` events claim, where a new event can have changed them. */
function claims(cylinderId: string, { labelClaims }: FoldResult, added: readonly LogRow[] | null): Lines {
  if (added && !added.some(row => row.kind === 'labelled' || row.kind === 'corrected')) return { cleared: [], added: {} }
  return {
    cleared: ['label_claims'],
    added: {
      label_claims: labelClaims.map(claim => ({
        event_id: claim.eventId, code: claim.code, cylinder_id: cylinderId, effective_at: claim.effectiveAt, device_id: claim.deviceId, device_seq: claim.deviceSeq,
      })),
    },
  }
}

function halfLines(cylinderId: string, { state }: FoldResult): Lines {
  return {
    cleared: ['halves'],
    added: { halves: state.halves.map((half, position) => ({ event_id: half.eventId, cylinder_id: cylinderId, other_id: half.otherId, position, half: JSON.stringify(half) })) },
  }
}

const COLUMN_NAMES = new Map<string, string>()

/** The name of a column in the database. */
function columnName(key: string): string {
  const known = COLUMN_NAMES.get(key)
  if (known !== undefined) return known
  const name = key.replace(/[A-Z]/g, letter => `_${letter.toLowerCase()}`)
  COLUMN_NAMES.set(key, name)
  return name
}

function snakeCase(columns: object): Columns {
  return Object.fromEntries(Object.entries(columns).map(([key, value]) => [columnName(key), typeof value === 'boolean' ? Number(value) : value as InValue]))
}
