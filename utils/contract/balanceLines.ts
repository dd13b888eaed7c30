import { MOVEMENT_CAUSES } from '../custody/movement'

/** The contractor's own refrigerant, in a query. */
export const OWN = 'own'
/** Refrigerant that nobody can name, and mixed, in a query. */
export const UNKNOWN = 'unknown'

/** The lines of the balance that have movements behind them: each cause, and all that is apart. */
export const BALANCE_LINES = [...MOVEMENT_CAUSES, 'apart'] as const
export type BalanceLine = (typeof BALANCE_LINES)[number]
