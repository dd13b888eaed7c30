import type { TestMethod } from './requalification'
import type { Beginning } from './testPeriod'

/** What a suffix of a retest mark says. */
export type SuffixMeaning = {
  /** What was done, in words. */
  words: string
  /** What the mark begins. */
  beginning: Beginning
}

const VOLUMETRIC = 'volumetric expansion test'

const MEANINGS: Readonly<Record<string, SuffixMeaning>> = {
  '': { words: VOLUMETRIC, beginning: 'volumetric' },
  '*': { words: `${VOLUMETRIC}, good for ten years in the service of the star`, beginning: 'starred' },
  '+': { words: `${VOLUMETRIC}; may take 110 % of its marked pressure, but not of a liquefied gas`, beginning: 'volumetric' },
  '+*': { words: `${VOLUMETRIC}, good for ten years in the service of the star; may take 110 % of its marked pressure, but not of a liquefied gas`, beginning: 'starred' },
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

/** What speaks against a suffix as it was typed, or null where it is one of a retest mark. */
export function suffixDoubt(suffix: string): string | null {
  const tidy = tidySuffix(suffix)
  if (suffixMeaning(tidy)) return null
  return tidy === 'DT'
    ? 'DT marks a dip tube, not a test. Leave it out, and compare the mark with the steel.'
    : `No retest mark ends in ${tidy} (49 CFR 180.213). Compare it with the steel; as it is, the mark does not count as a test.`
}

const OF_METHOD: Readonly<Record<TestMethod, { beginnings: readonly Beginning[], words: string }>> = {
  volumetric: { beginnings: ['volumetric', 'starred', 'examination'], words: 'A volumetric test has no suffix, a plus or a star' },
  proof: { beginnings: ['proof'], words: 'A proof pressure test is marked S' },
  visual: { beginnings: ['visual'], words: 'An external visual inspection is marked E' },
}

/** What speaks against a suffix beside the method of the test, or null where they agree. Source: 49 CFR 180.213. */
export function methodDoubt(suffix: string, method: TestMethod): string | null {
  const { beginnings, words } = OF_METHOD[method]
  const meaning = suffixMeaning(suffix)
  return meaning === null || beginnings.includes(meaning.beginning) ? null : `${words}. Compare the mark and the method: the lesser test counts.`
}
