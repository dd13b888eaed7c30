import type { Condition, Hold, Lifecycle, Missing, Ownership } from './cylinderView'
import type { FindingCode } from './finding'
import type { EventKind } from './kinds'

/** A kind of event as people say it: what a button does, and what the log says was done. */
export interface KindWords {
  /** The verb on a button. */
  act: string
  /** The word in the log. */
  done: string
}

/** The words of each kind of event. */
export const KIND_WORDS: Record<EventKind, KindWords> = {
  'registered': { act: 'Register', done: 'Registered' },
  'labelled': { act: 'Label', done: 'Labelled' },
  'received': { act: 'Receive', done: 'Received' },
  'moved': { act: 'Move', done: 'Moved' },
  'handed-over': { act: 'Hand over', done: 'Handed over' },
  'weighed': { act: 'Weigh', done: 'Weighed' },
  'filled': { act: 'Record a recovery', done: 'Filled' },
  'drawn': { act: 'Draw', done: 'Drawn' },
  'transferred': { act: 'Transfer', done: 'Transferred' },
  'checked': { act: 'Check the contents', done: 'Checked' },
  'emptied': { act: 'Empty', done: 'Emptied' },
  'lost': { act: 'Loss', done: 'Lost' },
  'inspected': { act: 'Look it over', done: 'Looked over' },
  'quarantined': { act: 'Set apart', done: 'Set apart' },
  'released': { act: 'Release', done: 'Released' },
  'missing': { act: 'Report it missing', done: 'Missing' },
  'found': { act: 'Found it', done: 'Found' },
  'retired': { act: 'Retire', done: 'Retired' },
  'sent-for-reclaim': { act: 'Ship for reclaim', done: 'Sent for reclaim' },
  'reclaimed': { act: 'Reclaimed', done: 'Reclaimed' },
  'returned': { act: 'Return', done: 'Returned' },
  'exchanged': { act: 'Exchange', done: 'Exchanged' },
  'sent-for-test': { act: 'Send to test', done: 'Sent for test' },
  'retested': { act: 'Retest', done: 'Retested' },
  'corrected': { act: 'Correct', done: 'Corrected' },
  'countersigned': { act: 'Countersign', done: 'Countersigned' },
}

/** The conditions of what is in a cylinder, best first. */
export const CONDITION_WORDS: Record<Condition, string> = {
  clean: 'clean',
  suspect: 'suspect',
  unknown: 'not known',
  burnt: 'burnt (oil, acid)',
  mixed: 'mixed',
}

/** Where a cylinder stands in its life. */
export const LIFECYCLE_WORDS: Record<Lifecycle, string> = {
  'in-service': 'in service',
  'quarantined': 'set apart',
  'rejected': 'rejected at its test',
  'at-reclaim': 'at the reclaimer',
  'at-test': 'at the test station',
  'missing': 'missing',
  'condemned': 'condemned',
  'retired': 'retired',
}

/** The stages of life that a list may be asked for; what was given away has one with the firm that has it. */
export const STAGE_WORDS: Record<Lifecycle | 'given-away', string> = { ...LIFECYCLE_WORDS, 'given-away': 'given away in an exchange' }

/** What keeps a cylinder from use. */
export const HOLD_WORDS: Record<Hold, string> = {
  'quarantined': 'set apart',
  'rejected': 'rejected at its test',
  'damaged': 'damaged',
  'tare-loss': 'lighter than its stamp',
  'wet': 'wet from its test',
}

/** Whose cylinder it is. */
export const OWNERSHIP_WORDS: Record<Ownership, string> = {
  own: 'our own',
  rental: 'rented',
  deposit: 'on deposit',
  customer: 'a customer’s',
}

/** What is not known, as the end of "No stop weight: ... not known". */
export const MISSING_WORDS: Record<Missing, string> = {
  tareWeight: 'its tare weight (TW)',
  waterCapacity: 'its water capacity (WC)',
  servicePressure: 'its marked service pressure',
  refrigerant: 'the refrigerant',
  weight: 'its weight',
  testDate: 'the month of its last test',
}

/** The findings in two or three words, as in a list. */
export const FINDING_WORDS: Record<FindingCode, string> = {
  'overfill': 'overfilled',
  'nearly-full': 'nearly full',
  'pressure-class': 'not rated for its pressure',
  'spec-not-for-gas': 'not made for this gas',
  'not-refillable': 'not refillable',
  'not-marked-flammable': 'not marked for flammables',
  'toxic': 'toxic',
  'second-refrigerant': 'second refrigerant',
  'unknown-onto-known': 'unknown onto known',
  'retest-overdue': 'retest overdue',
  'retest-soon': 'retest soon',
  'retest-unknown': 'no test date known',
  'early-test': 'test it early',
  'wet': 'wet from its test',
  'rejected': 'rejected',
  'condemned': 'condemned',
  'quarantined': 'set apart',
  'weight-not-known': 'not weighed',
  'not-registered': 'not registered',
  'registered-twice': 'registered twice',
  'old-tare-on-label': 'old tare on label',
  'code-on-two': 'one code on two',
  'half-transfer': 'half a transfer',
  'transfer-unbalanced': 'transfer unbalanced',
  'unsigned': 'not countersigned',
  'unsupervised': 'no supervisor',
  'not-seen': 'not seen',
  'two-owners': 'two owners',
  'owner-change': 'to a new owner',
  'owner-consent': 'owner not asked',
  'weigh-again': 'weigh again',
  'clock-doubtful': 'clock doubtful',
  'late-change': 'came late',
  'look-before-fill': 'not looked at',
  'gas-excess': 'pressure too high',
  'system-dependent-limit': 'too much for its own compressor',
  'found-by-use': 'found by use',
  'away': 'was away',
  'after-end': 'after its end',
  'tested-full': 'tested full',
  'not-shippable': 'not to be shipped',
}
