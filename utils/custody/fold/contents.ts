import type { MassReading } from '../../quantity/mass'
import type { MovementCause } from '../movement'
import { wrongWay } from '../findings/weight'
import { changeNet, rename } from './ledger'
import { doubtReading, readScale, restOn, restOnNothing, type ScaleReading } from './scaleReading'
import { isConfirmed, type Turn } from './turn'
import { endStanding } from './standing'

/**
 * Takes a gross weight for what is in the cylinder now, and books the change of net under a cause.
 *
 * A weight above the tare in a cylinder with nothing in it makes its contents unknown; one at the tare leaves it so.
 */
export function weigh(turn: Turn, gross: MassReading, cause: MovementCause, scaleId?: string): ScaleReading {
  const { contents } = turn.state
  const reading = readScale(turn, gross, scaleId)
  if (contents.nothingInIt && reading.isAboveTare) becomeUnknown(turn)
  const isEmptyBack = contents.backFromReclaim && reading.isAtTare
  const isEmpty = (contents.nothingInIt && reading.isAtTare) || isEmptyBack
  if (isEmpty) changeNet(turn, 0, cause)
  else changeNet(turn, reading.netGrams, cause, reading.accuracyGrams)
  if (isEmptyBack) becomeNothing(turn, { evacuated: false })
  restOn(turn, reading)
  doubtReading(turn, reading)
  return reading
}

/** The same for what can only take refrigerant out: a gain is no draw, but a reading to look at again. */
export function weighAfterOutflow(turn: Turn, gross: MassReading, cause: MovementCause): ScaleReading {
  const { contents } = turn.state
  const before = contents.netGrams
  const { netGrams } = readScale(turn, gross)
  const gain = before !== null && netGrams !== null ? netGrams - before : 0
  const isHeavier = gain > 0 && !contents.nothingInIt
  const reading = weigh(turn, gross, gain > 0 ? 'weighing' : cause)
  if (isHeavier) turn.findings.push(wrongWay('drawing', gain, isConfirmed(turn, 'weigh-again')))
  return reading
}

/** The net is not known any more; what was known of it leaves under a cause. */
export function loseNet(turn: Turn, cause: MovementCause): void {
  changeNet(turn, null, cause)
  restOnNothing(turn)
}

/**
 * Nothing is in it. The books must already stand at nothing, or at unknown.
 *
 * What the steel remembers (burnt, which refrigerants were in it) goes only with a deep vacuum.
 */
export function becomeNothing(turn: Turn, how: { evacuated: boolean }): void {
  const { contents } = turn.state
  rename(turn, null)
  contents.condition = 'clean'
  contents.nothingInIt = true
  contents.evacuated = how.evacuated
  contents.shares = []
  contents.backFromReclaim = false
  contents.lastKnownNetGrams = null
  if (!how.evacuated) return
  contents.burnt = false
  contents.knownSinceVacuum = []
  endStanding(turn, 'second-refrigerant', 'unknown-onto-known')
  turn.state.holds = turn.state.holds.filter(({ hold }) => hold !== 'wet')
}

/** Something is in it that nobody can name. */
export function becomeUnknown(turn: Turn): void {
  const { contents } = turn.state
  rename(turn, null)
  contents.condition = 'unknown'
  contents.nothingInIt = false
  contents.evacuated = false
}
