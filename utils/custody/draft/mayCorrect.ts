import type { Access } from '../../access/roles'
import { can } from '../../access/permissions'
import type { LogLine } from '../cylinderView'
import { DISPATCH_KINDS, type EventKind } from '../kinds'
import { AUTHOR_CORRECTS_WITHIN_MS } from '../posting'

/** Kinds that their own papers mend. */
const MENDED_ELSEWHERE: readonly EventKind[] = DISPATCH_KINDS

/** Whether a person may correct a line: whoever may correct any, and its author for a day from its recording. */
export function mayCorrect(line: LogLine, access: Access | null, nowMs: number): boolean {
  if (MENDED_ELSEWHERE.includes(line.kind)) return false
  if (can(access, 'events:correct-any')) return true
  return can(access, 'events:post') && line.author.id === access?.personId && nowMs - Date.parse(line.recordedAt) <= AUTHOR_CORRECTS_WITHIN_MS
}
