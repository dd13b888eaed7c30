import { and, eq, exists } from 'drizzle-orm'
import { v7 as uuid } from 'uuid'
import type { z } from 'zod'
import { oneTimeLinks, people } from '../../../drizzle/schema'
import type { Access } from '../../../utils/access/roles'
import { invitationPath, type Invitation, type InvitedAnswer, type inviteBody } from '../../../utils/contract/people'
import type { User } from '../../../utils/contract/session'
import { useDatabase } from '../database/currentDatabase'
import { statement } from '../database/database'
import { directory } from '../directory/directory'
import { useEnvironment } from '../environment'
import { ownFirm } from '../firm'
import { problem } from '../http/problem'
import { invitationLetter, newPasswordLetter } from '../mail/letters'
import { sendMail } from '../mail/mail'
import { securityEntry } from '../securityLog'
import { hashNewPassword } from '../session/password'
import { refuseWeakPassword } from '../session/passwordRules'
import { userOf } from '../session/person'
import { endSessionsOf, newSession } from '../session/sessions'
import { goodLink, INVITATION_DAYS, linkUnknown, newLink, stillGood, useUpLink } from './oneTimeLinks'
import { personById } from './people'
import { refuseMisfit } from './personFaults'
import { personLine } from './personLine'
import { giveVan } from './personVan'

/**
 * Makes a person and invites them by mail.
 *
 * Errors: 409 when the address is taken; 422 for what does not fit together.
 */
export async function invite(body: z.output<typeof inviteBody>, by: Access, now: number): Promise<InvitedAnswer> {
  const db = useDatabase()
  const { read, write } = db
  const id = uuid()
  const row = {
    id, name: body.name, email: body.email, roles: body.roles, trainee: body.trainee,
    certification: body.certification ?? null, certificationType: body.certificationType ?? null, certificationNumber: body.certificationNumber ?? null,
    supervisorId: body.supervisorId ?? null, units: body.units ?? (await ownFirm()).units, createdAt: now,
  }
  refuseMisfit(await directory(db, true), row, body)
  const [inserted] = await write([
    statement(read.insert(people).values(row).onConflictDoNothing().returning({ id: people.id })),
    ...(body.vanId ? giveVan(db, id, body.vanId, read.select({ id: people.id }).from(people).where(eq(people.id, id))) : []),
  ])
  if (inserted?.rows.length === 0) {
    throw problem(409, 'The address is taken', 'Somebody has that address already.', [{ path: 'email', message: 'is taken' }], { type: 'email-taken' })
  }
  return sendInvitation(id, by, now)
}

/**
 * Sends a person a new link to choose a password; the links before it end.
 *
 * Errors: 404; 409 for one who is turned off.
 */
export async function sendInvitation(personId: string, by: Access, now: number): Promise<InvitedAnswer> {
  const person = await personById(personId)
  if (!person.active) throw problem(409, 'Turned off', 'This person is turned off. Turn them on first.', undefined, { type: 'turned-off' })
  const { token, store } = newLink('invitation', personId, now)
  await useDatabase().write([...store, securityEntry({ what: 'invited', personId: by.personId, subject: personId }, now)])
  const letter = person.passwordHash === null ? invitationLetter : newPasswordLetter
  const outcome = await sendMail(letter({
    recipient: person.email,
    name: person.name,
    firmName: (await ownFirm()).name,
    link: useEnvironment().publicUrl + invitationPath(token),
    days: INVITATION_DAYS,
  }), now)
  return { person: personLine(person, await directory(useDatabase(), true), true), mail: outcome }
}

/** Whose invitation a token is. Errors: 404. */
export async function invitationOf(token: string, now: number): Promise<Invitation> {
  const { person, expiresAt } = await invited(token, now)
  return { name: person.name, email: person.email, firmName: (await ownFirm()).name, expiresAt: new Date(expiresAt).toISOString() }
}

/**
 * Takes an invitation up: stores the password, ends whatever sessions there were and signs in.
 *
 * Errors: 404; 422 for a weak password.
 */
export async function takeUpInvitation(token: string, password: string, now: number): Promise<{ user: User, sid: string }> {
  const { person } = await invited(token, now)
  refuseWeakPassword(password, person.email, 'password')
  const passwordHash = await hashNewPassword(password)
  const { read, write } = useDatabase()
  const good = read.select({ hash: oneTimeLinks.tokenHash }).from(oneTimeLinks).where(stillGood('invitation', token, now))
  const { sid, store } = newSession(person.id, passwordHash, now)
  const [, used] = await write([
    // Before the link is used up, and only where it can be: of two at once one sets the password.
    statement(read.update(people).set({ passwordHash }).where(and(eq(people.id, person.id), eq(people.active, true), exists(good)))),
    useUpLink('invitation', token, now),
    endSessionsOf(person.id, passwordHash),
    store,
  ])
  if (used?.rows.length === 0) throw linkUnknown()
  await write([securityEntry({ what: 'invitation-taken-up', personId: person.id }, now)])
  return { user: userOf(person), sid }
}

async function invited(token: string, now: number) {
  const link = await goodLink('invitation', token, now)
  const person = link.personId ? await personById(link.personId) : null
  if (!person?.active) throw linkUnknown()
  return { person, expiresAt: link.expiresAt }
}
