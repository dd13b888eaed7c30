import { z } from 'zod'
import type { LabelAddress } from './labels'
import { printedLine } from './parts'
import { email, newPassword, units } from './session'

const token = z.string().regex(/^[\w-]{43}$/, 'is not a set-up link')

/** A zone of the IANA time zone database, such as America/Chicago. */
export const timeZone = z.string().min(1).max(60).refine(isTimeZone, 'must be a time zone such as America/Chicago')

/** GET /api/setup?token=: 200 while the link is good, else 404. */
export const setUpQuery = z.strictObject({ token })
export interface SetUpOpen { open: true, expiresAt: string, labels: LabelAddress }

/** POST /api/setup: makes the firm and its first admin, and signs that person in (201, SessionAnswer). */
export const setUpBody = z.strictObject({
  token,
  firm: z.strictObject({ name: printedLine(120), telephone: printedLine(40), timeZone, units }),
  admin: z.strictObject({ name: printedLine(80), email, password: newPassword }),
})
export type SetUp = z.output<typeof setUpBody>

/** The page that the printed link opens is `/setup?token={token}`. */
export function setUpPath(value: string): string {
  return `/setup?token=${value}`
}

function isTimeZone(value: string): boolean {
  try {
    return Boolean(new Intl.DateTimeFormat('en', { timeZone: value }))
  }
  catch {
    return false
  }
}
