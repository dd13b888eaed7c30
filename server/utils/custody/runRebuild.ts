import { openDatabase, type Database } from '../database/database'
import { isFileHeld, holdDatabaseFile } from '../database/singleServer'
import { cacheShape, keepShape, storedShape } from './cacheShape'
import { rebuildCaches } from './rebuild'

/**
 * `npm run rebuild`: makes the caches again and says what it did. A server may go on reading and recording meanwhile,
 * where it is of the same version.
 */
export async function runRebuild(url: string, migrations: string): Promise<void> {
  const db = await openDatabase(url, process.env.DATABASE_AUTH_TOKEN)
  const isServed = db.file !== null && await isFileHeld(db.file)
  if (isServed) await insistOnSameShape(db)
  else {
    if (db.file) await holdDatabaseFile(db.file)
    await db.migrate(migrations)
  }
  const done = await rebuildCaches(db, Date.now())
  await keepShape(db, cacheShape())
  console.log(`Rebuilt ${done.cylinders} cylinders from ${done.events} events${isServed ? ', while the server went on' : ''}.`)
  db.close()
}

// The server would not understand what another version wrote under it.
async function insistOnSameShape(db: Database): Promise<void> {
  if (await storedShape(db) !== cacheShape()) throw new Error('The server that runs on this database is of another version. Stop it first; a start of the new one makes the caches again by itself.')
}
