import { setImmediate as nextTurn } from 'node:timers/promises'
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
  const row = await lookUp(useDatabase(), secretHash(sid))
  if (!row?.person.active) return null
  if (!sessionStands(row.session, rolesOf(row.person), now)) return null
  if (now - row.session.lastSeenAt >= SEEN_INTERVAL) markSeen(row.session.secretHash, now)
  return userOf(row.person)
}

/** A session as it is stored, and its person. */
interface SignedIn { session: typeof sessions.$inferSelect, person: typeof people.$inferSelect }

interface Gathering { hashes: Set<string>, found: Promise<Map<string, SignedIn>> }

const gatherings = new WeakMap<Database, Gathering>()

/** A session by its hash. Every request asks this anew: those that come in one turn of the loop share one question. */
async function lookUp(db: Database, hash: string): Promise<SignedIn | null> {
  const gathering = gatherings.get(db) ?? gather(db)
  gathering.hashes.add(hash)
  return (await gathering.found).get(hash) ?? null
}

function gather(db: Database): Gathering {
  const hashes = new Set<string>()
  const found = nextTurn().then(async () => {
    gatherings.delete(db)
    const rows = await lookUps(db).execute({ hashes: JSON.stringify([...hashes]) })
    return new Map(rows.map(row => [row.session.secretHash, row]))
  })
  gatherings.set(db, { hashes, found })
  return { hashes, found }
}

// To put the question together would cost more than its answer.
const prepared = new WeakMap<Database, ReturnType<typeof preparedLookUp>>()

function lookUps(db: Database): ReturnType<typeof preparedLookUp> {
  const known = prepared.get(db) ?? preparedLookUp(db)
  prepared.set(db, known)
  return known
}

function preparedLookUp({ read }: Database) {
  return read.select({ session: sessions, person: people }).from(sessions)
    .innerJoin(people, eq(people.id, sessions.personId))
    .where(sql`${sessions.secretHash} in (select value from json_each(${sql.placeholder('hashes')}))`).prepare()
}

/** Not waited for: reading goes on where the disk is full. */
function markSeen(hash: string, now: number): void {
  const { read, write } = useDatabase()
  write([statement(read.update(sessions).set({ lastSeenAt: now }).where(eq(sessions.secretHash, hash)))])
    .catch(error => console.error('A session could not be marked as seen:', error))
}
