import { and, eq, isNull } from 'drizzle-orm'
import { dockLinks } from '../../../drizzle/schema'
import { statement, type Database } from '../database/database'
import { problem } from '../http/problem'
import { linkOfToken } from './sealedToken'

/** A link as it is stored. */
export type DockLinkRow = typeof dockLinks.$inferSelect

/**
 * The link that a token opens now.
 *
 * Errors: 404 where it was altered, never made, revoked or has run out; which of them is not told.
 */
export async function openedLink(db: Database, token: string, now: number): Promise<DockLinkRow> {
  const named = linkOfToken(token)
  if (!named) throw opensNothing()
  const [row] = await db.read.select().from(dockLinks).where(eq(dockLinks.id, named.linkId)).limit(1)
  if (!row || row.expiresAt !== named.expiresAt || row.revokedAt !== null || row.expiresAt <= now) throw opensNothing()
  if (row.firstUsedAt === null) markUsed(db, row.id, now)
  return row
}

/** The one refusal of every link that does not open. */
export function opensNothing() {
  return problem(404, 'This link opens nothing', 'It may have run out or been withdrawn, or a character of it is missing. Ask whoever sent it to you.', undefined, { type: 'link-unknown' })
}

/** Not waited for: reading goes on where the disk is full. */
function markUsed(db: Database, id: string, now: number): void {
  db.write([statement(db.read.update(dockLinks).set({ firstUsedAt: now }).where(and(eq(dockLinks.id, id), isNull(dockLinks.firstUsedAt))))])
    .catch(error => console.error('A dock link could not be marked as used:', error))
}
