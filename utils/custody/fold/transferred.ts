import { readingGrams } from '../../quantity/mass'
import { scaleAccuracyGrams } from '../../quantity/scale'
import type { HalfTransfer } from '../half'
import type { CylinderState } from '../state'
import { ownerChange } from '../findings/owner'
import { amountNotKnown } from '../findings/weight'
import { weigh, weighAfterOutflow } from './contents'
import { takeIn } from './takeIn'
import type { Turn } from './turn'
import { backByUse } from './whereabouts'

/** Refrigerant goes from this cylinder into another, or comes from another into this one. */
export function transferred(turn: Turn<'transferred'>): void {
  const { state, event } = turn
  const { direction, counterpartId, transferId, ...weights } = event.details
  const transfer = halfOf(turn)
  if (state.away) backByUse(turn)
  if (direction === 'out') goOut(turn)
  else takeIn(turn, { ...weights, cause: 'transferred-in', ownerId: weights.ownerOfRefrigerantId ?? null })
  state.halves.push({
    eventId: event.id, kind: 'transferred', pairId: transferId, cylinderId: event.cylinderId, otherId: counterpartId, direction,
    at: event.effectiveAt, transfer,
  })
}

// The name stays: what the half calls it is held against the other half, never against the steel.
function goOut(turn: Turn<'transferred'>): void {
  const { grossBefore, grossAfter } = turn.event.details
  if (grossBefore) weigh(turn, grossBefore, 'weighing')
  raiseAnotherOwner(turn)
  if (turn.state.contents.netGrams === null) turn.findings.push(amountNotKnown('transferred'))
  weighAfterOutflow(turn, grossAfter, 'transferred-out')
}

// Of two owners' refrigerant both halves name one: that it is two owners' stands already.
function raiseAnotherOwner({ state, event, findings }: Turn<'transferred'>): void {
  const [only, ...others] = state.contents.shares
  if (!only || others.length > 0 || state.contents.nothingInIt) return
  if (only.ownerId !== (event.details.ownerOfRefrigerantId ?? null)) findings.push(ownerChange('said-of-another'))
}

/**
 * What went over by the scale alone; where nobody weighed before, by the reading that the net rested on, or by the tare
 * of a cylinder with nothing in it.
 */
function halfOf({ state, event }: Turn<'transferred'>): HalfTransfer {
  const { direction, refrigerant, grossBefore, grossAfter } = event.details
  const after = readingGrams(grossAfter)
  const before = grossBefore ? weightOf(readingGrams(grossBefore)) : weightBefore(state)
  return {
    refrigerant,
    grams: before === null ? null : direction === 'out' ? before.grams - after : after - before.grams,
    accuracyGrams: (before?.accuracyGrams ?? 0) + weightOf(after).accuracyGrams,
  }
}

function weightBefore({ contents, tare }: CylinderState): { grams: number, accuracyGrams: number } | null {
  const { grossGrams, uncertaintyGrams, nothingInIt, netGrams } = contents
  if (grossGrams !== null && uncertaintyGrams !== null) return { grams: grossGrams, accuracyGrams: uncertaintyGrams }
  return nothingInIt && netGrams === 0 && tare !== null ? weightOf(Math.round(tare.exactGrams)) : null
}

function weightOf(grams: number): { grams: number, accuracyGrams: number } {
  return { grams, accuracyGrams: scaleAccuracyGrams(grams) }
}
