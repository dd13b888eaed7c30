/** How much a finding weighs. */
export type Severity = 'caution' | 'stop'

/** What a rule found, as a code; its words are in `findings/words.ts`. */
export type FindingCode
  = 'overfill' | 'nearly-full' | 'pressure-class' | 'spec-not-for-gas' | 'not-refillable' | 'not-marked-flammable' | 'toxic'
    | 'second-refrigerant' | 'unknown-onto-known' | 'retest-overdue' | 'retest-soon' | 'retest-unknown'
    | 'early-test' | 'wet' | 'rejected' | 'condemned' | 'quarantined'
    | 'weight-not-known' | 'not-registered' | 'registered-twice' | 'old-tare-on-label'
    | 'code-on-two' | 'half-transfer' | 'transfer-unbalanced' | 'unsigned' | 'unsupervised' | 'not-seen' | 'two-owners' | 'owner-change' | 'owner-consent'
    | 'weigh-again' | 'clock-doubtful' | 'late-change' | 'look-before-fill' | 'system-dependent-limit' | 'gas-excess' | 'found-by-use' | 'away' | 'after-end' | 'tested-full' | 'not-shippable'

/** A rule's word on an event, a state or a plan. */
export interface Finding {
  code: FindingCode
  severity: Severity
  /** One or two sentences for the person at the cylinder: what is so, and what to do next. */
  text: string
  /** The regulation or standard itself, or "common practice, no source". */
  source: string
  /** Instant (ISO 8601) since when it stands, where one is known. */
  since: string | null
}
