import type { End } from '../endOf'
import type { Finding } from '../finding'
import type { AwayAt } from '../state'
import { COMMON_PRACTICE, OWN_RULE, sentence, sinceText } from './words'

/** Nobody has entered the stamp. */
export function notRegistered(since: number | null): Finding {
  return {
    code: 'not-registered', severity: 'caution', source: OWN_RULE, since: sinceText(since),
    text: 'It has not been registered. Enter what its collar says; until then there is no stop weight.',
  }
}

/** Two people registered it. */
export function registeredTwice(since: number): Finding {
  return {
    code: 'registered-twice', severity: 'caution', source: OWN_RULE, since: sinceText(since),
    text: 'It was registered twice; the first counts. Compare both with the collar and correct the first if it is wrong.',
  }
}

/** One code stands on two cylinders. */
export function codeOnTwo(code: string): Finding {
  return {
    code: 'code-on-two', severity: 'stop', source: OWN_RULE, since: null,
    text: `The label code ${code} is on another cylinder too. Check the serial on the collar. The code stays with the cylinder that had it first; the other gets a new label in its place.`,
  }
}

/** A trainee's event waits for its supervisor. */
export function unsigned(since: number): Finding {
  return {
    code: 'unsigned', severity: 'caution', source: OWN_RULE, since: sinceText(since),
    text: 'A trainee\'s entry waits for the supervisor\'s signature.',
  }
}

/** A trainee worked alone. */
export function unsupervised(since: number): Finding {
  return {
    code: 'unsupervised', severity: 'stop', source: '40 CFR 82.161', since: sinceText(since),
    text: 'A trainee\'s entry names nobody who may supervise. A certified technician must look at this cylinder and answer for it.',
  }
}

/** Nobody has recorded anything about it for long. */
export function notSeen(days: number, lastSeenAt: number, missingDays: number): Finding {
  const what = days >= missingDays ? `Missing? Nothing was recorded for ${days} days` : `Nothing was recorded for ${days} days`
  return { code: 'not-seen', severity: 'caution', text: `${what}. Look for it where it was last.`, source: OWN_RULE, since: sinceText(lastSeenAt) }
}

/** Its time cannot be trusted. */
export function clockDoubtful(isClamped: boolean): Finding {
  const what = isClamped ? 'Its time lies after the moment it was recorded' : 'The clock it was written by was more than 5 minutes off'
  return {
    code: 'clock-doubtful', severity: 'caution', source: OWN_RULE, since: null,
    text: `${what}. Both times are kept; compare them with the paper.`,
  }
}

/** It took its place before lines that had been recorded already, and they say something else since. */
export function lateChange(lines: number): Finding {
  return {
    code: 'late-change', severity: 'caution', source: OWN_RULE, since: null,
    text: `It came late, and ${lines === 1 ? 'a later line says' : `${lines} later lines say`} something else since. Look whether what was done then was right.`,
  }
}

/** Nobody said that the outside was looked at. */
export function lookBeforeFill(): Finding {
  return {
    code: 'look-before-fill', severity: 'caution', source: '49 CFR 173.301(a)(2)', since: null,
    text: 'No look at its outside was recorded before this fill. Look for dents, rust, heat and leaks now.',
  }
}

const AWAY_WORDS: Record<AwayAt, string> = {
  'at-reclaim': 'is at the reclaimer', 'at-test': 'is at its test', 'given-away': 'was given away in an exchange',
}

/** Something was recorded while the cylinder should have been elsewhere. */
export function away(where: AwayAt, since: number): Finding {
  return {
    code: 'away', severity: 'stop', source: OWN_RULE, since: sinceText(since),
    text: `By the log it ${AWAY_WORDS[where]}. Check the serial; if it is back, record its return.`,
  }
}

/** Nobody knows where it is. */
export function nowhere({ since, lastSeen }: { since: number, lastSeen: string | null }): Finding {
  return {
    code: 'away', severity: 'stop', source: OWN_RULE, since: sinceText(since),
    text: `By the log it is missing.${lastSeen === null ? '' : ` Last seen: ${sentence(lastSeen)}`} If it stands before you, record that it was found.`,
  }
}

/** Something was recorded of a cylinder that nobody could find. */
export function foundByUse(since: number): Finding {
  return {
    code: 'found-by-use', severity: 'caution', source: OWN_RULE, since: sinceText(since),
    text: 'By the log it was missing; this ends that. Check the serial, and say where it is now.',
  }
}

/** A text that somebody typed, to stand within a sentence. */
function withoutStop(typed: string): string {
  return typed.replace(/\.+$/, '')
}

/** Somebody set it apart. */
export function setApart(since: number, reasons: readonly string[]): Finding {
  return {
    code: 'quarantined', severity: 'stop', source: OWN_RULE, since: sinceText(since),
    text: `Set apart: ${sentence(reasons.map(withoutStop).join('; '))} Put nothing in until a manager releases it.`,
  }
}

/** Something was recorded of a cylinder that has ended. */
export function afterEnd(since: number): Finding {
  return {
    code: 'after-end', severity: 'stop', source: OWN_RULE, since: sinceText(since),
    text: 'It had been condemned or retired before this. Take it out of use, draw what is in it, and find out why it was used.',
  }
}

/** Nothing goes into a cylinder that has ended. */
export function ended({ how, since }: End): Finding {
  return {
    code: 'after-end', severity: 'stop', source: how === 'condemned' ? '49 CFR 180.205(i)' : OWN_RULE, since: sinceText(since),
    text: how === 'condemned' ? 'It was condemned. It is never filled or shipped again.' : 'It was retired. Nothing goes into it, and it leaves with nobody.',
  }
}

/** Why a cylinder may not leave on a shipment. */
export function notShippable(because: string, source: string = COMMON_PRACTICE): Finding {
  return { code: 'not-shippable', severity: 'stop', text: because, source, since: null }
}
