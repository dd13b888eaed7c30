import type { MassReading } from '../../quantity/mass'
import { worse } from '../condition'
import type { Condition } from '../cylinderView'
import { ownerConsent } from '../findings/owner'
import { amountNotKnown, wrongWay } from '../findings/weight'
import { againstFill } from './againstFill'
import { becomeUnknown } from './contents'
import { changeNet, nameOwner, putIn, rename } from './ledger'
import { doubtReading, readScale, restOn, type ScaleReading } from './scaleReading'
import { stand } from './standing'
import { isConfirmed, type Turn } from './turn'

/** What goes into a cylinder, whether out of equipment or out of another cylinder. */
export interface Intake {
  cause: 'recovered' | 'transferred-in'
  /** null = nobody knows which. */
  refrigerant: string | null
  condition?: Condition
  grossBefore?: MassReading
  grossAfter: MassReading
  scaleId?: string
  /** null = the contractor itself. */
  ownerId: string | null
  /** Whose cylinder it is agrees. */
  ownerConsents?: true
}

/** What a fill leaves the contents called. */
interface Outcome {
  /** Nothing counted as in it before. */
  isFresh: boolean
  refrigerant: string | null
  condition: Condition
  raises: 'second-refrigerant' | 'unknown-onto-known' | null
}

/** Refrigerant goes into the cylinder; gives how much of it by the two weights, null where they do not tell. */
export function takeIn(turn: Turn, intake: Intake): number | null {
  const { state, findings } = turn
  findings.push(...againstFill(turn, intake.refrigerant))
  if (state.ownership !== 'own' && intake.ownerConsents !== true) findings.push(ownerConsent(state.ownership))
  const before = intake.grossBefore ? readScale(turn, intake.grossBefore, intake.scaleId) : null
  if (state.contents.nothingInIt && before?.isAboveTare) becomeUnknown(turn)
  const outcome = outcomeOf(turn, intake, before)
  if (outcome.isFresh) startAnew(turn, outcome, before, intake.ownerId)
  else {
    if (before) weighBefore(turn, before)
    rename(turn, outcome.refrigerant)
  }
  describe(turn, intake, outcome)
  return weighAfter(turn, intake)
}

// What is left of something that counts as nothing takes the new name and owner at once.
function startAnew(turn: Turn, { refrigerant }: Outcome, before: ScaleReading | null, ownerId: string | null): void {
  const { contents } = turn.state
  if (contents.nothingInIt) {
    contents.refrigerant = refrigerant
    contents.shares = [{ ownerId, grams: 0 }]
  }
  if (before) weighBefore(turn, before)
  rename(turn, refrigerant, ownerId)
}

function weighBefore(turn: Turn, before: ScaleReading): void {
  changeNet(turn, before.netGrams, 'weighing', before.accuracyGrams)
  restOn(turn, before)
  doubtReading(turn, before)
}

function describe({ state, event }: Turn, { refrigerant, condition }: Intake, outcome: Outcome): void {
  const { contents } = state
  contents.condition = outcome.condition
  contents.burnt ||= condition === 'burnt'
  contents.nothingInIt = false
  contents.evacuated = false
  contents.backFromReclaim = false
  if (refrigerant !== null) {
    contents.knownSinceVacuum = [...contents.knownSinceVacuum.filter(name => name !== refrigerant), refrigerant]
  }
  state.filledHere = true
  state.lastPutInAt = event.effectiveAt
}

function weighAfter(turn: Turn, { cause, refrigerant, grossAfter, scaleId, ownerId }: Intake): number | null {
  const { state, findings } = turn
  const before = state.contents.netGrams
  const after = readScale(turn, grossAfter, scaleId)
  const gainGrams = before === null || after.netGrams === null ? null : after.netGrams - before
  nameOwner(turn, ownerId)
  if (before === null) findings.push(amountNotKnown(cause === 'recovered' ? 'recovered' : 'transferred'))
  if (gainGrams !== null && gainGrams >= 0) putIn(turn, gainGrams, cause, refrigerant, ownerId)
  else {
    if (gainGrams !== null) findings.push(wrongWay('filling', -gainGrams, isConfirmed(turn, 'weigh-again')))
    changeNet(turn, after.netGrams, 'weighing', after.accuracyGrams)
  }
  restOn(turn, after)
  doubtReading(turn, after)
  return gainGrams
}

function outcomeOf(turn: Turn, intake: Intake, before: ScaleReading | null): Outcome {
  const outcome = turn.state.contents.nothingInIt || before?.isAtTare ? fresh(turn, intake) : onto(turn, intake)
  if (outcome.raises) stand(turn, outcome.raises)
  return outcome
}

function fresh({ state }: Turn, { refrigerant, condition = 'clean' }: Intake): Outcome {
  const { contents } = state
  const others = contents.knownSinceVacuum.filter(name => name !== refrigerant)
  if (refrigerant === null) {
    return { isFresh: true, refrigerant, condition: worse(condition, 'unknown'), raises: others.length > 0 ? 'unknown-onto-known' : null }
  }
  const isDoubtful = others.length > 0 || contents.condition === 'mixed'
  return {
    isFresh: true,
    refrigerant,
    condition: isDoubtful ? worse(condition, 'suspect') : condition,
    raises: isDoubtful ? 'second-refrigerant' : null,
  }
}

function onto({ state }: Turn, { refrigerant: incoming, condition: stated }: Intake): Outcome {
  const { contents } = state
  const present = contents.refrigerant
  const condition = worse(contents.condition, stated ?? contents.condition)
  if (present === null && contents.condition === 'mixed') return { isFresh: false, refrigerant: null, condition, raises: null }
  if (present !== null && present === incoming) return { isFresh: false, refrigerant: present, condition, raises: null }
  if (present !== null && incoming !== null) {
    return { isFresh: false, refrigerant: null, condition: 'mixed', raises: 'second-refrigerant' }
  }
  return {
    isFresh: false,
    refrigerant: null,
    condition: worse(condition, 'unknown'),
    raises: present === null && incoming === null ? null : 'unknown-onto-known',
  }
}
