import { getCookie, type H3Event } from 'h3'
import type { Environment } from '../environment'

// getUserSession, setUserSession and clearUserSession are nuxt-auth-utils'; it gives them as auto-imports only.

/**
 * Tells the session package the cookie's name and whether it is Secure; it reads both from these variables at each
 * request. Browsers take a `__Host-` name only from https.
 */
export function configureSessionCookie({ secure }: Environment): void {
  process.env.NUXT_SESSION_NAME = cookieName(secure)
  process.env.NUXT_SESSION_COOKIE_SECURE = String(secure)
}

/** How long what a cookie holds is known without unsealing it again, and of how many cookies. */
const KEPT_MS = 60_000
const MOST_KEPT = 1_000

const unsealed = new Map<string, { sid: string, until: number }>()

/**
 * The secret in the request's sealed cookie, or null. Without a cookie nothing is unsealed and none is set.
 *
 * Whoever posts event after event sends the same cookie: it is unsealed once a minute, for that costs more than the
 * rest of the sign-in. Whether the secret still opens a session is looked up each time.
 */
export async function readSessionSecret(event: H3Event): Promise<string | null> {
  const cookie = getCookie(event, ownName())
  if (!cookie) return null
  const kept = unsealed.get(cookie)
  if (kept && Date.now() < kept.until) return kept.sid
  const { secure } = await getUserSession(event)
  if (typeof secure?.sid !== 'string') return null
  keep(cookie, secure.sid)
  return secure.sid
}

function keep(cookie: string, sid: string): void {
  unsealed.delete(cookie)
  unsealed.set(cookie, { sid, until: Date.now() + KEPT_MS })
  if (unsealed.size > MOST_KEPT) unsealed.delete(unsealed.keys().next().value!)
}

/** Seals a secret into a new cookie. */
export async function writeSessionSecret(event: H3Event, sid: string): Promise<void> {
  forgetRequestCookie(event)
  await setUserSession(event, { secure: { sid } })
}

/** Takes the cookie away. */
export async function clearSessionCookie(event: H3Event): Promise<void> {
  await clearUserSession(event)
}

/**
 * The package goes on with the sealed session that came with the request, even after clearing it: its age counts on
 * and its data are merged. Without the request's cookie it begins anew.
 */
function forgetRequestCookie(event: H3Event): void {
  const name = ownName()
  const others = (event.node.req.headers.cookie ?? '').split(';').filter(pair => pair.split('=')[0]?.trim() !== name)
  event.node.req.headers.cookie = others.join(';')
  if (event.context.sessions) Reflect.deleteProperty(event.context.sessions, name)
}

function ownName(): string {
  return process.env.NUXT_SESSION_NAME ?? cookieName(true)
}

/** The cookie that holds the sealed session. */
export function cookieName(secure: boolean): string {
  return secure ? '__Host-collarbook' : 'collarbook'
}
