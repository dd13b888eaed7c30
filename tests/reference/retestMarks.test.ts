import { describe, expect, it } from 'vitest'
import { requalification } from '~~/utils/requalification/requalification'
import { readRetestMark } from '~~/utils/requalification/retestMark'
import { suffixMeaning } from '~~/utils/requalification/retestSuffix'
import { retestMarkParts, retestMarkText } from '~~/utils/requalification/struckMark'

const NOW = '2026-12'

// 49 CFR 180.213(d), edition of October 2019: the example of RIN A123 and September 2006 shows a 9, then A 1 over 3 2,
// then 06; the four characters are read clockwise from the upper left.
describe('the example of 49 CFR 180.213(d)', () => {
  it('is drawn as printed', () => {
    expect(retestMarkParts({ month: '2006-09', rin: 'A123' })).toEqual({ month: '9', square: { upper: 'A1', lower: '32' }, year: '06', suffix: '' })
  })

  it('is read as printed, row by row or clockwise', () => {
    const printed = { month: '2006-09', rin: 'A123', suffix: null }
    expect(readRetestMark('9 A1/32 06', NOW)).toEqual(printed)
    expect(readRetestMark('9 A123 06', NOW)).toEqual(printed)
  })

  it('is a volumetric test, having no suffix', () => {
    expect(retestMarkText({ month: '2006-09', rin: 'A123' })).toBe('Tested September 2006 by RIN A123, no suffix: volumetric expansion test')
  })
})

// 49 CFR 180.213, edition of October 2019: what each suffix stands for, in our words.
const SUFFIXES: [suffix: string, words: RegExp][] = [
  ['', /^volumetric expansion test$/],
  ['*', /^volumetric expansion test, good for ten years/],
  ['+', /^volumetric expansion test; may take 110 %/],
  ['S', /^proof pressure test$/],
  ['E', /^external visual inspection$/],
  ['FS', /shell and its filler/],
  ['AE', /^acoustic emission/],
  ['UE', /^ultrasonic/],
  ['VE', /^eddy current test with a visual/],
]

describe('the suffixes of 49 CFR 180.213', () => {
  it.each(SUFFIXES)('%j', (suffix, words) => {
    expect(suffixMeaning(suffix)?.words).toMatch(words)
  })

  it.each(['V', 'DT', 'R', 'X'])('%s is none of them, and its mark counts for nothing', (suffix) => {
    expect(suffixMeaning(suffix)).toBeNull()
    const { lastMonth } = requalification({
      steel: { spec: 'DOT-4BA', madeMonth: '2020-01', waterCapacityGrams: 22_000, service: { isOwn: true, dedicatedTo: null, holds: [], hasHeldBurnt: false } },
      marks: [{ month: '2025-01', suffix }],
      nowMs: Date.UTC(2026, 5, 1),
      timeZone: 'UTC',
      rules: { intervalMonths: null, ownerChoices: [] },
    })
    expect(lastMonth).toBe('2020-01')
  })
})
