import type { EventKind } from '../kinds'

/** Kinds that have a form of their own at the cylinder; the others are written by their papers, or by a correction. */
export const FORM_KINDS = [
  'filled', 'weighed', 'moved', 'handed-over', 'received', 'returned', 'drawn', 'checked', 'emptied', 'lost', 'labelled',
  'inspected', 'quarantined', 'released', 'missing', 'found', 'retired',
] as const satisfies readonly EventKind[]

export type FormKind = (typeof FORM_KINDS)[number]

/** Whether a word is a kind with a form at the cylinder. */
export function isFormKind(kind: unknown): kind is FormKind {
  return (FORM_KINDS as readonly unknown[]).includes(kind)
}
