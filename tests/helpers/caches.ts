import type { Database } from '../../server/utils/database/database'

const CACHES = ['cylinders', 'movements', 'stock_changes', 'label_claims', 'halves']

/** Every row of what is kept beside the custody log, to the last byte, in an order that no rebuild changes. */
export async function cacheLines({ readClient }: Database): Promise<string[]> {
  const tables = await Promise.all(CACHES.map(table => readClient.execute(`SELECT * FROM ${table}`)))
  return tables.flatMap(({ rows }, at) => rows.map(row => `${CACHES[at]} ${JSON.stringify(row)}`)).sort()
}
