import { exactGrams } from '../../quantity/mass'
import { changeNet } from './ledger'
import { becomeNothing, becomeUnknown, weigh } from './contents'
import { restOnNothing } from './scaleReading'
import { stand } from './standing'
import type { Turn } from './turn'
import { putAt } from './whereabouts'

/** The first registration is the beginning: stamp, marks, owner and contents. */
export function registered(turn: Turn<'registered'>): void {
  const { state, event } = turn
  const { stamp, marks = [], ownership, ownerId, dedicatedTo, contents = 'unknown', gross } = event.details
  state.registeredAt = event.effectiveAt
  state.stamp = stamp
  state.marks = marks.map(mark => ({ ...mark, enteredAt: event.effectiveAt }))
  state.ownership = ownership
  state.ownerId = ownerId ?? null
  state.dedicatedTo = dedicatedTo ?? null
  // A tare without the valve is not the weight of the empty cylinder.
  state.tare = stamp.tareWeight === null || stamp.tareIncludesValve === false
    ? null
    : { exactGrams: exactGrams(stamp.tareWeight), since: event.effectiveAt, isWeighedAnew: false }
  putAt(turn, event.placeId)

  if (contents === 'evacuated') becomeNothing(turn, { evacuated: true })
  else if (contents === 'unknown') becomeUnknown(turn)
  else nameContents(turn, contents.refrigerant, contents.condition)

  if (gross) weigh(turn, gross, 'opening')
  else {
    if (contents === 'evacuated') changeNet(turn, 0, 'opening')
    restOnNothing(turn)
  }
}

/** A registration after the first changes nothing. */
export function registeredAgain(turn: Turn<'registered'>): void {
  stand(turn, 'registered-twice')
}

function nameContents({ state, event }: Turn, refrigerant: string, condition: Turn['state']['contents']['condition']): void {
  Object.assign(state.contents, { refrigerant, condition, burnt: condition === 'burnt', knownSinceVacuum: [refrigerant] })
  state.lastPutInAt = event.effectiveAt
}
