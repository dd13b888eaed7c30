import type { H3Event } from 'h3'
import { useDatabase } from '../database/currentDatabase'
import { problem } from '../http/problem'
import { createLinkRate } from './linkRate'
import { openedLink, opensNothing, type DockLinkRow } from './openedLink'

const KEY = 'collarbookDockLink'
const DOCK_PATH = /^\/api\/dock\/([^/?]*)/

const waitOf = createLinkRate()

/**
 * Lets nothing below `/api/dock/` through but what comes with a link that opens, whatever else is in it: who is signed in
 * does not count there, and no body is read before.
 *
 * Errors: 404 for every link that opens nothing, 429 for one that asks too much.
 */
export async function admitToDock(event: H3Event, now: number): Promise<void> {
  const token = DOCK_PATH.exec(event.path)?.[1]
  if (token === undefined) return
  const link = await openedLink(useDatabase(), token, now)
  const seconds = waitOf(link.id, now)
  if (seconds > 0) {
    throw problem(429, 'Too much at once', 'This link is asked very often just now. It goes on by itself.', undefined, { type: 'too-many-tries', headers: { 'Retry-After': String(seconds) } })
  }
  event.context[KEY] = link
}

/** The link that a request came with. Errors: 404 where it came with none. */
export function dockLinkOf(event: H3Event): DockLinkRow {
  const link = event.context[KEY] as DockLinkRow | undefined
  if (!link) throw opensNothing()
  return link
}
