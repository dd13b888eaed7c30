import type { InStatement } from '@libsql/client'
import { and, eq, inArray, sql } from 'drizzle-orm'
import { people, sessions } from '../../../drizzle/schema'
import { useDatabase } from '../database/currentDatabase'
import { statement, type Database } from '../database/database'
import { SEEN_INTERVAL, sessionStands } from './lifetime'
import { rolesOf, userOf } from './person'
import { newSecret, secretHash } from './secret'
import type { User } from '../../../utils/contract/session'

/**
 * A new session of a person: the secret for the cookie, and the statement that stores its hash and answers a row. It does
 * so only while the person is active and has this password: a check takes long enough for either to change meanwhile.
 */
export function newSession(personId: string, passwordHash: string, now: number): { sid: string, store: InStatement } {
  const sid = newSecret()
  return {
    sid,
    store: {
      sql: `insert into sessions (secret_hash, person_id, created_at, last_seen_at)
        select ?, id, ?, ? from people where id = ? and active = 1 and password_hash = ? returning person_id`,
      args: [secretHash(sid), now, now, personId, passwordHash],
    },
  }
}

/** The statement that ends every session of a person who now has this password. */
export function endSessionsOf(personId: string, passwordHash: string): InStatement {
  const { read } = useDatabase()
  const changed = read.select({ id: people.id }).from(people).where(and(eq(people.id, personId), eq(people.passwordHash, passwordHash)))
  return statement(read.delete(sessions).where(inArray(sessions.personId, changed)))
}

/** The statement that ends one session. */
export function endSession(sid: string): InStatement {
  return statement(useDatabase().read.delete(sessions).where(eq(sessions.secretHash, secretHash(sid))))
}

/** Who is signed in with a secret, or null: unknown, ended, too old, or the person is turned off. */
export async function personOfSession(sid: string, now: number): Promise<User | null> {
  const [row] = await lookUp(useDatabase()).execute({ secretHash: secretHash(sid) })
  if (!row?.person.active) return null
  if (!sessionStands(row.session, rolesOf(row.person), now)) return null
  if (now - row.session.lastSeenAt >= SEEN_INTERVAL) markSeen(row.session.secretHash, now)
  return userOf(row.person)
}

// Every request asks this, and to put the question together would cost more than its answer.
const lookUps = new WeakMap<Database, ReturnType<typeof preparedLookUp>>()

function lookUp(db: Database): ReturnType<typeof preparedLookUp> {
  const prepared = lookUps.get(db) ?? preparedLookUp(db)
  lookUps.set(db, prepared)
  return prepared
}

function preparedLookUp({ read }: Database) {
  return read.select({ session: sessions, person: people }).from(sessions)
    .innerJoin(people, eq(people.id, sessions.personId))
    .where(eq(sessions.secretHash, sql.placeholder('secretHash'))).limit(1).prepare()
}

/** Not waited for: reading goes on where the disk is full. */
function markSeen(hash: string, now: number): void {
  const { read, write } = useDatabase()
  write([statement(read.update(sessions).set({ lastSeenAt: now }).where(eq(sessions.secretHash, hash)))])
    .catch(error => console.error('A session could not be marked as seen:', error))
}
