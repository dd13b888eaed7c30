import type { Finding } from '../finding'
import type { StandingCode } from '../state'
import { secondRefrigerant, unknownOntoKnown } from './mixing'
import { afterEnd, registeredTwice, unsigned, unsupervised } from './record'

const TEXTS: Record<StandingCode, (since: number) => Finding> = {
  'second-refrigerant': secondRefrigerant,
  'unknown-onto-known': unknownOntoKnown,
  'registered-twice': registeredTwice,
  'unsigned': unsigned,
  'unsupervised': unsupervised,
  'after-end': afterEnd,
}

/** A finding that an event raised and that stands still. */
export function standingFinding({ code, since }: { code: StandingCode, since: number }): Finding {
  return TEXTS[code](since)
}
