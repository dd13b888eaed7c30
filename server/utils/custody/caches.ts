import type { InStatement, InValue } from '@libsql/client'
import { continueFold } from '../../../utils/custody/continueFold'
import type { AnyRecordedEvent } from '../../../utils/custody/event'
import { fold, type FoldResult } from '../../../utils/custody/fold'
import type { Half } from '../../../utils/custody/half'
import { cacheRow } from '../../../utils/custody/row'
import type { SaidByOthers } from '../../../utils/custody/saidByOthers'
import type { CylinderState } from '../../../utils/custody/state'
import type { Database } from '../database/database'
import type { Directory } from '../directory/directory'
import { changeStatements, type CacheChange, type Columns } from './cacheChanges'
import { books, claims, halfLines, type Lines } from './cacheLines'
import { cylinderStates } from './cylinderViews'
import { foldContext, rowContext, type RuledRowContext } from './foldContext'
import type { Group } from './group'
import { logsOf } from './logPages'
import type { LogRow } from './logRow'
import type { Guard } from './posting'
import { saidByOthers } from './saidByOthers'

const NO_GUARD: Guard = { sql: '1', args: [] }

/** A cylinder that a group of events touched, as its log makes it now. */
interface Touched {
  cylinderId: string
  added: readonly LogRow[]
  folded: FoldResult
  /** Only what the new events did was folded: all before them stays as it is. */
  isContinued: boolean
}

/** A cylinder as it stands, and what other cylinders' logs say of it. */
export interface Standing { state: CylinderState, said: SaidByOthers }

/** What the caches must hold after a group of events, and its cylinders as they then stand. */
export interface GroupCaches { statements: InStatement[], standing: ReadonlyMap<string, Standing> }

/**
 * What the caches must hold after a group of events. Every statement stands under the condition that the last line of
 * the group was written, and so all of them: the loser of a race changes no cache.
 */
export async function groupCaches(db: Database, group: Group): Promise<GroupCaches> {
  const touched = await foldTouched(db, group)
  const halvesNow = new Map(touched.map(({ cylinderId, folded }) => [cylinderId, folded.state.halves]))
  const standing = new Map<string, Standing>()
  const changes = touched.map((one): CacheChange => {
    const { cylinderId, added, folded } = one
    const { own, naming } = group.halvesBefore(cylinderId)
    const said = { codesOnTwo: group.codesOnTwo(cylinderId), otherHalves: withThoseOf(halvesNow, naming, cylinderId) }
    standing.set(cylinderId, { state: folded.state, said })
    const row = cylinderColumns(cylinderId, folded.state, rowContext(group.directory, added.at(-1)!.recorded_at, said))
    const lines = [books(cylinderId, folded, one.isContinued), ...claimsAfter(one), ...(areSame(own, folded.state.halves) ? [] : [halfLines(cylinderId, folded)])]
    return changeOf(cylinderId, row, lines, group.keptOf(cylinderId).row)
  })
  const guard = wereWritten(touched.flatMap(({ added }) => added))
  return { statements: [...changeStatements(changes, guard), ...await otherRows(db, group, touched, halvesNow, guard)], standing }
}

/** Goes on from what is kept of each cylinder; where that does not tell, reads its log and begins anew. */
async function foldTouched(db: Database, group: Group): Promise<Touched[]> {
  const context = foldContext(group.directory)
  const touched = group.touched().map(({ cylinderId, added }) => {
    const { head, state } = group.keptOf(cylinderId)
    const events = added.map(({ event }) => event)
    return { cylinderId, hasLog: head.version > 0, events, added: added.map(({ row }) => row), continued: state && continueFold(state, events, context) }
  })
  const logs = await logsOf(db, touched.filter(({ hasLog, continued }) => hasLog && !continued).map(({ cylinderId }) => cylinderId))
  return touched.map(({ cylinderId, added, events, continued }) => ({
    cylinderId, added, isContinued: continued !== null, folded: continued ?? fold([...logs.get(cylinderId) ?? [], ...events], context),
  }))
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
  return changeStatements([changeOf(cylinderId, row, [books(cylinderId, folded), claims(cylinderId, folded), halfLines(cylinderId, folded)])], guard)
}

/** What the fleet of a past instant holds of one cylinder: its row, its labels and its halves; no books. */
export function pastCache(cylinderId: string, folded: FoldResult, from: Directory, atMs: number): InStatement[] {
  const row = cylinderColumns(cylinderId, folded.state, rowContext(from, atMs))
  return changeStatements([changeOf(cylinderId, row, [claims(cylinderId, folded), halfLines(cylinderId, folded)])], NO_GUARD)
}

/**
 * The row of a cylinder from its cached state, where something outside its events has changed. A row that another
 * process has meanwhile made of a later event stays, and so does the state itself.
 */
export function refreshedRow(cylinderId: string, state: CylinderState, context: RuledRowContext, guard: Guard = NO_GUARD): InStatement {
  const columns = Object.entries(cylinderColumns(cylinderId, state, context)).filter(([name]) => !['id', 'version', 'state'].includes(name))
  return {
    sql: `UPDATE cylinders SET ${columns.map(([name]) => `${name} = ?`).join(', ')} WHERE id = ? AND version = ? AND ${guard.sql}`,
    args: [...columns.map(([, value]) => value), cylinderId, state.version, ...guard.args],
  }
}

/** The row of a cylinder by column. */
export function cylinderColumns(cylinderId: string, state: CylinderState, context: RuledRowContext): Columns {
  return { id: cylinderId, ...snakeCase(cacheRow(state, context)), state: JSON.stringify(state), ruled_by: context.ruledBy }
}

function changeOf(cylinderId: string, row: Columns, lines: readonly Lines[], before: Columns | null = null): CacheChange {
  return { cylinderId, row, before, cleared: lines.flatMap(({ cleared }) => cleared), added: Object.assign({}, ...lines.map(({ added }) => added)) as Lines['added'] }
}

/** The codes, where a new event can have changed them. */
function claimsAfter({ cylinderId, added, folded, isContinued }: Touched): Lines[] {
  return added.some(row => row.kind === 'labelled' || row.kind === 'corrected') ? [claims(cylinderId, folded, isContinued)] : []
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
