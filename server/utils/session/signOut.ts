import type { H3Event } from 'h3'
import { useDatabase } from '../database/currentDatabase'
import { securityEntry } from '../securityLog'
import { currentUser } from './currentUser'
import { readSessionSecret } from './sessionCookie'
import { endSession } from './sessions'

/** Ends the session that a request came with, if it did. */
export async function signOut(event: H3Event, now: number): Promise<void> {
  const sid = await readSessionSecret(event)
  if (!sid) return
  const user = await currentUser(event)
  await useDatabase().write([endSession(sid), ...(user ? [securityEntry({ what: 'signed-out', personId: user.id }, now)] : [])])
}
