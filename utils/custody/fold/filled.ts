import { lookBeforeFill } from '../findings/record'
import { beyondOwnCompressor } from '../findings/recovery'
import { takeIn } from './takeIn'
import type { Turn } from './turn'
import { backByUse } from './whereabouts'

/** Refrigerant is recovered into the cylinder. */
export function filled(turn: Turn<'filled'>): void {
  const { state, event, findings } = turn
  const { refrigerant, condition, grossBefore, grossAfter, scaleId, method, looked, ownerOfRefrigerantId = null, ownerConsents } = event.details
  if (state.away) backByUse(turn)
  if (looked !== true) findings.push(lookBeforeFill())
  const recoveredGrams = takeIn(turn, { cause: 'recovered', refrigerant, condition, grossBefore, grossAfter, scaleId, ownerId: ownerOfRefrigerantId, ownerConsents })
  if (method === 'own-compressor' && recoveredGrams !== null && recoveredGrams >= 0) raiseOwnCompressor(turn, recoveredGrams)
}

function raiseOwnCompressor({ findings }: Turn, recoveredGrams: number): void {
  const finding = beyondOwnCompressor(recoveredGrams)
  if (finding) findings.push(finding)
}
