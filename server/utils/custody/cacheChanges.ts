import type { InStatement, InValue } from '@libsql/client'
import type { Guard } from './posting'

/** The caches that hold lines for what events did, each with its `cylinder_id`. */
export type LineCache = 'movements' | 'stock_changes' | 'label_claims' | 'halves'

/** A row by column. */
export type Columns = Record<string, InValue>

/** What the caches must come to hold of a cylinder. */
export interface CacheChange {
  cylinderId: string
  row: Columns
  /** The row as it stands before, where that was read; null where it was not, or there is none. */
  before: Columns | null
  /** Out of which everything of the cylinder goes first. */
  cleared: readonly LineCache[]
  added: Partial<Record<LineCache, readonly Columns[]>>
}

/** Many to a statement, for the driver prepares each anew; few enough for the arguments that one may have. */
const ROWS_A_STATEMENT = 200

/**
 * What makes the caches hold it, for any number of cylinders at once: what goes before what comes, and a statement for
 * each table and not for each row. All of it under one condition.
 */
export function changeStatements(changes: readonly CacheChange[], guard: Guard): InStatement[] {
  return [
    ...LINE_CACHES.flatMap(table => clear(table, changes.filter(({ cleared }) => cleared.includes(table)), guard)),
    ...putCylinders(changes, guard),
    ...LINE_CACHES.flatMap(table => insertRows(table, changes.flatMap(({ added }) => added[table] ?? []), guard)),
  ]
}

/**
 * The rows of cylinders. The database makes an entry anew in every index of a column that is set, whether its value
 * changes or not: so where the rows before are known, only columns in which one of them changes are set.
 *
 * What the row rests on is always among them: where another process makes it anew by other rules meanwhile, it says so.
 */
function putCylinders(changes: readonly Pick<CacheChange, 'row' | 'before'>[], guard: Guard): InStatement[] {
  const names = Object.keys(changes[0]?.row ?? {}).filter(name => name !== 'id')
  const set = names.filter(name => ALWAYS_SET.includes(name) || changes.some(({ row, before }) => before === null || before[name] !== row[name]))
  return insertRows('cylinders', changes.map(({ row }) => row), guard, `ON CONFLICT (id) DO UPDATE SET ${set.map(name => `${name} = excluded.${name}`).join(', ')}`)
}

const ALWAYS_SET: readonly string[] = ['version', 'state', 'ruled_by']

const LINE_CACHES: readonly LineCache[] = ['movements', 'stock_changes', 'label_claims', 'halves']

function clear(table: LineCache, changes: readonly CacheChange[], guard: Guard): InStatement[] {
  if (changes.length === 0) return []
  return [{
    sql: `DELETE FROM ${table} WHERE cylinder_id IN (${changes.map(() => '?').join(', ')}) AND ${guard.sql}`,
    args: [...changes.map(({ cylinderId }) => cylinderId), ...guard.args],
  }]
}

/** Puts rows of the same columns into a table, under a condition. */
function insertRows(table: string, rows: readonly Columns[], guard: Guard, onConflict = ''): InStatement[] {
  if (rows.length === 0) return []
  const names = Object.keys(rows[0]!)
  const one = `(${names.map(() => '?').join(', ')})`
  return Array.from({ length: Math.ceil(rows.length / ROWS_A_STATEMENT) }, (_, part) => {
    const some = rows.slice(part * ROWS_A_STATEMENT, (part + 1) * ROWS_A_STATEMENT)
    return {
      sql: `INSERT INTO ${table} (${names.join(', ')}) SELECT * FROM (VALUES ${some.map(() => one).join(', ')}) WHERE ${guard.sql} ${onConflict}`,
      args: [...some.flatMap(row => names.map(name => row[name]!)), ...guard.args],
    }
  })
}
