import { z } from 'zod'
import { CERTIFICATION_TYPES, type Certification } from '../access/certification'
import { ROLES, type Role } from '../access/roles'
import { id, line, printedLine } from './parts'
import { email, newPassword, units, type User } from './session'

const roles = z.array(z.enum(ROLES)).min(1, 'must name at least one role').max(ROLES.length)
  .refine(list => new Set(list).size === list.length, 'must name each role once')

const workingLife = {
  certification: line(80).nullish(),
  certificationType: z.enum(CERTIFICATION_TYPES).nullish(),
  certificationNumber: line(40).nullish(),
  /** Who usually supervises a trainee. */
  supervisorId: id.nullish(),
  /** The van this technician has; whoever had it gives it up. null: none. */
  vanId: id.nullish(),
}

/** POST /api/people: makes a person and mails the invitation. 409 when the address is taken, 422 for what does not fit together. */
export const inviteBody = z.strictObject({
  name: printedLine(80),
  email,
  roles,
  trainee: z.boolean().default(false),
  ...workingLife,
  units: units.optional(),
})

/**
 * PATCH /api/people/{id}. A change of role or turning off ends that person's sessions. 409 for the last active admin, 422 for
 * what does not fit together. Who is no trainee any more has no supervisor.
 */
export const personChange = z.strictObject({
  name: printedLine(80).optional(),
  roles: roles.optional(),
  trainee: z.boolean().optional(),
  ...workingLife,
  active: z.boolean().optional(),
}).refine(change => Object.keys(change).length > 0, 'must change something')

/** The path of /api/people/{id}. */
export const personParams = z.strictObject({ id })

/** One line of GET /api/people. */
export interface PersonLine extends Certification {
  id: string
  name: string
  /** Only for who manages people and for the auditor; else null. */
  email: string | null
  roles: Role[]
  trainee: boolean
  /** Who usually supervises this trainee. */
  supervisor: { id: string, name: string } | null
  /** The vans that this person has, by name. */
  vans: { id: string, name: string }[]
  active: boolean
  /** Has not yet chosen a password. */
  invited: boolean
}

/** GET /api/people?active=true|false. */
export const peopleQuery = z.strictObject({ active: z.enum(['true', 'false']).optional() })
/** What GET /api/people answers. */
export interface PeopleAnswer { items: PersonLine[] }

/** What POST /api/people (201), PATCH /api/people/{id} and POST /api/people/{id}/invitation answer. */
export interface PersonAnswer { person: PersonLine }
/** `mail`: 'sent' through the mail server, 'kept' inside (none is set), 'failed' (kept; send it again). */
export interface InvitedAnswer extends PersonAnswer { mail: MailOutcome }
export type MailOutcome = 'sent' | 'kept' | 'failed'

/** The path of /api/invitations/{token}: GET shows whose it is, POST takes it up and signs in. 404 when used, expired or unknown. */
export const invitationParams = z.strictObject({ token: z.string().regex(/^[\w-]{43}$/) })
export const takeUpBody = z.strictObject({ password: newPassword })
export interface Invitation { name: string, email: string, firmName: string, expiresAt: string }

/** The page that a mailed invitation opens is `/invitation/{token}`. */
export function invitationPath(token: string): string {
  return `/invitation/${token}`
}

export type { User }
