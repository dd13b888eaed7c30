import { existsSync } from 'node:fs'
import { dirname, resolve } from 'node:path'
import { bringCachesToShape } from '../custody/cacheShape'
import type { Environment } from '../environment'
import { setDatabase } from './currentDatabase'
import { openDatabase, type Database } from './database'
import { holdDatabaseFile } from './singleServer'

let started: Promise<Database> | null = null

/** Opens the database, makes sure that this process alone serves it, and brings its tables and caches up to date; once a process. */
export function startDatabase(environment: Environment): Promise<Database> {
  started ??= start(environment)
  return started
}

async function start(environment: Environment): Promise<Database> {
  const database = await openDatabase(environment.databaseUrl, environment.databaseAuthToken)
  if (database.file) await holdDatabaseFile(database.file)
  await database.migrate(migrationsFolder())
  await bringCachesToShape(database)
  setDatabase(database)
  return database
}

/** Beside the built server, else that of the project. */
function migrationsFolder(): string {
  const built = resolve(dirname(process.argv[1] ?? '.'), 'drizzle/migrations')
  return existsSync(built) ? built : resolve('drizzle/migrations')
}
