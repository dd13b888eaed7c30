// The rows that recording has written, as plain statements that write the same.

/** The caches beside the cylinders' rows, each with a line for what an event did. */
const BY_EVENT = ['movements', 'stock_changes', 'label_claims', 'halves']

/** What stands in the log after a number, and what its events have put into the caches: one statement to a row. */
export async function rowsWritten(db, logColumns, since) {
  const [log, cylinders, ...caches] = await db.readClient.batch([
    { sql: `SELECT ${logColumns.join(', ')} FROM custody_events WHERE seq > ?`, args: [since] },
    { sql: 'SELECT * FROM cylinders WHERE id IN (SELECT cylinder_id FROM custody_events WHERE seq > ?)', args: [since] },
    ...BY_EVENT.map(table => ({ sql: `SELECT * FROM ${table} WHERE event_id IN (SELECT id FROM custody_events WHERE seq > ?)`, args: [since] })),
  ], 'read')
  return [
    ...inserts('custody_events', log, { without: 'seq' }),
    ...inserts('cylinders', cylinders, { key: 'id' }),
    ...BY_EVENT.flatMap((table, index) => inserts(table, caches[index], {})),
  ]
}

/** @param key a row that is there already is changed in its place. */
function inserts(table, { columns, rows }, { without, key }) {
  const names = columns.filter(name => name !== without)
  const orChange = key ? `ON CONFLICT (${key}) DO UPDATE SET ${names.filter(name => name !== key).map(name => `${name} = excluded.${name}`).join(', ')}` : ''
  const sql = `INSERT INTO ${table} (${names.join(', ')}) VALUES (${names.map(() => '?').join(', ')}) ${orChange}`
  return rows.map(row => ({ sql, args: names.map(name => row[name]) }))
}
