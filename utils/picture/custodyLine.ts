import type { LogLine } from '../custody/cylinderView'
import { KIND_WORDS } from '../custody/words'
import { formatMass, type MassUnit } from '../quantity/mass'

/**
 * One event in a few words: what was done and by how much the weight changed.
 *
 * Rounding: to the nearest division; a change that rounds to nothing is not said. @example 'Filled, +6.2 lb'
 */
export function eventInWords(line: LogLine, unit: MassUnit): string {
  const word = KIND_WORDS[line.kind].done
  const change = netChangeGrams(line)
  const text = change === null ? '' : signedMass(change, unit)
  return /[1-9]/.test(text) ? `${word}, ${text}` : word
}

/** By how much an event changed the known net; null where one of the two is not known. Before it was registered there was nothing. */
export function netChangeGrams({ kind, netBeforeGrams, netAfterGrams }: LogLine): number | null {
  const before = kind === 'registered' ? netBeforeGrams ?? 0 : netBeforeGrams
  return before === null || netAfterGrams === null ? null : netAfterGrams - before
}

/** A mass with its sign, a plus as well as a minus; one that rounds to nothing has none. */
export function signedMass(grams: number, unit: MassUnit): string {
  const text = formatMass(grams, unit, 'nearest')
  return grams > 0 && /[1-9]/.test(text) ? `+${text}` : text
}
