import type { InStatement } from '@libsql/client'
import { v7 as uuid } from 'uuid'
import { securityLog } from '../../drizzle/schema'
import { useDatabase } from './database/currentDatabase'
import { statement } from './database/database'

/** What the security log tells of; the subject is an id, an address or a permission, never a password or a token. */
export type SecurityEvent
  = | 'signed-in' | 'sign-in-refused' | 'signed-out'
    | 'password-changed' | 'password-change-refused'
    | 'refused'
    | 'invited' | 'invitation-taken-up'
    | 'person-changed' | 'person-turned-off' | 'person-turned-on'
    | 'set-up' | 'firm-changed'

/** What a line of the security log says, but for its time. */
export interface SecurityEntry {
  what: SecurityEvent
  /** Who acted; null where nobody is signed in. */
  personId: string | null
  subject?: string | null
}

/** The statement that adds a line to the security log. */
export function securityEntry(entry: SecurityEntry, now: number): InStatement {
  const row = { id: uuid(), at: now, personId: entry.personId, what: entry.what, subject: entry.subject ?? null }
  return statement(useDatabase().read.insert(securityLog).values(row))
}
