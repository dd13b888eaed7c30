import { absoluteMmHg, inHgBelow, MMHG_PER_INHG, mmHgFromPsi } from '../quantity/vacuum'
import { mostLeftMmHg, STANDARD_ATMOSPHERE_INHG } from './evacuationTable'
import type { EvacuationLevel, LevelVerdict, Reached, RequiredLevel } from './types'
import { levelWords } from './words'

/**
 * Whether a level was reached: by the gauge, or for a share of the charge by what was weighed out.
 *
 * Vacuums are compared as what is left in mmHg absolute, the required one counted from 29.9 inHg. A gauge of inHg
 * without its barometer is taken against 29.9 too, and that is said; of an absolute level it tells nothing. How long it held does not change the verdict: no text asks for a
 * time, and 5 minutes without coming back above 0 psig is common practice, no source. It is kept and said.
 */
export function judgeLevel(required: Pick<RequiredLevel, 'level' | 'alternative'>, reached: Reached | null, heldMinutes: number | null): LevelVerdict {
  const verdict = reached === null ? unknown('Nothing was read yet.') : judged(required, reached)
  return { ...verdict, heldMinutes }
}

type Judged = Omit<LevelVerdict, 'heldMinutes'>

// A reading and a limit that are equal on paper may differ in the last binary digit.
const FLOAT_NOISE = 1e-6

function judged({ level, alternative }: Pick<RequiredLevel, 'level' | 'alternative'>, reached: Reached): Judged {
  if ('recoveredGrams' in reached) {
    return level.unit === 'percent-of-charge' ? byWeight(level, reached) : unknown(`A weight does not tell whether ${levelWords(level)} was reached. Read a gauge.`)
  }
  const byGauge = level.unit === 'percent-of-charge' ? alternative : level
  return byGauge === null ? unknown('A gauge does not tell what share of the charge came out. Weigh it.') : byVacuum(byGauge, reached)
}

function byWeight(level: EvacuationLevel, { recoveredGrams, chargeGrams }: Extract<Reached, { recoveredGrams: number }>): Judged {
  if (chargeGrams <= 0) return unknown('Without the full charge no share of it can be told.')
  const percent = recoveredGrams / chargeGrams * 100
  const short = level.value - percent
  const doubt = percent > 100 + FLOAT_NOISE ? ' That is more than there was: look at the charge and at the scale.' : ''
  const because = `${rounded(percent, percent > 100 ? 'up' : 'down')} % of the charge came out, ${level.value} % is asked for.${doubt}`
  return verdictOf(short, because, null)
}

function byVacuum(level: EvacuationLevel, reached: Exclude<Reached, { recoveredGrams: number }>): Judged {
  const isWithoutBarometer = 'inHg' in reached && reached.barometerInHg === undefined
  if (isWithoutBarometer && level.unit === 'mmHg-absolute') {
    return unknown(`A gauge of inHg tells ${levelWords(level)} only with the barometer. Give it, or read an absolute gauge.`)
  }
  const barometer = 'inHg' in reached ? reached.barometerInHg ?? STANDARD_ATMOSPHERE_INHG : STANDARD_ATMOSPHERE_INHG
  const left = absoluteMmHg(reached, STANDARD_ATMOSPHERE_INHG)
  if (left < -FLOAT_NOISE) {
    return unknown(isWithoutBarometer
      ? `Against ${STANDARD_ATMOSPHERE_INHG} inHg the gauge shows less than nothing. Give the barometer, or zero the gauge and read again.`
      : 'The gauge shows a deeper vacuum than the barometer allows. Zero it and read again.')
  }
  // psig is what the gauge shows here, whatever the barometer; the table counts from its own atmosphere.
  const most = level.unit === 'psig' ? barometer * MMHG_PER_INHG + mmHgFromPsi(level.value) : mostLeftMmHg(level) ?? NaN
  const shortMmHg = left - most
  const short = level.unit === 'inHg-vacuum' ? shortMmHg / MMHG_PER_INHG : level.unit === 'psig' ? shortMmHg / mmHgFromPsi(1) : shortMmHg
  const assumed = isWithoutBarometer && level.unit !== 'psig' ? ` The barometer is not known: taken as ${STANDARD_ATMOSPHERE_INHG} inHg.` : ''
  return verdictOf(short, `${comesTo(left, level)}, ${levelWords(level)} is asked for.${assumed}`, left)
}

function comesTo(left: number, { unit }: EvacuationLevel): string {
  if (unit !== 'inHg-vacuum' && unit !== 'mmHg-vacuum') return `It comes to ${rounded(left, 'up')} mmHg absolute`
  const inHg = inHgBelow(left, STANDARD_ATMOSPHERE_INHG)
  return inHg < 0
    ? `It comes to ${rounded(-inHg, 'up')} inHg above the table’s ${STANDARD_ATMOSPHERE_INHG} inHg`
    : `It comes to ${rounded(inHg, 'down')} inHg below ${STANDARD_ATMOSPHERE_INHG} inHg (${rounded(left, 'up')} mmHg absolute)`
}

function verdictOf(short: number, because: string, left: number | null): Judged {
  const isReached = short <= FLOAT_NOISE
  return { verdict: isReached ? 'reached' : 'not-reached', because, shortBy: isReached ? null : short, absoluteMmHg: left }
}

function unknown(because: string): Judged {
  return { verdict: 'unknown', because, shortBy: null, absoluteMmHg: null }
}

/** To a tenth, away from what would flatter. */
function rounded(value: number, way: 'down' | 'up'): string {
  const tenths = way === 'down' ? Math.floor(value * 10 + FLOAT_NOISE) : Math.ceil(value * 10 - FLOAT_NOISE)
  return (tenths / 10).toFixed(1)
}
