import type { InStatement, Row } from '@libsql/client'
import { getTableColumns } from 'drizzle-orm'
import { cylinders } from '../../../drizzle/schema'
import type { CylinderState } from '../../../utils/custody/state'
import type { Columns } from './cacheChanges'
import type { ChainHead } from './sealedRow'

/** What is kept of a cylinder beside the log, and how far its log goes. */
export interface KeptCylinder {
  /** The last line of its log; version 0 where there is none. */
  head: ChainHead
  /** Its row without the state; null where there is none. */
  row: Columns | null
  /** The state that its whole log has made; null where none is kept. */
  state: CylinderState | null
  /** Whether its log and another cylinder's say something of each other. */
  isSaidOf: boolean
}

const COLUMNS = Object.values(getTableColumns(cylinders)).map(({ name }) => name).filter(name => name !== 'state')

// Few values to a row: the driver takes several times as long over a value to each column.
const KEPT = `SELECT asked.value,
    (SELECT json_array(e.version, e.hash) FROM custody_events e WHERE e.cylinder_id = asked.value ORDER BY e.version DESC LIMIT 1),
    json_object(${COLUMNS.map(name => `'${name}', c.${name}`).join(', ')}), c.state,
    EXISTS (SELECT 1 FROM halves WHERE cylinder_id = asked.value) OR EXISTS (SELECT 1 FROM halves WHERE other_id = asked.value)
      OR EXISTS (SELECT 1 FROM label_claims mine JOIN label_claims other ON other.code = mine.code AND other.cylinder_id <> mine.cylinder_id
        WHERE mine.cylinder_id = asked.value)
  FROM json_each(?) asked LEFT JOIN cylinders c ON c.id = asked.value`

/** Asks for what is kept of cylinders. */
export function keptCylinders(ids: readonly string[]): InStatement {
  return { sql: KEPT, args: [JSON.stringify(ids)] }
}

/** The answer of {@link keptCylinders}, by cylinder. */
export function keptFrom(rows: readonly Row[]): Map<string, KeptCylinder> {
  return new Map(rows.map((row) => {
    const [version, hash] = row[1] === null ? [0, ''] : JSON.parse(row[1] as string) as [number, string]
    return [row[0] as string, {
      head: { version, hash },
      row: row[3] === null ? null : JSON.parse(row[2] as string) as Columns,
      state: stateAt(version, row[3] as string | null),
      isSaidOf: row[4] === 1,
    }]
  }))
}

// A row that is behind the log, or ahead of it, is no longer what the log has made.
function stateAt(version: number, text: string | null): CylinderState | null {
  const state = text === null ? null : JSON.parse(text) as CylinderState
  return state?.version === version && version > 0 ? state : null
}
