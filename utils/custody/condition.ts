import type { Condition } from './cylinderView'

const FROM_BAD_TO_GOOD: readonly Condition[] = ['mixed', 'burnt', 'unknown', 'suspect', 'clean']

/** The worse of two words about a refrigerant: the worse always wins. */
export function worse(a: Condition, b: Condition): Condition {
  return FROM_BAD_TO_GOOD.indexOf(a) <= FROM_BAD_TO_GOOD.indexOf(b) ? a : b
}
