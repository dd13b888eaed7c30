import type { Month } from '../quantity/month'
import { readRetestMark, readRin, type RetestMark } from './retestMark'
import { tidySuffix } from './retestSuffix'

/** One mark as it is typed from the steel: its month alone or the whole mark in the first field, RIN and suffix beside it. */
export type MarkEntry = { month: string, rin: string, suffix: string }

/** A mark of which nothing is typed yet. */
export const EMPTY_MARK: Readonly<MarkEntry> = { month: '', rin: '', suffix: '' }

/** Whether anything is typed of a mark. */
export function isMarkTyped(entry: MarkEntry): boolean {
  return [entry.month, entry.rin, entry.suffix].some(text => text.trim() !== '')
}

/** What the fields of a mark say together, or what has to be mended first. */
export function readMarkEntry(entry: MarkEntry, thisMonth: Month): { mark: RetestMark } | { error: string } {
  const read = readRetestMark(entry.month, thisMonth)
  if (read === null) return { error: 'Write the month and the year of the test, such as 04-26, or the whole mark, such as 9 A123 06.' }
  const rin = readRin(entry.rin)
  if (rin === null && entry.rin.trim() !== '') return { error: 'A RIN has four letters or figures, read clockwise, such as A123.' }
  if (rin !== null && read.rin !== null && rin !== read.rin) return { error: `The RIN is typed twice, as ${read.rin} and as ${rin}. Take one out.` }
  const suffix = tidySuffix(entry.suffix) || null
  if (suffix !== null && read.suffix !== null && suffix !== read.suffix) return { error: `The suffix is typed twice, as ${read.suffix} and as ${suffix}. Take one out.` }
  return { mark: { month: read.month, rin: rin ?? read.rin, suffix: suffix ?? read.suffix } }
}
