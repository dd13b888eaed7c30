import type { Access, Role } from '../access/roles'
import { EVENT_KINDS, type EventKind } from './kinds'

const TECHNICIAN = [
  'received', 'moved', 'handed-over', 'weighed', 'filled', 'drawn', 'transferred', 'exchanged', 'checked', 'emptied', 'lost', 'labelled', 'returned',
  'inspected', 'quarantined', 'missing', 'found',
] as const satisfies readonly EventKind[]

/** Which kinds each role may record. The kinds of a dispatch are a manager's, and come with its papers only. */
const MAY_POST: Record<Role, readonly EventKind[]> = {
  technician: TECHNICIAN,
  warehouse: [...TECHNICIAN, 'registered'],
  manager: EVENT_KINDS,
  auditor: [],
  admin: [],
}

/** How long an author may correct their own event, from its recording. Units: milliseconds. */
export const AUTHOR_CORRECTS_WITHIN_MS = 24 * 3_600_000

/**
 * Whether a role of this person may record events of a kind.
 *
 * An author's own correction within a day is a matter of that event, and is judged where the event is known.
 */
export function mayPost(access: Access | null, kind: EventKind): boolean {
  return access !== null && access.roles.some(role => Object.hasOwn(MAY_POST, role) && MAY_POST[role].includes(kind))
}
