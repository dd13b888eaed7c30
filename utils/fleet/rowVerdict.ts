import type { CylinderRow, Lifecycle } from '../custody/cylinderView'
import type { FindingCode } from '../custody/finding'
import type { StatusKind } from '../picture/status'
import { scaleAccuracyGrams } from '../quantity/scale'

/** A status of the screen and the word beside its shape. */
export interface RowVerdict { kind: StatusKind, text: string }

const LIFECYCLE_VERDICTS: Partial<Record<Lifecycle, RowVerdict>> = {
  condemned: { kind: 'stop', text: 'Condemned' },
  rejected: { kind: 'stop', text: 'Rejected at its test' },
  quarantined: { kind: 'stop', text: 'Set apart' },
  retired: { kind: 'away', text: 'Retired' },
  missing: { kind: 'unk', text: 'Missing' },
}

const STOP_WORDS: Partial<Record<FindingCode, string>> = {
  'overfill': 'Overfilled',
  'pressure-class': 'Not rated for its pressure',
  'spec-not-for-gas': 'Not made for this gas',
  'not-refillable': 'Never to be refilled',
  'not-marked-flammable': 'Not marked flammable',
  'second-refrigerant': 'Two refrigerants in it',
  'unknown-onto-known': 'Unknown mixed in',
  'retest-overdue': 'Retest overdue',
  'retest-unknown': 'No test date known',
  'early-test': 'Test it before use',
  'wet': 'Wet, evacuate it',
  'rejected': 'Rejected at its test',
  'condemned': 'Condemned',
  'quarantined': 'Set apart',
  'code-on-two': 'Label on two cylinders',
  'unsupervised': 'Trainee without supervisor',
  'away': 'Used while away',
  'after-end': 'Used after its end',
}

const CAUTION_WORDS: Partial<Record<FindingCode, string>> = {
  'retest-overdue': 'Retest overdue',
  'nearly-full': 'Nearly full',
  'not-registered': 'Not registered yet',
  'registered-twice': 'Registered twice',
  'toxic': 'Toxic refrigerant',
  'two-owners': 'Two owners in it',
  'old-tare-on-label': 'Old tare on its label',
  'unsigned': 'Waits for a signature',
}

const CAUTION_ORDER = Object.keys(CAUTION_WORDS) as FindingCode[]

/**
 * The one line that the fleet says of a cylinder: the gravest thing known of it, in words.
 *
 * Order: use after its end, an end of its life, a stop, what is not known, a caution, and only then that it may be used.
 */
export function rowVerdict(row: CylinderRow): RowVerdict {
  if (row.lifecycle === 'retired' && row.findingCodes.includes('after-end')) return { kind: 'stop', text: STOP_WORDS['after-end']! }
  const ended = LIFECYCLE_VERDICTS[row.lifecycle]
  if (ended) return ended
  const away = awayWord(row)
  if (row.worstFinding?.severity === 'stop') {
    const word = STOP_WORDS[row.worstFinding.code] ?? 'Not to be used'
    return { kind: 'stop', text: away ? `${away}, ${lowerFirst(word)}` : word }
  }
  if (away) return { kind: 'away', text: away }
  return notKnown(row) ?? caution(row) ?? mayBeUsed(row)
}

/** Whether a cylinder is full on the screen: less room in it than the scale can tell. */
export function isFull(row: CylinderRow): boolean {
  if (row.roomGrams === null && (row.netGrams === null || row.fillLimitGrams === null)) return false
  const room = row.roomGrams ?? row.fillLimitGrams! - row.netGrams!
  if (row.netGrams === null || row.tareWeightGrams === null) return false
  return room >= 0 && room < scaleAccuracyGrams(row.tareWeightGrams + row.netGrams)
}

function awayWord(row: CylinderRow): string | null {
  if (row.lifecycle === 'at-reclaim') return 'At reclaim'
  if (row.lifecycle === 'at-test') return 'At test'
  return null
}

function notKnown(row: CylinderRow): RowVerdict | null {
  if (!row.nothingInIt && row.refrigerant === null) return { kind: 'unk', text: row.condition === 'mixed' ? 'Mixed, no limit' : 'Unknown, no limit' }
  if (row.unseen) return { kind: 'unk', text: row.unseen.isLong ? `Missing? ${row.unseen.days} days` : `Not seen for ${row.unseen.days} days` }
  if (row.tareWeightGrams === null || row.waterCapacityGrams === null) return { kind: 'unk', text: 'Stamp unknown, no limit' }
  if (!row.nothingInIt && row.netGrams === null) return { kind: 'unk', text: 'Not weighed' }
  return null
}

function caution(row: CylinderRow): RowVerdict | null {
  const code = CAUTION_ORDER.find(known => row.findingCodes.includes(known))
  if (code === undefined) return null
  return { kind: 'att', text: code === 'nearly-full' && isFull(row) ? 'Full' : CAUTION_WORDS[code]! }
}

/** A limit without a stop weight means that something keeps it from being filled: then it is not called usable. */
function mayBeUsed(row: CylinderRow): RowVerdict {
  if (row.fillLimitGrams !== null && row.stopWeightGrams === null) return { kind: 'unk', text: 'No stop weight' }
  if (row.findingCodes.includes('retest-soon')) return { kind: 'att', text: 'Usable, retest soon' }
  return { kind: 'ok', text: row.nothingInIt ? 'Empty, usable' : 'Usable' }
}

function lowerFirst(text: string): string {
  return text.charAt(0).toLowerCase() + text.slice(1)
}
