import type { CustodyEvent } from '../custody/event'
import { DECISION_KINDS, DISPATCH_KINDS, type EventKind } from '../custody/kinds'
import type { ProblemDetails } from '../contract/problem'

const KINDS: readonly EventKind[] = [...DECISION_KINDS, ...DISPATCH_KINDS]

/** Whether an event can only be recorded where the server is reached: it is a decision on the cylinder as it stands now. */
export function needsServer({ kind, expects }: Pick<CustodyEvent, 'kind' | 'expects'>): boolean {
  return expects !== undefined || KINDS.includes(kind)
}

/** What is said where such an event finds no server. */
export const NEEDS_SERVER: ProblemDetails = {
  type: 'needs-server', title: 'This needs the server', status: 0,
  detail: 'It decides on the cylinder as it stands now, so it cannot wait on this phone. What you typed is kept here; record it when there is signal.',
}
