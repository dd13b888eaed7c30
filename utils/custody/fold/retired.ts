import type { Turn } from './turn'

/** The cylinder's life ends, as it stands and with what is in it; ended twice it ended the first time. */
export function retired({ state, event }: Turn<'retired'>): void {
  state.retired ??= { since: event.effectiveAt }
}
