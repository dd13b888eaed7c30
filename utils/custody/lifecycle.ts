import type { Lifecycle } from './cylinderView'
import type { CylinderState } from './state'

/** What a cylinder shows as: its end, else where it has gone, else its hold, else in service. */
export function lifecycleOf(state: CylinderState): Lifecycle {
  if (state.retired) return 'retired'
  if (state.condemnedAt !== null) return 'condemned'
  if (state.missing) return 'missing'
  if (state.away && state.away.at !== 'given-away') return state.away.at
  return (['rejected', 'quarantined'] as const).find(hold => state.holds.some(one => one.hold === hold)) ?? 'in-service'
}

/** Whether a firm has it in exchange for another: its dates are that firm's to keep, and it is not ours to look for. */
export function isGivenAway({ away }: Pick<CylinderState, 'away'>): boolean {
  return away?.at === 'given-away'
}
