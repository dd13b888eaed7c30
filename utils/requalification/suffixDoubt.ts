import type { TestMethod } from './requalification'
import { suffixMeaning, tidySuffix } from './retestSuffix'
import type { Beginning } from './testPeriod'

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
