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

/** The secret in the request's sealed cookie, or null. Without a cookie nothing is unsealed and none is set. */
export async function readSessionSecret(event: H3Event): Promise<string | null> {
  if (!getCookie(event, ownName())) return null
  const { secure } = await getUserSession(event)
  return typeof secure?.sid === 'string' ? secure.sid : null
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
