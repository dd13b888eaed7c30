import { z } from 'zod'
import type { Certification } from '../access/certification'
import type { Role } from '../access/roles'
import { PASSWORD_LENGTH } from './passwordLength'

export const UNITS = ['lb', 'lb-oz', 'kg'] as const
/** The units a person or a firm reads weights in. */
export const units = z.enum(UNITS)
export type Units = z.output<typeof units>

/** A password that is being chosen. Common ones and one's own address are refused by the server (422). */
export const newPassword = z.string()
  .refine(value => [...value].length >= PASSWORD_LENGTH.least, `must have at least ${PASSWORD_LENGTH.least} characters`)
  .refine(value => [...value].length <= PASSWORD_LENGTH.most, `must have at most ${PASSWORD_LENGTH.most} characters`)

/** An address people sign in with, in lower case. */
export const email = z.string().trim().toLowerCase().max(200, 'must have at most 200 characters').pipe(z.email('must be an email address'))

/** POST /api/session: signs in. 401 with one text whatever was wrong, 429 with Retry-After after many tries. */
export const signInBody = z.strictObject({
  email: z.string().trim().toLowerCase().min(1).max(200),
  password: z.string().min(1).max(512),
})

/** POST /api/session/password: ends every other session of the person and keeps this one. 422 with errors, 403 when `current` is wrong. */
export const passwordBody = z.strictObject({ current: z.string().min(1).max(512), next: newPassword })

/** PATCH /api/session/units: one's own units. */
export const unitsBody = z.strictObject({ units })

/** Who is signed in. */
export interface User extends Certification {
  id: string
  name: string
  email: string
  roles: Role[]
  trainee: boolean
  units: Units
}

/** What POST and GET /api/session, PATCH /api/session/units and POST /api/invitations/{token} answer. */
export interface SessionAnswer { user: User }
