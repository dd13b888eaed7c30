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
    ...insertRows('cylinders', changes.map(({ row }) => row), guard, { orReplaceBy: 'id' }),
    ...LINE_CACHES.flatMap(table => insertRows(table, changes.flatMap(({ added }) => added[table] ?? []), guard)),
  ]
}

const LINE_CACHES: readonly LineCache[] = ['movements', 'stock_changes', 'label_claims', 'halves']

function clear(table: LineCache, changes: readonly CacheChange[], guard: Guard): InStatement[] {
  if (changes.length === 0) return []
  return [{
    sql: `DELETE FROM ${table} WHERE cylinder_id IN (${changes.map(() => '?').join(', ')}) AND ${guard.sql}`,
    args: [...changes.map(({ cylinderId }) => cylinderId), ...guard.args],
  }]
}

/**
 * Puts rows of the same columns into a table, under a condition.
 *
 * @param orReplaceBy a key: a row that has it already takes the new values.
 */
export function insertRows(table: string, rows: readonly Columns[], guard: Guard, { orReplaceBy }: { orReplaceBy?: string } = {}): InStatement[] {
  if (rows.length === 0) return []
  const names = Object.keys(rows[0]!)
  const one = `(${names.map(() => '?').join(', ')})`
  const onConflict = orReplaceBy === undefined
    ? ''
    : `ON CONFLICT (${orReplaceBy}) DO UPDATE SET ${names.filter(name => name !== orReplaceBy).map(name => `${name} = excluded.${name}`).join(', ')}`
  return Array.from({ length: Math.ceil(rows.length / ROWS_A_STATEMENT) }, (_, part) => {
    const some = rows.slice(part * ROWS_A_STATEMENT, (part + 1) * ROWS_A_STATEMENT)
    return {
      sql: `INSERT INTO ${table} (${names.join(', ')}) SELECT * FROM (VALUES ${some.map(() => one).join(', ')}) WHERE ${guard.sql} ${onConflict}`,
      args: [...some.flatMap(row => names.map(name => row[name]!)), ...guard.args],
    }
  })
}
