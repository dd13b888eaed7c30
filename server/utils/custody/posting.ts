import type { InStatement } from '@libsql/client'
import type { Access } from '../../../utils/access/roles'
import type { EventResult } from '../../../utils/contract/custody'

/** Events that one person hands over at once. */
export interface Posting {
  /** As received, each parsed on its own. */
  events: unknown[]
  access: Access
  /** When the server took them, UTC milliseconds. */
  now: number
  /** What the sender's clock read when it sent them, UTC milliseconds; null where it did not say. */
  deviceNow: number | null
  /** A dispatch: it may write the kinds that need papers, and all of it is stored or none. */
  dispatch?: Dispatch
}

/** What is written in one commit with the events of a dispatch. */
export interface Dispatch {
  /**
   * Further statements of the same commit. Each must carry the guard's condition, which holds only when every
   * event of the dispatch was written.
   */
  alongside: (guard: Guard) => InStatement[]
}

/** A condition for a WHERE clause, with its arguments. */
export interface Guard { sql: string, args: (string | number | null)[] }

export type { EventResult }
