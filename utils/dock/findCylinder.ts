import { normaliseLabelCode } from '../label/code'

/** What a cylinder is known by on the dock. */
export interface Marked { labelCode: string | null, serial: string | null }

/** Fewer characters of a serial end too many. */
const SHORTEST_END = 3

/**
 * The cylinders that a person means: by the code on the label, by the serial, or by its last characters, three or more.
 * Signs and spaces in a serial do not count, nor does the case.
 *
 * @example cylindersMeant(cylinders, '4821') // the one with serial K-4821
 */
export function cylindersMeant<T extends Marked>(cylinders: readonly T[], typed: string): T[] {
  const code = normaliseLabelCode(typed)
  const labelled = code === null ? [] : cylinders.filter(({ labelCode }) => labelCode === code)
  if (labelled.length > 0) return labelled
  const end = plain(typed)
  const whole = end === '' ? [] : cylinders.filter(({ serial }) => serial !== null && plain(serial) === end)
  if (whole.length > 0 || end.length < SHORTEST_END) return whole
  return cylinders.filter(({ serial, labelCode }) => [serial, labelCode].some(mark => mark !== null && plain(mark).endsWith(end)))
}

function plain(text: string): string {
  return text.toUpperCase().replace(/[^\p{L}\p{N}]/gu, '')
}
