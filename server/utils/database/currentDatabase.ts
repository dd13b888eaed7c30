import type { Database } from './database'

let current: Database | null = null

/** The database that this process serves; set once at start. */
export function useDatabase(): Database {
  if (!current) throw new Error('The database is not open yet')
  return current
}

/** Called by the start-up plugin, and by nothing else. */
export function setDatabase(database: Database): void {
  current = database
}
