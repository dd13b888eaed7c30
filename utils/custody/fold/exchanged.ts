import { leaveStock, receiveAnew } from './ledger'
import { comeBack } from './returned'
import type { Turn } from './turn'
import { putAt, raiseAway } from './whereabouts'

/** A cylinder changes hands with a firm: one goes to it, another comes from it. */
export function exchanged(turn: Turn<'exchanged'>): void {
  const { state, event } = turn
  const { direction, exchangeId, otherCylinderId } = event.details
  if (direction === 'out') goOut(turn)
  else comeIn(turn)
  state.halves.push({
    eventId: event.id, kind: 'exchanged', pairId: exchangeId, cylinderId: event.cylinderId, otherId: otherCylinderId, direction,
    at: event.effectiveAt, transfer: null,
  })
}

function goOut(turn: Turn<'exchanged'>): void {
  const { state, context, event } = turn
  const { exchangeId, firmId } = event.details
  raiseAway(turn)
  if (state.contents.inStock) leaveStock(turn, 'returned-with')
  state.away = { at: 'given-away', since: event.effectiveAt, listId: exchangeId }
  putAt(turn, context.placeOfFirm(firmId))
  state.ownerId = firmId
  // Should it ever come back, it is the firm's in our hands.
  if (state.ownership !== 'rental') state.ownership = 'deposit'
}

function comeIn(turn: Turn<'exchanged'>): void {
  const { state, event } = turn
  comeBack(turn)
  receiveAnew(turn)
  putAt(turn, event.placeId)
  state.ownerId = null
  state.ownership = 'own'
}
