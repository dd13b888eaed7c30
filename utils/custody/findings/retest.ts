import { formatMonth, type Month } from '../../quantity/month'
import { DAMAGE_REASONS, damageInWords } from '../damage'
import type { Finding } from '../finding'
import { COMMON_PRACTICE, massWords, sinceText } from './words'

/** The retest is overdue: a stop before anything goes in, a caution while old contents wait. It is never tested with those. */
export function retestOverdue(dueMonth: Month, { severity, nothingInIt }: Pick<Finding, 'severity'> & { nothingInIt: boolean }): Finding {
  const next = nothingInIt
    ? 'Put nothing in; send it for its test.'
    : 'Put nothing more in; ship it or empty it, then send it for its test.'
  return { code: 'retest-overdue', severity, text: `The retest was due in ${formatMonth(dueMonth)}. ${next}`, source: '49 CFR 180.205(c)', since: null }
}

/** The retest falls due before long. */
export function retestSoon(dueMonth: Month): Finding {
  return {
    code: 'retest-soon', severity: 'caution', source: '49 CFR 180.205(c)', since: null,
    text: `The retest falls due in ${formatMonth(dueMonth)}. Plan to have it empty by then.`,
  }
}

/** No test date is known. */
export function retestUnknown(): Finding {
  return {
    code: 'retest-unknown', severity: 'stop', source: '49 CFR 180.205(c)', since: null,
    text: 'No test date is known. Read the collar and enter it; put nothing in before.',
  }
}

/** Damage asks for a test whatever the date. */
export function damaged(since: number, reasons: readonly string[]): Finding {
  const found = damageInWords(DAMAGE_REASONS.filter(reason => reasons.includes(reason)))
  return {
    code: 'early-test', severity: 'stop', source: '49 CFR 180.205(d)', since: sinceText(since),
    text: `${found === '' ? 'Damaged' : `Damaged: ${found}`}. Put nothing in; it must be tested before it is filled again, whatever its date.`,
  }
}

/** Steel was lost since it was stamped. */
export function tareLoss(since: number): Finding {
  return {
    code: 'early-test', severity: 'stop', source: '49 CFR 180.209(c)', since: sinceText(since),
    text: 'Its tare is 5 % or more below the stamp. Put nothing in until a test has passed with that in view.',
  }
}

/** Water is left in it from its test. */
export function wet(since: number): Finding {
  return {
    code: 'wet', severity: 'stop', source: COMMON_PRACTICE, since: sinceText(since),
    text: 'Wet from its test. Evacuate it to a deep vacuum before use.',
  }
}

/** It failed, but may be repaired. */
export function rejected(since: number): Finding {
  return {
    code: 'rejected', severity: 'stop', source: '49 CFR 180.205(h)', since: sinceText(since),
    text: 'Rejected at its test. Put nothing in; only a passed test clears it.',
  }
}

/** It failed for good. */
export function condemned(since: number): Finding {
  return {
    code: 'condemned', severity: 'stop', source: '49 CFR 180.205(i)', since: sinceText(since),
    text: 'Condemned. It is never filled or shipped again; have what is in it drawn and make it unusable.',
  }
}

/** It went to a wet test with contents. */
export function testedFull(netGrams: number): Finding {
  return {
    code: 'tested-full', severity: 'stop', source: '40 CFR 82.154(a)', since: null,
    text: `By the log ${massWords(netGrams, 'nearest')} was in it when it was filled with water. Find out where that went.`,
  }
}

/** The label was printed before the tare changed. */
export function oldTareOnLabel(since: number): Finding {
  return {
    code: 'old-tare-on-label', severity: 'caution', source: '49 CFR 180.209(c)', since: sinceText(since),
    text: 'The label shows the old tare. Print a new one and stick it on.',
  }
}

/** It is to go to a test with something in it. */
export function hasContents(netGrams: number | null): Finding {
  const what = netGrams === null ? 'Something may still be in it' : `It holds ${massWords(netGrams, 'nearest')}`
  return {
    code: 'tested-full', severity: 'stop', source: COMMON_PRACTICE, since: null,
    text: `${what}. Ship it to a reclaimer or empty it first; it is never tested with contents.`,
  }
}
