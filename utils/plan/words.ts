import type { PairBalance, PlanKind, PlanLine } from '../contract/plans'
import type { StatusKind } from '../picture/status'

/** What each kind of plan is called. */
export const PLAN_KIND_WORDS: Record<PlanKind, string> = { consolidation: 'Bring together', shipping: 'Ship to reclaimers' }

/** How far a plan is, as a status. */
export const PLAN_STATE_WORDS: Record<PlanLine['state'], { kind: StatusKind, text: string }> = {
  open: { kind: 'att', text: 'Open' },
  done: { kind: 'ok', text: 'Done' },
  dropped: { kind: 'unk', text: 'Dropped' },
}

/** What the scales say of a pair that was recorded. */
export const BALANCE_WORDS: Record<PairBalance, { kind: StatusKind, text: string }> = {
  'balanced': { kind: 'ok', text: 'Balances within what the scales may be off' },
  'unbalanced': { kind: 'att', text: 'Does not balance: weigh both again' },
  'half': { kind: 'att', text: 'Only one half is recorded' },
  'not-known': { kind: 'unk', text: 'No weights before, so no balance' },
}
