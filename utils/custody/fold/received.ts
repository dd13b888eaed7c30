import { weigh } from './contents'
import { comeBack } from './returned'
import type { Turn } from './turn'
import { putAt } from './whereabouts'

/** A cylinder comes to a place of ours; from a reclaimer it comes as one that is returned. */
export function received(turn: Turn<'received'>): void {
  const { event } = turn
  const { gross, fromFirmId } = event.details
  comeBack(turn)
  putAt(turn, event.placeId)
  if (gross) weigh(turn, gross, fromFirmId === undefined ? 'weighing' : 'received-with')
}
