import { formatMonth, type Month } from '../quantity/month'
import type { TestMethod } from './requalification'
import { suffixMeaning, tidySuffix } from './retestSuffix'

/** A mark as it is kept: what was not noted of it is left out. */
export type KeptMark = { month: Month, method?: TestMethod, rin?: string | null, suffix?: string | null }

/** A mark in the parts that are struck side by side. */
export type MarkParts = {
  /** "9". */
  month: string
  /** The RIN in its square; null where it is not known. */
  square: { upper: string, lower: string } | null
  /** "06". */
  year: string
  suffix: string
}

/** The shape of a requalifier identification number, in capitals. Source: 49 CFR 180.213(d). */
export const RIN = /^[A-Z0-9]{4}$/

/** A mark in the parts that are struck, to draw it beside the steel. Source: 49 CFR 180.213(d). */
export function retestMarkParts({ month, rin, suffix }: KeptMark): MarkParts {
  const characters = rin?.toUpperCase() ?? ''
  return {
    month: String(Number(month.slice(5))),
    square: RIN.test(characters) ? { upper: characters.slice(0, 2), lower: `${characters[3]}${characters[2]}` } : null,
    year: month.slice(2, 4),
    suffix: tidySuffix(suffix ?? ''),
  }
}

/**
 * A mark in a sentence, for whoever cannot see it drawn.
 *
 * @example retestMarkText({ month: '2006-09', rin: 'A123' }) // 'Tested September 2006 by RIN A123, no suffix: volumetric expansion test'
 */
export function retestMarkText({ month, method, rin, suffix }: KeptMark): string {
  const by = rin ? ` by RIN ${rin}` : ', RIN not noted'
  const tidy = tidySuffix(suffix ?? '')
  const struck = tidy === '' ? 'no suffix' : `suffix ${tidy.replace('+', 'plus ').replace('*', 'star').trim()}`
  const meaning = suffixMeaning(tidy || SUFFIX_OF[method ?? 'volumetric'])
  return `Tested ${formatMonth(month)}${by}, ${struck}: ${meaning?.words ?? 'no suffix of a retest mark'}`
}

const SUFFIX_OF: Record<TestMethod, string> = { volumetric: '', proof: 'S', visual: 'E' }
