import type { RetestRules } from './ownerChoice'

/** What the firm sets of its reminders and of the time between tests. */
export interface RetestSettings extends RetestRules {
  /** Days before the due month ends from which a test is due soon. */
  soonDays: number
  /** Days without an event after which a cylinder is to be looked for. */
  notSeenDays: number
  /** Days without an event after which it may be missing. */
  missingDays: number
}

/** What holds until the firm sets something else: the days are ours, no source. */
export const DEFAULT_RETEST_SETTINGS: RetestSettings = { soonDays: 120, notSeenDays: 30, missingDays: 90, intervalMonths: null, ownerChoices: [] }
