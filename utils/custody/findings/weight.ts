import type { Finding } from '../finding'
import { COMMON_PRACTICE, massWords, OWN_RULE, sinceText } from './words'

/** It holds more than its fill limit. The excess is rounded up. */
export function overfill(excessGrams: number | null, isLastKnownWeight: boolean, since: number | null): Finding {
  const what = excessGrams === null
    ? 'Overfilled when it was last judged'
    : `Overfilled by ${massWords(excessGrams, 'up')}${isLastKnownWeight ? ' by its last known weight' : ''}`
  return {
    code: 'overfill',
    severity: 'stop',
    text: `${what}. Keep it cool, do not move it by road; a trained person draws it down and weighs it.`,
    source: '49 CFR 173.304(b), 173.304a(a)',
    since: sinceText(since),
  }
}

// A limit loses up to a gram to whole grams, and a reading at the stop weight may lie half a gram above it.
const AT_LIMIT_GRAMS = 1.5

/** It holds nine tenths of its fill limit or more. */
export function nearlyFull(roomGrams: number): Finding {
  const text = roomGrams >= -AT_LIMIT_GRAMS
    ? `Nearly full: room for ${massWords(Math.max(0, roomGrams), 'down')}. Watch the scale, or take another cylinder.`
    : `Over today's fill limit by ${massWords(-roomGrams, 'up')}, within the rule it was filled by. Put nothing more in.`
  return { code: 'nearly-full', severity: 'caution', text, source: COMMON_PRACTICE, since: null }
}

/** Nobody knows how much is in it. */
export function weightNotKnown(since: number | null): Finding {
  return {
    code: 'weight-not-known', severity: 'caution', source: OWN_RULE, since: sinceText(since),
    text: 'What is in it is not known by weight. Weigh it.',
  }
}

/** An amount went in or out that no weight from before can tell. */
export function amountNotKnown(verb: 'recovered' | 'drawn' | 'transferred'): Finding {
  return {
    code: 'weight-not-known', severity: 'caution', source: OWN_RULE, since: null,
    text: `No weight is known from before, so how much was ${verb} is not known and counts in no total. Correct the event if the weight before is on paper.`,
  }
}

/** A reading below the tare. */
export function belowTare(shortGrams: number, confirmed: boolean): Finding {
  return weighAgain(`The scale shows ${massWords(shortGrams, 'up')} less than the tare, so the contents are not known`, confirmed)
}

/** A reading above anything the cylinder could hold. */
export function aboveVolume(excessGrams: number, confirmed: boolean): Finding {
  return weighAgain(`The net is ${massWords(excessGrams, 'up')} more than the cylinder could hold`, confirmed)
}

/** A reading that moved the wrong way: less after a fill, more after a draw. */
export function wrongWay(verb: 'filling' | 'drawing', grams: number, confirmed: boolean): Finding {
  const moved = verb === 'filling' ? 'less' : 'more'
  return weighAgain(`The scale shows ${massWords(grams, 'up')} ${moved} after ${verb} than before`, confirmed)
}

/** Too heavy to count as evacuated. */
export function heavyVacuum(netGrams: number, confirmed: boolean): Finding {
  return weighAgain(`A deep vacuum is reported, but the scale shows ${massWords(netGrams, 'nearest')} above the tare, so it does not count as evacuated`, confirmed)
}

/** A new tare far above the stamped one: taken as it is, it would raise the stop weight by as much. */
export function tareAboveStamp(excessGrams: number, confirmed: boolean): Finding {
  return weighAgain(`The new tare is ${massWords(excessGrams, 'nearest')} above the stamped one, and steel does not grow; the stop weight would rise with it`, confirmed)
}

function weighAgain(what: string, confirmed: boolean): Finding {
  return {
    code: 'weigh-again', severity: 'caution', source: COMMON_PRACTICE, since: null,
    text: `${what}. ${confirmed ? 'Its author looked again and confirmed it.' : 'Zero the scale and weigh again.'}`,
  }
}
