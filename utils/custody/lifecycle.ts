import type { Lifecycle } from './cylinderView'
import type { CylinderState } from './state'

/** What a cylinder shows as: its end, else where it has gone, else its hold, else in service. */
export function lifecycleOf(state: CylinderState): Lifecycle {
  if (state.condemnedAt !== null) return 'condemned'
  if (state.away) return state.away.at
  return state.holds.some(({ hold }) => hold === 'rejected') ? 'rejected' : 'in-service'
}
