import { worse } from '../condition'
import type { Condition } from '../cylinderView'
import { lookBeforeFill } from '../findings/record'
import { beyondOwnCompressor } from '../findings/recovery'
import { amountNotKnown, wrongWay } from '../findings/weight'
import { againstFill } from './againstFill'
import { becomeUnknown } from './contents'
import { changeNet, nameOwner, putIn, rename } from './ledger'
import { doubtReading, readScale, restOn, type ScaleReading } from './scaleReading'
import { stand } from './standing'
import { isConfirmed, type Turn } from './turn'
import { backByUse } from './whereabouts'

/** What a fill leaves the contents called. */
interface Outcome {
  /** Nothing counted as in it before. */
  isFresh: boolean
  refrigerant: string | null
  condition: Condition
  raises: 'second-refrigerant' | 'unknown-onto-known' | null
}

/** Refrigerant is recovered into the cylinder. */
export function filled(turn: Turn<'filled'>): void {
  const { state, event, findings } = turn
  const { contents } = state
  const { details } = event
  const ownerId = details.ownerOfRefrigerantId ?? null
  if (state.away) backByUse(turn)
  if (details.looked !== true) findings.push(lookBeforeFill())
  findings.push(...againstFill(turn, details.refrigerant))

  const before = details.grossBefore ? readScale(turn, details.grossBefore, details.scaleId) : null
  if (contents.nothingInIt && before?.isAboveTare) becomeUnknown(turn)
  const outcome = outcomeOf(turn, before)
  if (outcome.isFresh) startAnew(turn, outcome, before, ownerId)
  else {
    if (before) weighBefore(turn, before)
    rename(turn, outcome.refrigerant)
  }
  describe(turn, outcome)
  weighAfter(turn, ownerId)
}

// What is left of something that counts as nothing takes the new name and owner at once.
function startAnew(turn: Turn<'filled'>, { refrigerant }: Outcome, before: ScaleReading | null, ownerId: string | null): void {
  const { contents } = turn.state
  if (contents.nothingInIt) {
    contents.refrigerant = refrigerant
    contents.shares = [{ ownerId, grams: 0 }]
  }
  if (before) weighBefore(turn, before)
  rename(turn, refrigerant, ownerId)
}

function weighBefore(turn: Turn<'filled'>, before: ScaleReading): void {
  changeNet(turn, before.netGrams, 'weighing')
  doubtReading(turn, before)
}

function describe({ state, event }: Turn<'filled'>, outcome: Outcome): void {
  const { contents } = state
  const { details } = event
  contents.condition = outcome.condition
  contents.burnt ||= details.condition === 'burnt'
  contents.nothingInIt = false
  contents.evacuated = false
  contents.backFromReclaim = false
  if (details.refrigerant !== null) {
    contents.knownSinceVacuum = [...contents.knownSinceVacuum.filter(name => name !== details.refrigerant), details.refrigerant]
  }
  state.filledHere = true
  state.lastPutInAt = event.effectiveAt
}

function weighAfter(turn: Turn<'filled'>, ownerId: string | null): void {
  const { state, event, findings } = turn
  const { contents } = state
  const { details } = event
  const before = contents.netGrams
  const after = readScale(turn, details.grossAfter, details.scaleId)
  nameOwner(turn, ownerId)
  if (before === null) findings.push(amountNotKnown('recovered'))
  if (before !== null && after.netGrams !== null && after.netGrams >= before) {
    putIn(turn, after.netGrams - before, 'recovered', details.refrigerant, ownerId)
    raiseMethod(turn, after.netGrams - before)
  }
  else {
    if (before !== null && after.netGrams !== null) {
      findings.push(wrongWay('filling', before - after.netGrams, isConfirmed(turn, 'weigh-again')))
    }
    changeNet(turn, after.netGrams, 'weighing')
  }
  restOn(turn, after)
  doubtReading(turn, after)
}

function raiseMethod({ event, findings }: Turn<'filled'>, recoveredGrams: number): void {
  const finding = event.details.method === 'own-compressor' ? beyondOwnCompressor(recoveredGrams) : null
  if (finding) findings.push(finding)
}

function outcomeOf(turn: Turn<'filled'>, before: ScaleReading | null): Outcome {
  const outcome = turn.state.contents.nothingInIt || before?.isAtTare ? fresh(turn) : onto(turn)
  if (outcome.raises) stand(turn, outcome.raises)
  return outcome
}

function fresh({ state, event }: Turn<'filled'>): Outcome {
  const { contents } = state
  const { refrigerant, condition = 'clean' } = event.details
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

function onto({ state, event }: Turn<'filled'>): Outcome {
  const { contents } = state
  const { refrigerant: incoming, condition: stated } = event.details
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
