import { exactGrams } from '../../quantity/mass'
import { heavyVacuum } from '../findings/weight'
import { becomeNothing, loseNet, weighAfterOutflow } from './contents'
import { changeNet } from './ledger'
import { doubtReading, readScale, restOn, restOnNothing } from './scaleReading'
import { holdBack } from './standing'
import { isTareLoss } from './tareLoss'
import { isConfirmed, type Turn } from './turn'
import { raiseAway } from './whereabouts'

/** A cylinder is emptied: by a deep vacuum, or down to a heel. */
export function emptied(turn: Turn<'emptied'>): void {
  raiseAway(turn)
  if (isDeep(turn.event.details.vacuum)) emptiedDeep(turn)
  else emptiedToHeel(turn)
}

// Common practice, from memory: what counts as evacuated.
const DEEP_MICRONS = 1_000
const DEEP_INHG_FROM_BAROMETER = 1
const STANDARD_BAROMETER_INHG = 29.92

// Keeps 29.92 - 28.92 from being more than 1.
const FLOAT_NOISE = 1e-9

/** Whether a vacuum is deep enough to leave nothing behind: at most 1,000 microns, or within 1 inHg of the barometer. */
export function isDeep(vacuum: Turn<'emptied'>['event']['details']['vacuum']): boolean {
  if (vacuum === undefined) return false
  if ('microns' in vacuum) return vacuum.microns <= DEEP_MICRONS
  // A gauge that shows far more than the barometer is wrong, and tells nothing of what is left.
  return Math.abs((vacuum.barometerInHg ?? STANDARD_BAROMETER_INHG) - vacuum.inHg) <= DEEP_INHG_FROM_BAROMETER + FLOAT_NOISE
}

function emptiedDeep(turn: Turn<'emptied'>): void {
  const { grossAfter } = turn.event.details
  const reading = grossAfter ? readScale(turn, grossAfter) : null
  if (grossAfter && reading?.isAboveTare) {
    weighAfterOutflow(turn, grossAfter, 'emptied-loss')
    turn.findings.push(heavyVacuum(reading.netGrams ?? 0, isConfirmed(turn, 'weigh-again')))
    return
  }
  // Without a tare, or below it, the vacuum is believed but the weight is not known.
  const isKnown = turn.state.tare !== null && reading?.isBelowTare !== true
  changeNet(turn, isKnown ? 0 : null, 'emptied-loss')
  if (reading) {
    restOn(turn, reading)
    doubtReading(turn, reading)
  }
  else restOnNothing(turn)
  becomeNothing(turn, { evacuated: true })
  // With nothing in it the scale shows the tare as it is now.
  if (grossAfter && turn.state.tare && isTareLoss(exactGrams(grossAfter), turn.state.tare.exactGrams)) holdBack(turn, 'tare-loss')
}

function emptiedToHeel(turn: Turn<'emptied'>): void {
  const { contents } = turn.state
  const { grossAfter } = turn.event.details
  if (grossAfter) weighAfterOutflow(turn, grossAfter, 'emptied-loss')
  else if (!contents.nothingInIt) loseNet(turn, 'emptied-loss')
  contents.evacuated = false
}
