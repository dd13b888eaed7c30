import type { Role } from '../../../utils/access/roles'

const HOUR = 3_600_000
const DAY = 24 * HOUR

/** How long a session stands without being used, and at all. Units: milliseconds. */
export interface SessionLimits { idle: number, absolute: number }

/** A technician's phone must open in a plant room without signing in again. */
const FIELD: SessionLimits = { idle: 7 * DAY, absolute: 30 * DAY }
const OFFICE: SessionLimits = { idle: 12 * HOUR, absolute: 7 * DAY }

/** lastSeenAt is written at most this often. Units: milliseconds. */
export const SEEN_INTERVAL = 60_000

/** The limits for a person's roles: the longer ones only for who is nothing but a technician. */
export function sessionLimits(roles: readonly Role[]): SessionLimits {
  return roles.length > 0 && roles.every(role => role === 'technician') ? FIELD : OFFICE
}

/** Whether a session still stands at an instant; one from the future does not. */
export function sessionStands(session: { createdAt: number, lastSeenAt: number }, roles: readonly Role[], now: number): boolean {
  const { idle, absolute } = sessionLimits(roles)
  // A clock set back by a minute must not sign everybody out.
  if (session.createdAt > now + SEEN_INTERVAL) return false
  return now - session.createdAt < absolute && now - session.lastSeenAt < idle
}
