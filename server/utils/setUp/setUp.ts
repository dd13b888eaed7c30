import { eq, sql } from 'drizzle-orm'
import { v7 as uuid } from 'uuid'
import { firm, people } from '../../../drizzle/schema'
import { setUpPath, type SetUp, type SetUpOpen } from '../../../utils/contract/setUp'
import type { User } from '../../../utils/contract/session'
import { useDatabase } from '../database/currentDatabase'
import { directory } from '../directory/directory'
import { useEnvironment } from '../environment'
import { labelAddress } from '../labels/labelAddress'
import { linkUnknown, goodLink, newLink, useUpLink } from '../people/oneTimeLinks'
import { securityEntry } from '../securityLog'
import { hashNewPassword } from '../session/password'
import { refuseWeakPassword } from '../session/passwordRules'
import { userOf } from '../session/person'
import { secretHash } from '../session/secret'
import { newSession } from '../session/sessions'

/** Whether nothing has been set up: no firm and nobody. */
export async function isEmpty(): Promise<boolean> {
  const { read } = useDatabase()
  const [found] = await read.select({ firms: sql<number>`(select count(*) from ${firm})`, people: sql<number>`(select count(*) from ${people})` }).from(sql`(select 1)`)
  return found?.firms === 0 && found.people === 0
}

/** A link that sets up an empty database; the ones before it end. */
export async function offerSetUp(publicUrl: string, now: number): Promise<string> {
  const { token, store } = newLink('set-up', null, now)
  await useDatabase().write(store)
  return publicUrl + setUpPath(token)
}

/** Whether a set-up link is still good. Errors: 404. */
export async function setUpLink(token: string, now: number): Promise<SetUpOpen> {
  const { expiresAt } = await goodLink('set-up', token, now)
  return { open: true, expiresAt: new Date(expiresAt).toISOString(), labels: labelAddress(useEnvironment().publicUrl) }
}

/**
 * Makes the firm and its first admin, once, and signs that person in.
 *
 * Errors: 404 for a link that is not good; 422 for a weak password.
 */
export async function setUp({ token, firm: own, admin }: SetUp, now: number): Promise<{ user: User, sid: string }> {
  await goodLink('set-up', token, now)
  refuseWeakPassword(admin.password, admin.email, 'admin.password')
  const passwordHash = await hashNewPassword(admin.password)
  const db = useDatabase()
  const { read, write } = db
  const personId = uuid()
  // Both only while the link is good and nothing is there: of two at once one finds the link used up.
  const free = 'where exists (select 1 from one_time_links where token_hash = ? and purpose = \'set-up\' and used_at is null and expires_at > ?)'
  const hash = secretHash(token)
  const results = await write([
    {
      sql: `insert into firm (id, name, telephone, time_zone, units, created_at) select ?, ?, ?, ?, ?, ? ${free} and not exists (select 1 from firm)`,
      args: [uuid(), own.name, own.telephone, own.timeZone, own.units, now, hash, now],
    },
    {
      sql: `insert into people (id, email, name, roles, trainee, units, password_hash, active, created_at) select ?, ?, ?, ?, 0, ?, ?, 1, ? ${free} and not exists (select 1 from people)`,
      args: [personId, admin.email, admin.name, JSON.stringify(['admin']), own.units, passwordHash, now, hash, now],
    },
    useUpLink('set-up', token, now),
  ])
  if (results.at(-1)?.rows.length === 0) throw linkUnknown()
  const [row] = await read.select().from(people).where(eq(people.id, personId)).limit(1)
  if (!row) throw linkUnknown()
  // Whoever asked before, asked a firm without a time zone.
  await directory(db, true)
  const { sid, store } = newSession(personId, passwordHash, now)
  await write([store, securityEntry({ what: 'set-up', personId }, now)])
  return { user: userOf(row), sid }
}
