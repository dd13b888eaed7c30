import { openDatabase } from '../database/database'
import { holdDatabaseFile } from '../database/singleServer'
import { rebuildCaches } from './rebuild'

/** `npm run rebuild`: with the server stopped, makes the caches again and says what it did. */
export async function runRebuild(url: string, migrations: string): Promise<void> {
  const db = await openDatabase(url, process.env.DATABASE_AUTH_TOKEN)
  if (db.file) await holdDatabaseFile(db.file)
  await db.migrate(migrations)
  const done = await rebuildCaches(db, Date.now())
  console.log(`Rebuilt ${done.cylinders} cylinders from ${done.events} events.`)
  db.close()
}
