import type { Turn } from './turn'

/** Nobody finds the cylinder. What is in it and where it was last stay as they are known. */
export function missing({ state, event }: Turn<'missing'>): void {
  state.missing = { since: state.missing?.since ?? event.effectiveAt, lastSeen: event.details.lastSeen ?? state.missing?.lastSeen ?? null }
}
