import { and, asc, eq, exists, inArray, sql } from 'drizzle-orm'
import type { z } from 'zod'
import { people, sessions } from '../../../drizzle/schema'
import { can } from '../../../utils/access/permissions'
import type { Access } from '../../../utils/access/roles'
import { supervisorsFor } from '../../../utils/access/supervisors'
import type { PeopleAnswer, PersonLine, personChange } from '../../../utils/contract/people'
import { useDatabase } from '../database/currentDatabase'
import { statement } from '../database/database'
import { directory } from '../directory/directory'
import { problem } from '../http/problem'
import { securityEntry, type SecurityEvent } from '../securityLog'
import { isTrainee, rolesOf } from '../session/person'
import { refuseMisfit } from './personFaults'
import { personLine } from './personLine'
import { giveVan } from './personVan'

type PersonRow = typeof people.$inferSelect
type PersonChange = z.output<typeof personChange>

/** The firm's people by name. */
export async function listPeople(access: Access, active?: boolean): Promise<PeopleAnswer> {
  const db = useDatabase()
  const [rows, from] = await Promise.all([
    db.read.select().from(people).where(active === undefined ? undefined : eq(people.active, active)).orderBy(asc(people.name), asc(people.id)),
    directory(db),
  ])
  return { items: rows.map(row => personLine(row, from, can(access, 'people:read-contact'))) }
}

/**
 * One person as stored.
 *
 * Errors: 404.
 */
export async function personById(id: string): Promise<PersonRow> {
  const [row] = await useDatabase().read.select().from(people).where(eq(people.id, id)).limit(1)
  if (!row) throw problem(404, 'Not known', 'There is no such person.')
  return row
}

/**
 * Changes a person, and the van of theirs. Another role or turning off ends that person's sessions in the same commit;
 * who drives no more has no van, and who may supervise no more is nobody's usual supervisor.
 *
 * Errors: 404; 409 where nobody would be left who can manage people; 422 for what does not fit together.
 */
export async function changePerson(id: string, { vanId, ...told }: PersonChange, by: Access, now: number): Promise<PersonLine> {
  const before = await personById(id)
  const db = useDatabase()
  const { read, write } = db
  refuseMisfit(await directory(db, true), { ...before, ...told, roles: told.roles ?? rolesOf(before) }, { ...told, vanId })
  const change = isTrainee({ ...before, ...told }) ? told : { ...told, trainee: false, supervisorId: null }
  const after = { ...before, ...change, roles: change.roles ?? rolesOf(before) }
  const rights = !sameRoles(rolesOf(before), after.roles) || before.active !== after.active
  const van = drives(before) && !drives(after) ? null : vanId
  const stays = change.active !== false && (change.roles?.includes('admin') ?? true)
  // Only what is given: the rest may have been changed by somebody else meanwhile.
  const update = read.update(people).set(change)
    .where(stays ? eq(people.id, id) : and(eq(people.id, id), anotherAdminThan(id))).returning({ id: people.id })
  // Only where the change took hold: the update before it may have been refused.
  const changed = read.select({ id: people.id }).from(people).where(and(
    eq(people.id, id), change.roles && eq(people.roles, change.roles), change.active === undefined ? undefined : eq(people.active, change.active),
  ))
  const [updated] = await write([
    statement(update),
    ...(rights ? [statement(read.delete(sessions).where(inArray(sessions.personId, changed)))] : []),
    ...(van === undefined ? [] : giveVan(db, id, van, changed)),
    ...(supervisorsFor([after], '').length > 0 ? [] : [statement(read.update(people).set({ supervisorId: null }).where(and(eq(people.supervisorId, id), exists(changed))))]),
  ])
  if (updated?.rows.length === 0) {
    throw problem(409, 'The last administrator', 'Nobody would be left to manage people. Make another person administrator first.', undefined, { type: 'last-admin' })
  }
  await write([securityEntry({ what: happened(before, after), personId: by.personId, subject: id }, now)])
  return personLine(await personById(id), await directory(db, true), true)
}

function drives({ active, roles }: Pick<PersonRow, 'active' | 'roles'>): boolean {
  return active && roles.includes('technician')
}

/** Holds where the person is no admin, or another admin can sign in. */
function anotherAdminThan(id: string) {
  return sql`(not exists (select 1 from people self, json_each(self.roles) role where self.id = ${id} and role.value = 'admin')
    or exists (select 1 from people other, json_each(other.roles) role
      where other.id <> ${id} and other.active = 1 and other.password_hash is not null and role.value = 'admin'))`
}

function happened(before: PersonRow, after: PersonRow): SecurityEvent {
  if (before.active === after.active) return 'person-changed'
  return after.active ? 'person-turned-on' : 'person-turned-off'
}

function sameRoles(left: readonly string[], right: readonly string[]): boolean {
  return left.length === right.length && left.every(role => right.includes(role))
}
