import type { InStatement } from '@libsql/client'
import { and, eq, gt, isNull } from 'drizzle-orm'
import { oneTimeLinks } from '../../../drizzle/schema'
import { MS_PER_DAY } from '../../../utils/quantity/instant'
import { useDatabase } from '../database/currentDatabase'
import { statement } from '../database/database'
import { problem } from '../http/problem'
import { newSecret, secretHash } from '../session/secret'

type Purpose = (typeof oneTimeLinks.$inferSelect)['purpose']

/** How long an invitation is good. Units: days. */
export const INVITATION_DAYS = 7
/** A set-up link is made anew at each start. */
const LIFETIME: Record<Purpose, number> = { 'invitation': INVITATION_DAYS * MS_PER_DAY, 'set-up': INVITATION_DAYS * MS_PER_DAY }

/** A new link, and the statements that store its hash and end the ones before it. */
export function newLink(purpose: Purpose, personId: string | null, now: number): { token: string, store: InStatement[] } {
  const { read } = useDatabase()
  const token = newSecret()
  const former = personId === null ? isNull(oneTimeLinks.personId) : eq(oneTimeLinks.personId, personId)
  return {
    token,
    store: [
      statement(read.delete(oneTimeLinks).where(and(eq(oneTimeLinks.purpose, purpose), former, isNull(oneTimeLinks.usedAt)))),
      statement(read.insert(oneTimeLinks).values({ tokenHash: secretHash(token), purpose, personId, createdAt: now, expiresAt: now + LIFETIME[purpose] })),
    ],
  }
}

/**
 * The link of a token that may still be used.
 *
 * Errors: 404 when it is unknown, used or too old; which of them is not told.
 */
export async function goodLink(purpose: Purpose, token: string, now: number) {
  const [link] = await useDatabase().read.select().from(oneTimeLinks).where(stillGood(purpose, token, now)).limit(1)
  if (!link) throw linkUnknown()
  return link
}

/** The statement that uses a link up; it answers a row only for the first. */
export function useUpLink(purpose: Purpose, token: string, now: number): InStatement {
  const { read } = useDatabase()
  return statement(read.update(oneTimeLinks).set({ usedAt: now }).where(stillGood(purpose, token, now)).returning({ personId: oneTimeLinks.personId }))
}

/** The condition that a token's link is unused and in date. */
export function stillGood(purpose: Purpose, token: string, now: number) {
  return and(
    eq(oneTimeLinks.tokenHash, secretHash(token)), eq(oneTimeLinks.purpose, purpose),
    isNull(oneTimeLinks.usedAt), gt(oneTimeLinks.expiresAt, now),
  )
}

/** The refusal of a link. */
export function linkUnknown() {
  return problem(404, 'This link is no longer good', 'It has been used, has run out, or was never made. Ask for a new one.', undefined, { type: 'link-unknown' })
}
