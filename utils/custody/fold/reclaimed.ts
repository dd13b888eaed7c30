import { becomeNothing } from './contents'
import { changeNet } from './ledger'
import { restOnNothing } from './scaleReading'
import type { Turn } from './turn'

/** The reclaimer has the contents: nothing is in it, unless that cylinder has come back since it was shipped. */
export function reclaimed(turn: Turn<'reclaimed'>): void {
  const { away } = turn.state
  if (away?.at !== 'at-reclaim' || away.listId !== turn.event.details.shipmentId) return
  changeNet(turn, 0, 'shipped')
  becomeNothing(turn, { evacuated: false })
  restOnNothing(turn)
}
