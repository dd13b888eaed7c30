import type { Beginning } from './testPeriod'

/** What a suffix of a retest mark says. */
export type SuffixMeaning = {
  /** What was done, in words. */
  words: string
  /** What the mark begins. */
  beginning: Beginning
}

const VOLUMETRIC = 'volumetric expansion test'
const STAR = ', good for ten years in the service of the star'
const PLUS = '; may take 110 % of its marked pressure, but not of a liquefied gas'

const MEANINGS: Readonly<Record<string, SuffixMeaning>> = {
  '': { words: VOLUMETRIC, beginning: 'volumetric' },
  '*': { words: VOLUMETRIC + STAR, beginning: 'starred' },
  '+': { words: VOLUMETRIC + PLUS, beginning: 'volumetric' },
  '+*': { words: VOLUMETRIC + STAR + PLUS, beginning: 'starred' },
  'S': { words: 'proof pressure test', beginning: 'proof' },
  'E': { words: 'external visual inspection', beginning: 'visual' },
  'FS': { words: 'acetylene shell and its filler inspected', beginning: 'examination' },
  'AE': { words: 'acoustic emission test', beginning: 'examination' },
  'UE': { words: 'ultrasonic examination', beginning: 'examination' },
  'VE': { words: 'eddy current test with a visual inspection', beginning: 'examination' },
}

/** A typed mark or suffix in capitals, with an asterisk for a star, however that was typed or drawn. */
export function capitalsAndStars(text: string): string {
  return text.trim().toUpperCase().replaceAll(/[★☆✩✶✱⭐]/gu, '*')
}

/** A suffix as it is kept: without gaps, the plus before the star. */
export function tidySuffix(text: string): string {
  const tidy = capitalsAndStars(text).replaceAll(/\s/g, '')
  return tidy === '*+' ? '+*' : tidy
}

/** What a suffix means, or null where it is none of a retest mark. Source: 49 CFR 180.213. */
export function suffixMeaning(suffix: string): SuffixMeaning | null {
  const tidy = tidySuffix(suffix)
  return Object.hasOwn(MEANINGS, tidy) ? MEANINGS[tidy]! : null
}
